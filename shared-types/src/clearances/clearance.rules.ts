import type { VisitState } from '../visits/visit.states.js';
import type { CorrectionState, Severity } from '../outcomes/correction.states.js';

export const clearStates = [
  'clear',
  'put-back-due',
  'corrections-open',
  'awaiting-visit',
  'under-test',
  'not-tested',
] as const;
export type ClearState = (typeof clearStates)[number];

export interface ClearFacts {
  /** Every required system passed and the work was looked at, at the last closed visit of this unit and stage. */
  readonly hasPassed: boolean;
  readonly corrections: ReadonlyArray<{ state: CorrectionState; severity: Severity }>;
  /** How many items of the take-down group *before cover* are still to do. */
  readonly putBackBeforeCover: number;
  /** Fees neither settled nor disputed where the rule card demands it. */
  readonly hasFeeDue: boolean;
  readonly isRevoked: boolean;
  readonly openVisit: VisitState | null;
  readonly isHoldStanding: boolean;
}

/** Plumbing of one lot, unit and stage: the first state of the pinned list that applies. */
export function clearStateOf(facts: ClearFacts): ClearState {
  const isAccepted = facts.corrections.every((c) => c.severity !== 'fix-before-cover' || c.state === 'accepted');
  const isPassed = facts.hasPassed && isAccepted && !facts.isRevoked;
  if (isPassed && facts.putBackBeforeCover === 0 && !facts.hasFeeDue) return 'clear';
  if (isPassed) return 'put-back-due';
  const isOpen = facts.corrections.some((c) => c.state === 'open' && c.severity !== 'note');
  const isFixedWaiting = facts.corrections.some((c) => c.state === 'fixed') && facts.openVisit === null;
  if (isOpen || isFixedWaiting) return 'corrections-open';
  if (facts.openVisit === 'ready' || facts.openVisit === 'underway') return 'awaiting-visit';
  return facts.isHoldStanding ? 'under-test' : 'not-tested';
}
