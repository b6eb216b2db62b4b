import type { VisitMove } from '@holdwater/shared-types/visits/visit.states.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { spanOf } from '../common/time/ranges.js';
import { isDeskOf, isPlumberOf, isSuperintendentOf, type LotParties } from '../lots/lots.policy.js';
import type { VisitModel } from './visit.model.js';
import { mayMove, type VisitFacts } from './visits.policy.js';

/** A visit's row as the policy looks at it. */
export function factsOfVisit(visit: VisitModel): VisitFacts {
  const { state, requestedBy, inspectorId, begunBy, begunAt } = visit;
  return {
    state,
    requestedBy,
    inspectorId,
    begunBy,
    begunAt,
    windowStartAt: spanOf(visit.window).startAt,
  };
}

/** Throws `not-allowed` when this reader of the lot is none of those who make this move. */
export function requireMove(
  actor: Actor,
  move: VisitMove,
  { visit, lot }: { visit: VisitModel; lot: LotParties },
): void {
  if (!mayMove(actor, move, factsOfVisit(visit), lot)) refuse('not-allowed', { move });
}

/** The role an act of the requesting side or the desk is written down with. */
export function actingSide(actor: Actor, visit: Pick<VisitModel, 'requestingSide'>, lot: LotParties): string {
  if (visit.requestingSide === 'desk' && isDeskOf(actor, lot)) return 'desk';
  if (isSuperintendentOf(actor, lot)) return 'superintendent';
  return isPlumberOf(actor, lot) ? 'plumber' : 'desk';
}
