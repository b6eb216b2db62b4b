import type { CorrectionSubject, Severity } from '@holdwater/shared-types/outcomes/correction.states.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { outcomeOf, type OutcomeKind } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { parseNumber } from '../holds/typed-reading';
import { emptySystem, subjectKey, type OutcomeDraft, type Subject } from './outcome-draft';

/** What keeps an outcome from being recorded. */
export type WhyNotRecord =
  | { readonly code: 'nothing' | 'reason' | 'reopen-why' }
  | { readonly code: 'reading' | 'answer' | 'fail-bare' | 'pass-open'; readonly subject: Subject };

export interface OutcomeVerdict {
  /** What will be recorded; null while something is missing. */
  readonly kind: OutcomeKind | null;
  readonly isNotSeen: boolean;
  readonly why: WhyNotRecord | null;
  /** Corrections that will stand open, by what they are of. */
  readonly open: Readonly<Record<CorrectionSubject, number>>;
}

interface Open {
  readonly unitNumber: number;
  readonly subject: CorrectionSubject;
  readonly severity: Severity;
}

/** What the corrections come to once the act is done: those of before that stay open or are reopened, and the new ones. */
function openAfter(draft: OutcomeDraft, earlier: readonly Correction[]): Open[] {
  const stays = earlier.filter((one) => one.state === 'open' || draft.decisions[one.id]?.is === 'reopen');
  return [...stays, ...draft.corrections];
}

/** What a draft comes to, by the same rules as the server; the first thing missing is the one to mend first. */
export function verdictOf(
  draft: OutcomeDraft,
  subjects: readonly Subject[],
  earlier: readonly Correction[],
): OutcomeVerdict {
  const open = openAfter(draft, earlier);
  const counts = { dwv: countOf(open, 'dwv'), water: countOf(open, 'water'), work: countOf(open, 'work') };
  const blocked = (why: WhyNotRecord): OutcomeVerdict => ({ kind: null, isNotSeen: false, why, open: counts });
  if (draft.kind !== 'seen') {
    const reason = draft.kind === 'not-ready' ? draft.notReady : draft.noAccess;
    return reason === null
      ? blocked({ code: 'reason' })
      : { kind: draft.kind, isNotSeen: false, why: null, open: counts };
  }
  const why = whyNotSeen(draft, subjects, open);
  if (why !== null) return blocked(why);
  const answers = subjects.map((subject) => draft.systems[subjectKey(subject)]?.answer ?? 'not-seen');
  const hasWorkFailed = open.some((one) => one.subject === 'work' && one.severity === 'fix-before-cover');
  const { kind, reason } = outcomeOf(answers, hasWorkFailed);
  return { kind, isNotSeen: reason === 'not-seen', why: null, open: counts };
}

function countOf(open: readonly Open[], subject: CorrectionSubject): number {
  return open.filter((one) => one.subject === subject).length;
}

function whyNotSeen(draft: OutcomeDraft, subjects: readonly Subject[], open: readonly Open[]): WhyNotRecord | null {
  const answered = subjects.map((subject) => ({ subject, ...(draft.systems[subjectKey(subject)] ?? emptySystem) }));
  const isUntouched = answered.every(({ answer }) => answer === null);
  const hasNothing = draft.lookedAt.length === 0 && draft.corrections.length === 0;
  if (isUntouched && hasNothing && Object.keys(draft.decisions).length === 0) return { code: 'nothing' };
  const misread = answered.find(({ reading }) => reading.trim() !== '' && parseNumber(reading) === null);
  if (misread) return { code: 'reading', subject: misread.subject };
  const missing = answered.find(({ answer }) => answer === null);
  if (missing) return { code: 'answer', subject: missing.subject };
  if (Object.values(draft.decisions).some((one) => one.is === 'reopen' && one.why.trim() === '')) {
    return { code: 'reopen-why' };
  }
  const isOn = (subject: Subject) => (one: Open) =>
    one.unitNumber === subject.unitNumber && one.subject === subject.system;
  const bare = answered.find(({ subject, answer }) => answer === 'fail' && !open.some(isOn(subject)));
  if (bare) return { code: 'fail-bare', subject: bare.subject };
  const grave = open.filter(({ severity }) => severity === 'fix-before-cover');
  const passed = answered.find(({ subject, answer }) => answer === 'pass' && grave.some(isOn(subject)));
  return passed ? { code: 'pass-open', subject: passed.subject } : null;
}
