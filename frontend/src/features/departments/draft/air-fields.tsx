import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useRuleCardWords } from '../rule-card-words';
import { CheckField } from './check-fields';
import { OptionalNumberField } from './text-fields';

export interface AirFieldsProps {
  test: TestRule;
  path: string;
  onChange: (change: Pick<TestRule, 'airOnPlastic'> | Pick<TestRule, 'airRules'>) => void;
}

const none = { highestPsi: null, needsMakersConsent: false, needsReliefValve: false };

/** Whether air may go on plastic pipe, and what else is asked where a test is made with air. */
export function AirFields({ test, path, onChange }: AirFieldsProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const rules = test.airRules ?? none;
  return (
    <fieldset className="check-list">
      <legend className="lab">{words.t('rows.airRules')}</legend>
      <CheckField
        label={t('form.airOnPlastic')}
        value={test.airOnPlastic}
        onChange={(airOnPlastic) => onChange({ airOnPlastic })}
      />
      <CheckField
        label={words.t('says.airConsent')}
        value={rules.needsMakersConsent}
        onChange={(needsMakersConsent) => onChange({ airRules: { ...rules, needsMakersConsent } })}
      />
      <CheckField
        label={words.t('says.airRelief')}
        value={rules.needsReliefValve}
        onChange={(needsReliefValve) => onChange({ airRules: { ...rules, needsReliefValve } })}
      />
      <OptionalNumberField
        label={t('form.highestAir')}
        unit="psi"
        path={`${path}.highestPsi`}
        value={rules.highestPsi}
        onChange={(highestPsi) => onChange({ airRules: { ...rules, highestPsi } })}
      />
    </fieldset>
  );
}
