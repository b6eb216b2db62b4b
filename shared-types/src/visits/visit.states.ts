/**
 * The states of a visit and every move between them, as `definitions.md` pins them. Both sides read this table: the server refuses what
 * is not in it, the page offers what is.
 */
export const visitStates = [
  'requested',
  'booked',
  'ready',
  'underway',
  'closed',
  'declined',
  'withdrawn',
  'freed',
] as const;
export type VisitState = (typeof visitStates)[number];

/** A visit that still takes a place: one per lot, unit set and stage. */
export const openVisitStates = ['requested', 'booked', 'ready', 'underway'] as const satisfies readonly VisitState[];
/** A visit that holds an inspector's time. */
export const plannedVisitStates = ['booked', 'ready', 'underway'] as const satisfies readonly VisitState[];

export const visitMoves = [
  'place',
  'decline',
  'withdraw',
  'move',
  'say-test-up',
  'no-longer-up',
  'find-not-up',
  'begin',
  'undo-begin',
  'close',
  'free-not-up',
  'free-closure',
  'not-reached',
] as const;
export type VisitMove = (typeof visitMoves)[number];

/** Who makes a move: the requesting side, the plumber, the inspector of the visit, the desk, or the deadline itself. */
export type VisitMover = 'requester' | 'plumber' | 'inspector' | 'desk' | 'deadline';

export interface VisitMoveRule {
  readonly from: readonly VisitState[];
  /** `same`: the state stays; `before`: the state it was in before it began. */
  readonly to: VisitState | 'same' | 'before';
  readonly by: readonly VisitMover[];
}

export const visitMoveTable: Readonly<Record<VisitMove, VisitMoveRule>> = {
  place: { from: ['requested'], to: 'booked', by: ['desk', 'requester'] },
  decline: { from: ['requested'], to: 'declined', by: ['desk'] },
  withdraw: { from: ['requested', 'booked', 'ready'], to: 'withdrawn', by: ['requester', 'desk'] },
  move: { from: ['requested', 'booked', 'ready'], to: 'same', by: ['requester', 'desk'] },
  'say-test-up': { from: ['booked'], to: 'ready', by: ['plumber'] },
  'no-longer-up': { from: ['ready'], to: 'booked', by: ['plumber'] },
  'find-not-up': { from: ['ready'], to: 'booked', by: ['inspector'] },
  begin: { from: ['booked', 'ready'], to: 'underway', by: ['inspector'] },
  'undo-begin': { from: ['underway'], to: 'before', by: ['inspector'] },
  close: { from: ['underway'], to: 'closed', by: ['inspector'] },
  'free-not-up': { from: ['booked'], to: 'freed', by: ['deadline'] },
  'free-closure': { from: ['booked', 'ready'], to: 'freed', by: ['desk'] },
  'not-reached': { from: ['booked', 'ready', 'underway'], to: 'requested', by: ['desk'] },
};

/** Undoing a start is possible for this long. */
export const undoBeginSeconds = 60;

/** The moves open from a state. */
export function nextMoves(state: VisitState): VisitMove[] {
  return visitMoves.filter((move) => visitMoveTable[move].from.includes(state));
}

/** Where a move leads from a state, or null when the table has no such move. `before` is the state the visit was in when it began. */
export function stateAfter(state: VisitState, move: VisitMove, before: VisitState = 'booked'): VisitState | null {
  const rule = visitMoveTable[move];
  if (!rule.from.includes(state)) return null;
  if (rule.to === 'same') return state;
  return rule.to === 'before' ? before : rule.to;
}
