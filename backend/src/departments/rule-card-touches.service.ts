import { Injectable } from '@nestjs/common';
import type { RuleCardTouches } from '@holdwater/shared-types/departments/departments.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { canReadDraft } from './departments.policy.js';
import { RuleCardTouchesQueries } from './rule-card-touches.queries.js';
import { RuleCardsQueries, type RuleCardVersion } from './rule-cards.queries.js';
import { findUnfitReason } from './unfit-plan.rules.js';

/** What a version touches once it is in force: what stays on its own version, what is planned anew, and who is told. */
@Injectable()
export class RuleCardTouchesService {
  constructor(
    private readonly ruleCards: RuleCardsQueries,
    private readonly touches: RuleCardTouchesQueries,
  ) {}

  /** For members of the department. Throws `not-found` for a draft of another, `not-allowed` for a published version of another. */
  async read(actor: Actor, ruleCardId: string): Promise<RuleCardTouches> {
    const card = await this.ruleCards.getRuleCard(ruleCardId);
    const { departmentId } = card;
    if (!canReadDraft(actor, departmentId)) refuse(card.state === 'draft' ? 'not-found' : 'not-allowed');
    const visits = await this.touches.countOpenVisits(departmentId);
    const sumOf = (isBooked: boolean) =>
      visits.filter((each) => each.isBooked === isBooked).reduce((sum, each) => sum + each.visits, 0);
    return {
      keptVisits: {
        booked: sumOf(true),
        requested: sumOf(false),
        versions: [...new Set(visits.map(({ version }) => version))],
      },
      lotsWithoutVisit: await this.touches.countLotsWithoutVisit(departmentId),
      told: await this.touches.listTold(departmentId),
      unfitPlans: await this.listUnfitPlans(card),
    };
  }

  private async listUnfitPlans(card: RuleCardVersion): Promise<RuleCardTouches['unfitPlans']> {
    const plans = await this.touches.listStandingPlans(card.departmentId);
    const versions = await this.ruleCards.listRuleCards([...new Set(plans.map(({ ruleCardId }) => ruleCardId))]);
    return plans.flatMap((plan) => {
      const madeBy = versions.get(plan.ruleCardId);
      const reason = madeBy === undefined ? null : findUnfitReason(plan, madeBy.content, card.content);
      if (reason === null) return [];
      const { lotId, lotNumber, tractName, stageCode, system } = plan;
      return [{ lotId, lotNumber, tractName, stageCode, system, reason }];
    });
  }
}
