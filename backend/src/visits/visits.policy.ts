import {
  nextMoves,
  undoBeginSeconds,
  type VisitMove,
  type VisitMover,
  visitMoveTable,
  type VisitState,
} from '@holdwater/shared-types/visits/visit.states.js';
import { type Actor, hasRole } from '../common/access/actor.js';
import {
  isDeskOf,
  isImpartialInspectorOf,
  isPlumberOf,
  isSuperintendentOf,
  type LotParties,
} from '../lots/lots.policy.js';

/** What of a visit the policy looks at. */
export interface VisitFacts {
  readonly state: VisitState;
  readonly requestedBy: string;
  readonly inspectorId: string | null;
  readonly begunBy: string | null;
  readonly begunAt: Date | null;
  readonly windowStartAt: Date;
}

/** The requesting side: superintendents of the builder; plumbers where the lot allows it, or who requested it. */
function isRequestingSide(actor: Actor, visit: Pick<VisitFacts, 'requestedBy'>, lot: LotParties): boolean {
  if (isSuperintendentOf(actor, lot)) return true;
  return isPlumberOf(actor, lot) && (lot.mayPlumberRequest || visit.requestedBy === actor.personId);
}

/**
 * Whether the actor is one of those who may make this move on this visit, whatever time it is and whatever state it is in.
 * `lot.departmentId` is the visit's own department.
 */
export function mayMove(actor: Actor, move: VisitMove, visit: VisitFacts, lot: LotParties): boolean {
  // a request is placed by the desk; that the requester's own booking places it too happens in the request itself
  if (move === 'place') return isDeskOf(actor, lot);
  return visitMoveTable[move].by.some((mover) => isMover(actor, mover, move, visit, lot));
}

function isMover(actor: Actor, mover: VisitMover, move: VisitMove, visit: VisitFacts, lot: LotParties): boolean {
  if (mover === 'requester') return isRequestingSide(actor, visit, lot);
  if (mover === 'plumber') return isPlumberOf(actor, lot);
  if (mover === 'desk') return isDeskOf(actor, lot);
  if (mover === 'deadline') return false;
  // another inspector's visit may be begun knowingly; everything after that is for whoever begins it
  return isImpartialInspectorOf(actor, lot) && (move === 'begin' || visit.inspectorId === actor.personId);
}

/** Whether the hour allows a move: a start before the window only with the test up, taking a start back within a minute. */
export function isTimely(move: VisitMove, visit: VisitFacts, actor: Actor, now: Date): boolean {
  if (move === 'begin') return visit.state === 'ready' || now >= visit.windowStartAt;
  if (move !== 'undo-begin') return true;
  const isOwn = visit.begunBy === actor.personId;
  return isOwn && visit.begunAt !== null && now.getTime() - visit.begunAt.getTime() <= undoBeginSeconds * 1000;
}

/** The moves a reader may make now. `isTested` false: the stage asks for no test, so there is none to say up. */
export function movesFor(actor: Actor, visit: VisitFacts, lot: LotParties, now: Date, isTested = true): VisitMove[] {
  return nextMoves(visit.state).filter(
    (move) =>
      (isTested || move !== 'say-test-up') && mayMove(actor, move, visit, lot) && isTimely(move, visit, actor, now),
  );
}

/** Which side a request is made for; null for whoever may not ask at all. A caller is spoken for by the desk alone. */
export function requestingSideOf(
  actor: Actor,
  lot: LotParties,
  isForCaller: boolean,
): 'builder' | 'plumber' | 'desk' | null {
  if (isForCaller) return isDeskOf(actor, lot) ? 'desk' : null;
  if (isSuperintendentOf(actor, lot)) return 'builder';
  if (isPlumberOf(actor, lot)) return 'plumber';
  return isDeskOf(actor, lot) ? 'desk' : null;
}

/** Requests of a department and its day board: the desk's. */
export function canWorkRequests(actor: Actor, departmentId: string): boolean {
  return hasRole(actor, departmentId, 'desk');
}

/** A run: the inspector's own; the desk sees any of its department. */
export function canReadRun(actor: Actor, departmentId: string, inspectorId: string): boolean {
  if (hasRole(actor, departmentId, 'desk')) return true;
  return inspectorId === actor.personId && hasRole(actor, departmentId, 'inspector');
}
