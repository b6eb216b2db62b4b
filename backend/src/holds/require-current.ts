import { stateAfter, type VisitMove } from '@holdwater/shared-types/visits/visit.states.js';
import { refuse } from '../common/errors/app-error.js';
import type { VisitModel } from '../visits/visit.model.js';

/**
 * Refuses an act on a visit that is no longer what its maker saw, before anything is written or asked about the rest of the input. The
 * move itself checks again.
 * @throws stale-state
 */
export function requireCurrent(
  visit: Pick<VisitModel, 'state' | 'version' | 'begunFrom'>,
  move: VisitMove,
  expectedVersion: number,
): void {
  const isPossible = stateAfter(visit.state, move, visit.begunFrom ?? 'booked') !== null;
  if (!isPossible || visit.version !== expectedVersion)
    refuse('stale-state', { is: visit.state, version: visit.version });
}
