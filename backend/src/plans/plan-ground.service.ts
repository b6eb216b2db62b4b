import { Injectable } from '@nestjs/common';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { planWays } from '@holdwater/shared-types/plans/plan-ways.js';
import type { PlanTools } from '@holdwater/shared-types/plans/plan-tools.js';
import type { PlanWay } from '@holdwater/shared-types/plans/plan.contract.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { DepartmentsQueries } from '../departments/departments.queries.js';
import { type RuleCardVersion, RuleCardsQueries } from '../departments/rule-cards.queries.js';
import type { LotRecord } from '../lots/lot-record.js';
import { type PlannedPart, PlansQueries, type VisitCard } from './plans.queries.js';

/** What a plan stands on: the house, and what the rule card that rules it asks. */
export interface PlanGround {
  readonly ruleCard: RuleCardVersion;
  readonly rule: TestRule;
  readonly isGroundwork: boolean;
  /** Null while nobody measured the house. */
  readonly house: HouseGeometry | null;
  readonly elevationFt: number;
}

/** The rule card versions that rule the parts of one lot. */
export interface RulingCards {
  readonly inForce: RuleCardVersion | null;
  readonly visits: readonly VisitCard[];
}

@Injectable()
export class PlanGrounds {
  constructor(
    private readonly plans: PlansQueries,
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly clock: Clock,
  ) {}

  /**
   * Throws `lot-without-department`, `no-rule-card`, `stage-unknown`, `bad-input` (a system the stage does not test, a unit there is not).
   */
  async getGround(lot: LotRecord, part: PlannedPart): Promise<PlanGround> {
    if (lot.departmentId === null) return refuse('lot-without-department');
    const ruleCard = await this.getRuling(lot, part);
    const { stages, tests } = ruleCard.content;
    const stage = stages.find(({ code }) => code === part.stageCode);
    if (stage === undefined) return refuse('stage-unknown', { stageCode: part.stageCode });
    const rule = tests.find((each) => each.stageCode === part.stageCode && each.system === part.system);
    if (rule === undefined || !stage.systems.includes(part.system)) {
      return refuse('bad-input', {}, { system: 'not-of-this-stage' });
    }
    const unit = (await this.plans.listHouses(lot.id)).find(({ number }) => number === part.unitNumber);
    if (unit === undefined) return refuse('bad-input', {}, { unitNumber: 'no-such-unit' });
    const { elevationFt } = await this.departments.getDepartment(lot.departmentId);
    return { ruleCard, rule, isGroundwork: stage.covers === 'slab', house: unit.geometry, elevationFt };
  }

  /** The versions that rule a lot now: a booked visit keeps its own; without one the card in force rules. */
  async readRulingCards(lot: LotRecord): Promise<RulingCards> {
    const visits = await this.plans.listVisitCards(lot.id);
    if (lot.departmentId === null) return { inForce: null, visits };
    const inForce = await this.ruleCards.listInForce([lot.departmentId], this.clock.now());
    return { inForce: inForce.get(lot.departmentId) ?? null, visits };
  }

  private async getRuling(lot: LotRecord, part: PlannedPart): Promise<RuleCardVersion> {
    const cards = await this.readRulingCards(lot);
    const rulingId = rulingCardId(cards, part);
    if (rulingId === null) return refuse('no-rule-card');
    return cards.inForce?.id === rulingId ? cards.inForce : this.ruleCards.getRuleCard(rulingId);
  }
}

/** The id of the version that rules a part; null where no card is in force. */
export function rulingCardId({ inForce, visits }: RulingCards, part: Omit<PlannedPart, 'system'>): string | null {
  const visit = visits.find(
    ({ stageCode, unitNumbers }) => stageCode === part.stageCode && unitNumbers.includes(part.unitNumber),
  );
  return visit?.ruleCardId ?? inForce?.id ?? null;
}

/** The ways of a ground; none without a house. */
export function waysOn(ground: PlanGround, tools: PlanTools): PlanWay[] {
  const { house, rule, isGroundwork, elevationFt } = ground;
  return house === null ? [] : planWays({ house, rule, isGroundwork, tools, elevationFt });
}
