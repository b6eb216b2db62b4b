import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Question } from '../../../components/question';
import { useErrorWords, useFieldWords } from '../../../lib/errors';
import { useMe } from '../../../lib/session-context';
import { useStrikeReading } from '../api/strike-reading';
import { mayStrike } from '../may-strike';
import '../strike.css';

export interface StrikeReadingProps {
  hold: Hold;
  reading: Reading;
  abilities: Pick<LotAbilities, 'canTest' | 'canAddReading'>;
  /** "57 psi" */
  value: string;
  /** "Tue, Apr 14, 5:08 pm" */
  at: string;
}

/** The contract's own limit of the reason. */
const whyLimit = 300;

/** Strikes a reading, with its reason, after one question. Nothing for whoever may not. */
export function StrikeReading(props: StrikeReadingProps): ReactNode {
  const { t } = useTranslation('holds');
  const me = useMe();
  const [isAsking, setIsAsking] = useState(false);
  const { hold, reading, abilities, value, at } = props;
  if (!mayStrike(hold, reading, abilities, me)) return null;
  return (
    <>
      <Act
        kind="text"
        size="sm"
        className="strike-act"
        aria-label={t('strike.named', { value, at })}
        onClick={() => setIsAsking(true)}
      >
        {t('strike.act')}
      </Act>
      {isAsking ? <StrikeQuestion {...props} onLeave={() => setIsAsking(false)} /> : null}
    </>
  );
}

function StrikeQuestion({
  hold,
  reading,
  value,
  at,
  onLeave,
}: StrikeReadingProps & { onLeave: () => void }): ReactNode {
  const { t } = useTranslation('holds');
  const fieldWords = useFieldWords();
  const [typed, setTyped] = useState('');
  const [isTried, setIsTried] = useState(false);
  const striking = useStrikeReading(hold.lotId, () => {
    sayDone({ mark: 'test-few', title: t('strike.done', { value }) });
    onLeave();
  });
  const fault = useErrorWords(striking.error);
  const why = typed.trim();
  return (
    <Question
      isOpen
      title={t('strike.title', { value, at })}
      keepWord={t('strike.keep')}
      endWord={t('strike.word')}
      busy={striking.isPending}
      error={fault === null ? undefined : `${fault.title}. ${fault.next}`}
      onKeep={onLeave}
      onEnd={() => {
        setIsTried(true);
        if (why !== '') striking.mutate({ readingId: reading.id, why });
      }}
    >
      <p>{t('strike.told')}</p>
      <Field label={t('strike.why')} error={isTried && why === '' ? fieldWords('required') : undefined}>
        {(control) => (
          <textarea
            {...control}
            rows={2}
            maxLength={whyLimit}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
          />
        )}
      </Field>
    </Question>
  );
}
