import type { ModelledUnit } from '@holdwater/shared-types/lots/house-model.contract.js';
import { useEffect, useRef, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { ownHouseAnswers, unitKey, type OwnHouseAnswer, type OwnHouseAnswers } from '../house-apply-model';
import { useHouseChangeWords } from '../house-change-words';
import { UnitName } from './house-apply-list';

export interface HouseAskProps {
  units: readonly ModelledUnit[];
  answers: OwnHouseAnswers;
  onAnswer: (unit: ModelledUnit, answer: OwnHouseAnswer) => void;
}

/** Names the houses measured or changed on their lot and asks of each what becomes of it; untouched unless somebody says so. */
export function HouseAsk({ units, answers, onAnswer }: HouseAskProps): ReactNode {
  const { t } = useTranslation('houses');
  const changeWords = useHouseChangeWords();
  const title = useRef<HTMLHeadingElement>(null);
  useEffect(() => title.current?.focus(), []);
  return (
    <section className="house-ask" aria-labelledby="house-ask-title">
      <h2 className="h2" id="house-ask-title" tabIndex={-1} ref={title}>
        {t('ask.title', { count: units.length })}
      </h2>
      <p className="mid">{t('ask.text')}</p>
      <ul className="part-list">
        {units.map((unit) => (
          <li key={unitKey(unit)}>
            <UnitName unit={unit} />
            <p className="s mid">
              {unit.origin === null
                ? t('apply.state.byHand')
                : t('ask.changed', { parts: changeWords(unit.origin.changes) })}
            </p>
            <Choice
              label={t('ask.choice', { number: unit.lotNumber, unit: unit.unitLabel })}
              options={ownHouseAnswers
                .filter((answer) => answer !== 'keep-changes' || unit.canKeepChanges)
                .map((value) => ({ value, label: t(`ask.answers.${value}`) }))}
              value={answers[unitKey(unit)] ?? 'leave'}
              onChange={(answer) => onAnswer(unit, answer)}
            />
          </li>
        ))}
      </ul>
    </section>
  );
}
