import { openVisitStates, type VisitMove, type VisitState } from '@holdwater/shared-types/visits/visit.states.js';
import type { VisitModel } from './visit.model.js';

/** What a move may write besides the state; the rest follows from the move itself. */
export type VisitChanges = Partial<
  Pick<
    VisitModel,
    | 'ruleCardId'
    | 'windowDate'
    | 'windowLabel'
    | 'window'
    | 'place'
    | 'inspectorId'
    | 'planned'
    | 'readyAt'
    | 'begunAt'
    | 'begunBy'
    | 'endReason'
    | 'endNote'
    | 'endedAt'
  >
>;

type Values = VisitChanges & Partial<Pick<VisitModel, 'begunFrom' | 'hasFirstPlace'>>;

/** What every move of its kind brings with it, whoever makes it. What the caller gives goes before it. */
export function consequencesOf(move: VisitMove, from: VisitState, to: VisitState, now: Date): Values {
  if (move === 'not-reached') {
    return { hasFirstPlace: true, inspectorId: null, planned: null, place: null, readyAt: null, ...notBegun };
  }
  if (move === 'begin') return { begunAt: now, begunFrom: from === 'ready' ? 'ready' : 'booked' };
  if (move === 'undo-begin') return notBegun;
  if (move === 'say-test-up') return { readyAt: now };
  if (move === 'no-longer-up' || move === 'find-not-up') return { readyAt: null };
  const isOpen = openVisitStates.some((state) => state === to);
  return isOpen ? {} : { endedAt: now };
}

const notBegun = { begunAt: null, begunBy: null, begunFrom: null } as const;
