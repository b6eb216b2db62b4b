import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { StateWord } from '../../../components/state-word';
import type { Decision } from '../outcome-draft';
import { placeWords } from '../place-words';

export interface EarlierCorrectionsProps {
  corrections: readonly Correction[];
  decisions: Readonly<Record<string, Decision>>;
  onDecide: (correctionId: string, decision: Decision | null) => void;
  /** The reasons that are missing are marked. */
  areFaultsShown: boolean;
}

/** Corrections of before: the fixed ones are accepted or reopened here, the open ones are told. */
export function EarlierCorrections(props: EarlierCorrectionsProps): ReactNode {
  const { t } = useTranslation('outcomes');
  if (props.corrections.length === 0) return null;
  return (
    <Panel title={t('earlier.title')} isFlush>
      <ul className="earlier">
        {props.corrections.map((correction) => (
          <EarlierCorrection key={correction.id} {...props} correction={correction} />
        ))}
      </ul>
    </Panel>
  );
}

function EarlierCorrection(props: EarlierCorrectionsProps & { correction: Correction }): ReactNode {
  const { correction, decisions, onDecide, areFaultsShown } = props;
  const { t } = useTranslation(['outcomes', 'marks', 'errors']);
  const decision = decisions[correction.id];
  const place = placeWords(t, correction);
  return (
    <li>
      <div className="row">
        <StateWord
          state={`correction-${correction.state}`}
          number={correction.number}
          size={28}
          word={t('correction.number', { number: correction.number })}
        />
        <span className="s mid">{t(`marks.correction-${correction.state}`)}</span>
      </div>
      <p>
        {place === '' ? null : `${place}: `}
        {correction.text}
      </p>
      {correction.fixNote === null ? null : (
        <p className="s mid">{t('earlier.fixNote', { name: correction.fixedBy ?? '', note: correction.fixNote })}</p>
      )}
      {correction.state === 'fixed' ? (
        <Choice
          label={t('earlier.decide', { number: correction.number })}
          options={[
            { value: 'accept', label: t('earlier.accept'), mark: 'correction-accepted' },
            { value: 'reopen', label: t('earlier.reopen') },
            { value: 'leave', label: t('earlier.leave') },
          ]}
          value={decision?.is ?? 'leave'}
          onChange={(is) =>
            onDecide(
              correction.id,
              is === 'leave' ? null : is === 'accept' ? { is: 'accept' } : { is: 'reopen', why: '' },
            )
          }
        />
      ) : null}
      {decision?.is === 'reopen' ? (
        <Field
          label={t('earlier.why')}
          maxLength={500}
          value={decision.why}
          error={areFaultsShown && decision.why.trim() === '' ? t('errors.fields.required') : undefined}
          onChange={(event) => onDecide(correction.id, { is: 'reopen', why: event.target.value })}
        />
      ) : null}
    </li>
  );
}
