import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useTranslation } from 'react-i18next';
import { sayDone } from '../../components/done-line';
import { useErrorWords } from '../../lib/errors';
import { findStanding, isLevelTest } from '../holds/standing-tests';
import { useRecordOutcome } from './api/record-outcome';
import type { OutcomeFormProps } from './components/outcome-form';
import {
  earlierOf,
  emptySystem,
  subjectKey,
  subjectsOf,
  toRecord,
  type Decision,
  type Subject,
  type SystemDraft,
} from './outcome-draft';
import { verdictOf } from './outcome-verdict';
import { useKeptOutcome } from './use-kept-outcome';

/** The draft of an outcome, what it comes to, and the act that records it. */
export function useOutcomeForm({ visit, lot, stage, holds, corrections }: OutcomeFormProps) {
  const { t } = useTranslation(['outcomes', 'marks']);
  const earlier = earlierOf(corrections, visit);
  const kept = useKeptOutcome(visit.id, earlier);
  const { draft, setDraft } = kept;
  const recording = useRecordOutcome(visit.id, visit.lotId, ({ outcome }) => {
    kept.drop();
    sayDone({
      mark: outcome.kind,
      title: t('done.title', { lot: visit.lotNumber, outcome: t(`marks.${outcome.kind}`) }),
      text: t('done.text'),
      link: { to: '/run', word: t('done.run') },
    });
  });
  const words = useErrorWords(recording.error);
  const subjects = subjectsOf(visit, stage);
  const verdict = verdictOf(draft, subjects, earlier);
  const lastNumber = Math.max(0, ...corrections.map(({ number }) => number));
  const holdOf = (subject: Subject): Hold | null => findStanding(holds, subject, visit.stageCode);
  const isLevel = (subject: Subject): boolean => {
    const hold = holdOf(subject);
    return hold === null ? subject.system === 'dwv' : isLevelTest(hold);
  };
  const record = (): void => {
    if (verdict.kind === null) return;
    recording.mutate(toRecord(draft, subjects, visit.version, isLevel));
  };
  return {
    ...kept,
    subjects,
    earlier,
    verdict,
    holdOf,
    isLevel,
    houseOf: (unitNumber: number): HouseGeometry | null =>
      lot.units.find(({ number }) => number === unitNumber)?.geometry ?? null,
    systemOf: (subject: Subject): SystemDraft => draft.systems[subjectKey(subject)] ?? emptySystem,
    faultOf: (subject: Subject): string | undefined => {
      const { why } = verdict;
      if (why === null || !('subject' in why) || subjectKey(why.subject) !== subjectKey(subject)) return undefined;
      return why.code === 'fail-bare' || why.code === 'pass-open' ? t(`fault.${why.code}`) : undefined;
    },
    /** The numbers they will bear, if nobody else opens one on this lot meanwhile. */
    numbered: draft.corrections.map((correction, index) => ({ correction, number: lastNumber + index + 1 })),
    numberOf: (clientId: string | null): number => {
      const index = draft.corrections.findIndex((one) => one.clientId === clientId);
      return lastNumber + (index < 0 ? draft.corrections.length : index) + 1;
    },
    putCorrection: (correction: NewCorrection) =>
      setDraft((before) => ({ ...before, corrections: withCorrection(before.corrections, correction) })),
    dropCorrection: (clientId: string) =>
      setDraft((before) => ({
        ...before,
        corrections: before.corrections.filter((one) => one.clientId !== clientId),
      })),
    look: (code: string, isLookedAt: boolean) =>
      setDraft((before) => ({
        ...before,
        lookedAt: isLookedAt ? [...before.lookedAt, code] : before.lookedAt.filter((one) => one !== code),
      })),
    decide: (correctionId: string, decision: Decision | null) =>
      setDraft((before) => {
        const { [correctionId]: _before, ...others } = before.decisions;
        return { ...before, decisions: decision === null ? others : { ...others, [correctionId]: decision } };
      }),
    record,
    isSending: recording.isPending,
    error: recording.error,
    errorWords: words === null ? undefined : `${words.title}. ${words.next}`,
  };
}

function withCorrection(corrections: readonly NewCorrection[], next: NewCorrection): NewCorrection[] {
  const isKnown = corrections.some((one) => one.clientId === next.clientId);
  return isKnown ? corrections.map((one) => (one.clientId === next.clientId ? next : one)) : [...corrections, next];
}
