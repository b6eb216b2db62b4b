import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { offeredDefaults } from '@holdwater/shared-types/departments/rule-card-defaults.js';
import { ruleCardNotes } from '@holdwater/shared-types/departments/rule-card-rows.js';
import { sourcedFields, type SourcedField } from '@holdwater/shared-types/departments/rule-card-rows.sources.js';
import { findSource, withDefault } from '@holdwater/shared-types/departments/rule-card-sources.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { useRuleCardWords } from '../rule-card-words';

export interface ModelCodeOffersProps {
  content: RuleCardContent;
  testIndex: number;
  field: SourcedField;
  onChange: (path: string, content: RuleCardContent) => void;
}

/** Where a value comes from, and what the model codes offer for it, each with its section; local amendments decide. */
export function ModelCodeOffers({ content, testIndex, field, onChange }: ModelCodeOffersProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const test = content.tests[testIndex];
  if (test === undefined) return null;
  const source = findSource(content, testIndex, field);
  const offers = offeredDefaults(test, field).filter(
    ({ from, section }) => source === null || source.from !== from || source.section !== section,
  );
  return (
    <div className="model-code s mid">
      <span>{source === null ? t('form.local') : t('form.fromCode', { ...source })}</span>
      {offers.map((offered) => {
        const taken = withDefault(content, testIndex, offered);
        const row = ruleCardNotes(taken, test.stageCode)
          .find(({ key }) => key === test.system)
          ?.rows.find(({ key }) => key === sourcedFields[field]);
        const says = row?.lines(words).join('; ') ?? '';
        return (
          <Act
            key={`${offered.from} ${offered.section} ${says}`}
            kind="text"
            size="sm"
            onClick={() => onChange(`tests.${testIndex}.${field}`, taken)}
          >
            {t('form.useCode', { from: offered.from, section: offered.section, says })}
          </Act>
        );
      })}
    </div>
  );
}
