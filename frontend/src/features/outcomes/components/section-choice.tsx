import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { localName, useLocale } from '../../../lib/i18n';
import type { ContractForm } from '../../../lib/use-contract-form';
import type { CorrectionDraft } from '../correction-draft';

export interface SectionChoiceProps {
  form: ContractForm<CorrectionDraft>;
  sections: RuleCardContent['corrections']['sections'];
}

/** The code section: one of the department's list, or typed where it has none. */
export function SectionChoice({ form, sections }: SectionChoiceProps): ReactNode {
  const { t } = useTranslation('outcomes');
  const locale = useLocale();
  const { section } = form.values;
  const chosen = sections.find((one) => one.section === section);
  const says = chosen === undefined ? undefined : localName(chosen.says, locale);
  return (
    <Panel title={t('correction.section')}>
      {sections.length === 0 ? (
        <Field
          label={t('correction.sectionTyped')}
          isOptional
          maxLength={40}
          value={section}
          error={form.faultOf('section')}
          onChange={(event) => form.set('section', event.target.value)}
        />
      ) : (
        <Field label={t('correction.sectionTyped')} isOptional isNumeral hint={says} error={form.faultOf('section')}>
          {(control) => (
            <select {...control} value={section} onChange={(event) => form.set('section', event.target.value)}>
              <option value="">{t('correction.noSection')}</option>
              {sections.map((one) => (
                <option key={one.section} value={one.section}>
                  {one.section}
                </option>
              ))}
            </select>
          )}
        </Field>
      )}
    </Panel>
  );
}
