import { withdrawReasons, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Numeral } from '../../../components/numeral';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useTimeWords } from '../../../lib/time';
import { useEndVisit, type EndMove, type EndWords } from '../use-end-visit';
import '../visit.css';

export type { EndMove } from '../use-end-visit';

export interface EndQuestionProps {
  visit: VisitSummary;
  move: EndMove;
  onKeep: () => void;
  onEnded: () => void;
}

/** The desk's own words are asked for where the other side is told why. */
const needsWords: readonly EndMove[] = ['decline', 'free-closure'];

/** One question before a visit ends or goes back: who is told, and why it ends. */
export function EndQuestion({ visit, move, onKeep, onEnded }: EndQuestionProps): ReactNode {
  const { t } = useTranslation(['visits', 'common', 'errors']);
  const words = useTimeWords();
  const [values, setValues] = useState<EndWords>({ reason: 'weather', note: '' });
  const [isTried, setIsTried] = useState(false);
  const lot = t('common.lot', { number: visit.lotNumber });
  const when = words.dayWindow(visit.window.startAt, visit.window.endAt, visit.zone);
  const ending = useEndVisit(move, () => {
    sayDone({ mark: doneMarks[move], title: t(`end.${move}.done`, { lot, when }), text: t('done.told') });
    onEnded();
  });
  const error = useErrorWords(ending.error);
  const isMissing = needsWords.includes(move) && values.note.trim() === '';
  const told = [visit.builderName, visit.plumberName, visit.departmentName].filter((name) => name !== null);
  const end = (): void => {
    setIsTried(true);
    if (!isMissing) ending.end(visit, values);
  };
  return (
    <Question
      isOpen
      title={<Numeral text={t(`end.${move}.title`, { lot: t('word.lot', { number: visit.lotNumber }), when })} />}
      keepWord={t(`end.${move}.keep`)}
      endWord={t(`end.${move}.act`)}
      endKind={move === 'not-reached' ? 'first' : 'ending'}
      busy={ending.isPending}
      error={error === null ? undefined : `${error.title}. ${error.safe} ${error.next}`}
      onKeep={onKeep}
      onEnd={end}
    >
      <p>{t(`end.${move}.told`, { told: told.join(', ') })}</p>
      <div className="fields end-fields">
        {move === 'withdraw' ? (
          <Field label={t('end.reason')}>
            {(control) => (
              <select
                {...control}
                value={values.reason}
                onChange={(event) => {
                  const reason = withdrawReasons.find((one) => one === event.target.value);
                  if (reason !== undefined) setValues({ ...values, reason });
                }}
              >
                {withdrawReasons.map((reason) => (
                  <option key={reason} value={reason}>
                    {t(`reasons.${reason}`)}
                  </option>
                ))}
              </select>
            )}
          </Field>
        ) : null}
        <Field
          label={needsWords.includes(move) ? t('end.why') : t('end.note')}
          isOptional={!needsWords.includes(move)}
          error={isTried && isMissing ? t('errors.fields.required') : undefined}
        >
          {(control) => (
            <textarea
              {...control}
              rows={2}
              maxLength={500}
              value={values.note}
              onChange={(event) => setValues({ ...values, note: event.target.value })}
            />
          )}
        </Field>
      </div>
    </Question>
  );
}

const doneMarks = {
  withdraw: 'withdrawn',
  decline: 'declined',
  'not-reached': 'requested',
  'free-closure': 'freed',
} as const;
