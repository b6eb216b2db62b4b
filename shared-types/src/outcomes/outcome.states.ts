export const outcomeKinds = ['pass', 'fail', 'not-ready', 'no-access'] as const;
export type OutcomeKind = (typeof outcomeKinds)[number];

export const systemAnswers = ['pass', 'fail', 'not-seen'] as const;
export type SystemAnswer = (typeof systemAnswers)[number];

export const notReadyReasons = ['not-up', 'down-overnight', 'wrong-method', 'covered-early'] as const;
export const noAccessReasons = ['locked', 'site-closed', 'hazard', 'permit-not-on-site'] as const;

/**
 * The outcome of a visit from its systems: fail if any system or the work failed; pass if every required system passed;
 * otherwise fail with reason `not-seen`. A stage that requires no system (a final) passes on the work alone.
 */
export function outcomeOf(
  answers: readonly SystemAnswer[],
  hasWorkFailed: boolean,
): { kind: 'pass' | 'fail'; reason: 'not-seen' | null } {
  if (hasWorkFailed || answers.includes('fail')) return { kind: 'fail', reason: null };
  if (answers.every((answer) => answer === 'pass')) return { kind: 'pass', reason: null };
  return { kind: 'fail', reason: 'not-seen' };
}
