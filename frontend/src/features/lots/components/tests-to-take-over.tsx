import type { TestToTakeOver } from '@holdwater/shared-types/lots/lot.contract.js';
import type { TFunction } from 'i18next';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import { Numeral } from '../../../components/numeral';
import { useFieldWords } from '../../../lib/errors';
import { localName, useLocale } from '../../../lib/i18n';

export interface TestsToTakeOverProps {
  tests: readonly TestToTakeOver[];
  /** Only a plumber reads a test over; others of the organization see what stands. */
  canRead: boolean;
  typed: Readonly<Record<string, string>>;
  faults: Readonly<Record<string, string>>;
  onType: (holdId: string, value: string) => void;
}

/** The tests that stand on a lot to be taken over, each with its last reading and room for a fresh one. */
export function TestsToTakeOver({ tests, canRead, typed, faults, onType }: TestsToTakeOverProps): ReactNode {
  const { t } = useTranslation<['lots', 'common']>(['lots', 'common']);
  const locale = useLocale();
  const faultWords = useFieldWords();
  return (
    <>
      <p className="s">{t(canRead ? 'handover.standing' : 'handover.onlyPlumbers')}</p>
      <div className="fields">
        {tests.map((test) => {
          const stage = test.stageName === null ? '' : localName(test.stageName, locale);
          const unit = test.unitNumber === 1 ? '' : `${t('title.unit')} ${test.unitNumber}`;
          const system = t(`common.systems.${test.system}`);
          const name = [stage, unit, system, t('common.test', { ordinal: test.ordinal })].filter(Boolean).join(', ');
          const last = <Numeral text={lastWords(t, test)} />;
          if (!canRead) {
            return (
              <p key={test.holdId} className="spread s">
                <span>{name}</span>
                <span className="mid">{last}</span>
              </p>
            );
          }
          return (
            <Field
              key={test.holdId}
              label={name}
              isOptional
              isNumeral
              autoComplete="off"
              unit={t(test.isLevel ? 'handover.inNow' : 'handover.psiNow')}
              hint={last}
              error={faultWords(faults[test.holdId])}
              value={typed[test.holdId] ?? ''}
              onChange={(event) => onType(test.holdId, event.target.value)}
            />
          );
        })}
      </div>
    </>
  );
}

function lastWords(t: TFunction<['lots', 'common']>, { isLevel, lastPsi, lastLevelIn }: TestToTakeOver): string {
  const value = isLevel ? lastLevelIn : lastPsi;
  if (value === null) return t('handover.notRead');
  return t(isLevel ? 'handover.lastIn' : 'handover.lastPsi', { value });
}
