export const correctionStates = ['open', 'fixed', 'accepted'] as const;
export type CorrectionState = (typeof correctionStates)[number];

export const correctionMoves = ['fix', 'accept', 'reopen'] as const;
export type CorrectionMove = (typeof correctionMoves)[number];

export const correctionMoveTable: Readonly<Record<CorrectionMove, { from: CorrectionState; to: CorrectionState }>> = {
  fix: { from: 'open', to: 'fixed' },
  accept: { from: 'fixed', to: 'accepted' },
  reopen: { from: 'fixed', to: 'open' },
};

export const severities = ['fix-before-cover', 'fix-before-final', 'note'] as const;
export type Severity = (typeof severities)[number];

export const correctionSubjects = ['dwv', 'water', 'work'] as const;
export type CorrectionSubject = (typeof correctionSubjects)[number];
