import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { Question } from '../../../components/question';
import { StateWord } from '../../../components/state-word';
import { TaskFoot } from '../../../components/task-head';
import type { OutcomeDraft } from '../outcome-draft';
import type { OutcomeVerdict, WhyNotRecord } from '../outcome-verdict';

export interface OutcomeFootProps {
  visit: VisitSummary;
  stage: Stage;
  draft: OutcomeDraft;
  verdict: OutcomeVerdict;
  busy: boolean;
  /** Why it did not go through, said in the question. */
  error: ReactNode;
  onRecord: () => void;
}

/** Says what will be recorded, and records it after one question. */
export function OutcomeFoot(props: OutcomeFootProps): ReactNode {
  const { visit, verdict, busy, error, onRecord } = props;
  const { t } = useTranslation('outcomes');
  const [isAsking, setIsAsking] = useState(false);
  const why = useRecordWhy(visit.unitNumbers.length > 1);
  const { kind } = verdict;
  const isEnding = kind !== 'pass';
  const sentence = useSentence(props);
  return (
    <TaskFoot
      note={
        kind === null ? null : (
          <p className="row">
            <StateWord state={kind} word={t(`foot.${kind}`)} size={24} />
            <span className="s">
              <Numeral text={sentence} />
            </span>
          </p>
        )
      }
    >
      <Act
        size="lg"
        kind={isEnding ? 'ending' : 'first'}
        cannotYet={verdict.why === null ? undefined : why(verdict.why)}
        busy={busy}
        onClick={() => setIsAsking(true)}
      >
        {t(kind === null ? 'foot.record' : `foot.record-${kind}`)}
      </Act>
      <Question
        isOpen={isAsking && kind !== null}
        title={t(`ask.title-${kind ?? 'fail'}`, { lot: visit.lotNumber })}
        keepWord={t('ask.keep')}
        endWord={t(`foot.record-${kind ?? 'fail'}`)}
        endKind={isEnding ? 'ending' : 'first'}
        busy={busy}
        error={error}
        onKeep={() => setIsAsking(false)}
        onEnd={onRecord}
      >
        <p>{sentence}</p>
        <p>
          {t(visit.plumberName === null ? 'ask.toldTwo' : 'ask.told', {
            builder: visit.builderName,
            plumber: visit.plumberName ?? '',
          })}
        </p>
      </Question>
    </TaskFoot>
  );
}

/** "DWV 1, the work 1. Prints 6 of 8 lines." */
function useSentence({ stage, draft, verdict }: OutcomeFootProps): string {
  const { t } = useTranslation(['outcomes', 'common']);
  if (draft.kind !== 'seen') return '';
  const { open } = verdict;
  const counts = [
    ...(['dwv', 'water'] as const).map((system) => [t(`common.systems.${system}`), open[system]] as const),
    [t('foot.work'), open.work] as const,
  ].filter(([, count]) => count > 0);
  const found = counts.map(([name, count]) => `${name} ${count}`).join(', ');
  const prints = t('foot.prints', { count: draft.lookedAt.length, of: stage.work.length });
  const why = verdict.isNotSeen ? t('foot.notSeen') : found === '' ? '' : `${t('foot.corrections', { found })}`;
  return [why, stage.work.length > 0 ? prints : ''].filter(Boolean).join(' ');
}

/** Why nothing can be recorded yet, in a few words. */
export function useRecordWhy(hasUnits: boolean): (why: WhyNotRecord) => string {
  const { t } = useTranslation(['outcomes', 'common']);
  return (why) => {
    if (!('subject' in why)) return t(`why.${why.code}`);
    const { system, unitNumber } = why.subject;
    const name = t(`common.systems.${system}`);
    const subject = hasUnits ? t('subject.ofUnit', { system: name, unit: unitNumber }) : name;
    return t(`why.${why.code}`, { subject });
  };
}
