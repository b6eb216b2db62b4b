import { Injectable } from '@nestjs/common';
import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import { ClearancesQueries } from '../clearances/clearances.queries.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { type DepartmentRecord, DepartmentsQueries } from '../departments/departments.queries.js';
import { RuleCardsQueries, type RuleCardVersion } from '../departments/rule-cards.queries.js';
import type { LotRecord } from '../lots/lot-record.js';
import { canReadLot, canRequestVisit } from '../lots/lots.policy.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { stageOf } from './department-windows.queries.js';
import { type LotAsked, unknownUnits } from './request.rules.js';
import { RequestedLotsQueries, type UnitsOfLot } from './requested-lots.queries.js';
import { requestingSideOf } from './visits.policy.js';

export interface LotWish {
  readonly lotId: string;
  readonly unitNumbers?: number[] | undefined;
}

export interface AskedLots {
  readonly department: DepartmentRecord;
  /** The version in force today: it says who may ask, and how. */
  readonly ruleCard: RuleCardVersion;
  readonly stage: Stage;
  readonly side: 'builder' | 'plumber' | 'desk';
  readonly records: readonly LotRecord[];
}

const requesterOfSide = { builder: 'superintendent', plumber: 'plumber' } as const;

/** Reads the lots of a request and refuses what cannot be asked at all. */
@Injectable()
export class RequestedLots {
  constructor(
    private readonly lots: LotsQueries,
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly clearances: ClearancesQueries,
    private readonly queries: RequestedLotsQueries,
    private readonly clock: Clock,
  ) {}

  /**
   * The lots, their one department and the stage. `isLocking`: inside a unit of work, to ask for a visit of them. Throws `not-found` for a lot the actor may not read,
   * `not-allowed` and `may-not-request`, `lot-without-department`, `no-rule-card`, `too-many-lots`, `stage-unknown`.
   */
  async getAsked(
    actor: Actor,
    wishes: readonly LotWish[],
    stageCode: string,
    { isForCaller = false, isLocking = false } = {},
  ): Promise<AskedLots> {
    const ids = wishes.map(({ lotId }) => lotId);
    const records = isLocking ? await this.lots.lockLotsFor(actor, ids) : await this.readLots(actor, ids);
    const twice = ids.findIndex((id, index) => ids.indexOf(id) !== index);
    if (twice >= 0) refuse('bad-input', {}, { [`lots.${twice}.lotId`]: 'named-twice' });
    const department = await this.departmentOf(records);
    const ruleCard = await this.ruleCards.getRuleCardInForce(
      department.id,
      localDateOf(this.clock.now(), department.zone),
    );
    const side = requireSide(actor, records, ruleCard, isForCaller);
    const most = ruleCard.content.asking.lotsPerRequest;
    if (records.length > most) refuse('too-many-lots', { most, asked: records.length });
    const stage = stageOf(ruleCard, stageCode) ?? refuse('stage-unknown', { stageCode }, { stageCode: 'unknown' });
    return { department, ruleCard, stage, side, records };
  }

  /** What speaks for and against a visit of this stage on each lot. Throws `bad-input` for a unit that a lot does not have. */
  async listFacts(records: readonly LotRecord[], wishes: readonly LotWish[], stageCode: string): Promise<LotAsked[]> {
    const ids = records.map(({ id }) => id);
    const units = await this.lots.listUnitNumbers(ids);
    const states = (await this.clearances.listStates(ids)).filter((each) => each.stageCode === stageCode);
    const corrections = await this.queries.listOpenCorrections(ids);
    const openVisits = await this.queries.listOpenVisits(ids, stageCode);
    const failed = await this.queries.listFailedVisits(ids, stageCode);
    const asked = records.map(({ id, number, permitStatus }, index) => ({
      id,
      number,
      permitStatus,
      unitsAsked: wishes[index]?.unitNumbers,
      units: units.get(id) ?? [],
      passedUnits: states
        .filter((each) => each.lotId === id && hasPassed(each.state))
        .map(({ unitNumber }) => unitNumber),
      openVisitUnits: unitsIn(openVisits, id),
      failedUnits: unitsIn(failed, id),
      corrections: corrections.filter(({ lotId }) => lotId === id),
    }));
    const unknown = asked.findIndex((lot) => unknownUnits(lot).length > 0);
    if (unknown >= 0) refuse('bad-input', {}, { [`lots.${unknown}.unitNumbers`]: 'no-such-unit' });
    return asked;
  }

  private async readLots(actor: Actor, ids: readonly string[]): Promise<LotRecord[]> {
    const found = (await this.queries.listLots(ids)).filter((lot) => canReadLot(actor, lot));
    return ids.map((id) => found.find((lot) => lot.id === id) ?? refuse('not-found'));
  }

  private async departmentOf(records: readonly LotRecord[]): Promise<DepartmentRecord> {
    const without = records.filter(({ departmentId }) => departmentId === null);
    const [id, ...others] = [...new Set(records.map(({ departmentId }) => departmentId))];
    if (id === null || id === undefined || without.length > 0)
      return refuse('lot-without-department', { lots: without.map(({ number }) => number) });
    if (others.length > 0) refuse('bad-input', {}, { lots: 'of-different-departments' });
    return this.departments.getDepartment(id);
  }
}

/** The one side all these lots are asked for by. */
function requireSide(
  actor: Actor,
  records: readonly LotRecord[],
  ruleCard: RuleCardVersion,
  isForCaller: boolean,
): AskedLots['side'] {
  const refused = (code: 'not-allowed' | 'may-not-request') =>
    refuse(code, { lots: records.map(({ number }) => number) });
  const sides = new Set(records.map((lot) => requestingSideOf(actor, lot, isForCaller)));
  const [side] = sides;
  if (side === undefined || side === null || sides.has(null)) return refused('not-allowed');
  if (sides.size > 1) refuse('bad-input', {}, { lots: 'of-different-sides' });
  const isAllowedByLots = records.every((lot) => canRequestVisit(actor, lot));
  const isAllowedByCard = side === 'desk' || ruleCard.content.asking.whoMayRequest.includes(requesterOfSide[side]);
  return isAllowedByLots && isAllowedByCard ? side : refused('may-not-request');
}

/** The role a request is written into the record with. */
export function roleOfSide(side: AskedLots['side']): string {
  return side === 'desk' ? 'desk' : requesterOfSide[side];
}

function unitsIn(visits: readonly UnitsOfLot[], lotId: string): number[] {
  return visits.filter((visit) => visit.lotId === lotId).flatMap(({ unitNumbers }) => unitNumbers);
}

function hasPassed(state: string): boolean {
  return state === 'clear' || state === 'put-back-due';
}
