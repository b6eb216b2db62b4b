import { Injectable } from '@nestjs/common';
import { id, instant } from '@holdwater/shared-types/common/fields.js';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { Correction, listCorrections } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { type CorrectionMove, correctionMoveTable } from '@holdwater/shared-types/outcomes/correction.states.js';
import { z } from 'zod';
import { type Actor, isMember, organizationIds } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { fromCursor, toPage } from '../common/paging/cursor.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { actingRole, type LotParties } from '../lots/lots.policy.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { VisitsQueries } from '../visits/visits.queries.js';
import type { CorrectionModel } from './correction.model.js';
import { CorrectionMoves, type CorrectionStep } from './correction-moves.service.js';
import { presentCorrection } from './corrections.presenter.js';
import { CorrectionsQueries } from './corrections.queries.js';
import { canDecideCorrection, canFixCorrection } from './outcomes.policy.js';

type Query = RouteInput<typeof listCorrections>['query'];
type Page = RouteAnswer<typeof listCorrections>;

/** What a person says of one correction, outside a visit. */
export interface CorrectionAct {
  readonly expectedVersion: number;
  readonly madeAt: string;
}

const cursorKeys = z.tuple([instant, z.number().int(), id]);

type Made<S> = S extends CorrectionStep ? Omit<S, 'at'> : never;

/** Corrections listed, and moved one at a time. */
@Injectable()
export class Corrections {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly lots: LotsQueries,
    private readonly visits: VisitsQueries,
    private readonly queries: CorrectionsQueries,
    private readonly moves: CorrectionMoves,
  ) {}

  /** Of the lots the actor may read, newest first. @throws not-found for a lot or an organization that is not theirs, bad-input */
  async list(actor: Actor, { cursor, limit, state, lotId, organizationId }: Query): Promise<Page> {
    if (lotId !== undefined) await this.lots.getLotFor(actor, lotId);
    if (organizationId !== undefined && !isMember(actor, organizationId)) refuse('not-found');
    const readerIds = organizationId === undefined ? organizationIds(actor) : [organizationId];
    const after = cursor === undefined ? undefined : afterOf(cursor);
    const rows = await this.queries.listReadable({ readerIds, state, lotId, after, limit });
    const page = toPage(rows, limit, (row) => [row.openedAt.toISOString(), row.number, row.id]);
    return { ...page, items: page.items.map((row) => presentCorrection(actor, row)) };
  }

  /**
   * The plumber marks one fixed; an inspector of the department accepts or reopens a fixed one.
   * @throws not-found, not-allowed, stale-state, correction-unfixed
   */
  async move(actor: Actor, correctionId: string, made: Made<CorrectionStep>, act: CorrectionAct): Promise<Correction> {
    return this.unitOfWork.run(async () => {
      const correction = (await this.moves.findLocked(correctionId)) ?? refuse('not-found');
      const lot = await this.partiesFor(actor, correction);
      requireCurrentr(actor, lot, made.move);
      if (!isMadeByThisAct(actor, correction, made, act)) {
        requireVersion(correction, act.expectedVersion);
        const at = correctedMadeAt(act.madeAt, this.clock.now());
        await this.moves.apply(correction, { ...made, at }, { personId: actor.personId, role: actingRole(actor, lot) });
      }
      return presentCorrection(actor, (await this.queries.findById(correctionId)) ?? refuse('not-found'));
    });
  }

  /** The department is the one that came, whoever the lot's is by now. @throws not-found */
  private async partiesFor(actor: Actor, correction: CorrectionModel): Promise<LotParties> {
    const lot = await this.lots.getLotFor(actor, correction.lotId);
    const { departmentId } = await this.visits.getVisit(correction.visitId);
    return { ...lot, departmentId };
  }
}

function requireCurrentr(actor: Actor, lot: LotParties, move: CorrectionMove): void {
  const isAllowed = move === 'fix' ? canFixCorrection(actor, lot) : canDecideCorrection(actor, lot);
  if (!isAllowed) refuse('not-allowed', { who: move === 'fix' ? 'plumber' : 'inspector' });
}

function requireVersion(correction: CorrectionModel, expectedVersion: number): void {
  const { state, version } = correction;
  if (version !== expectedVersion) refuse('stale-state', { is: state, version });
}

/** An act sent twice: the same move was already made, by the same person or in the same words, from the very version named. */
function isMadeByThisAct(
  actor: Actor,
  correction: CorrectionModel,
  made: Made<CorrectionStep>,
  act: CorrectionAct,
): boolean {
  const isNext = correction.version === act.expectedVersion + 1;
  if (!isNext || correction.state !== correctionMoveTable[made.move].to) return false;
  if (made.move === 'fix') return correction.fixedBy === actor.personId && correction.fixNote === made.note;
  return made.move === 'accept' ? correction.acceptedBy === actor.personId : correction.reopenedWhy === made.why;
}

function afterOf(cursor: string) {
  const keys = cursorKeys.safeParse(fromCursor(cursor, 3));
  if (!keys.success) return refuse('bad-input', {}, { cursor: 'not-a-cursor' });
  const [openedAt, number, id] = keys.data;
  return { openedAt, number, id };
}
