import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { localName, useLocale } from '../../../lib/i18n';
import type { ContractForm } from '../../../lib/use-contract-form';
import type { CorrectionDraft } from '../correction-draft';

export interface CorrectionWhatProps {
  form: ContractForm<CorrectionDraft>;
  rules: RuleCardContent['corrections'];
}

/** What: the department's frequent ones fill words and section, which can then be changed. */
export function CorrectionWhat({ form, rules }: CorrectionWhatProps): ReactNode {
  const { t } = useTranslation('outcomes');
  const locale = useLocale();
  const { text } = form.values;
  const words = rules.frequent.map((one) => ({ ...one, said: sentence(localName(one.label, locale)) }));
  const choose = (code: string): void => {
    const chosen = words.find((one) => one.code === code);
    if (chosen === undefined) return;
    form.set('text', chosen.said);
    form.set('section', chosen.section ?? '');
  };
  return (
    <Panel title={t('correction.what')}>
      <div className="fields">
        {words.length === 0 ? null : (
          <div className="frequent" role="group" aria-label={t('correction.frequent')}>
            {words.map((one) => {
              const isOn = text.startsWith(one.said);
              return (
                <button
                  key={one.code}
                  type="button"
                  aria-pressed={isOn}
                  className={isOn ? 'on dimmed' : undefined}
                  onClick={() => choose(one.code)}
                >
                  {localName(one.label, locale)}
                </button>
              );
            })}
          </div>
        )}
        <Field label={t('correction.inWords')} error={form.faultOf('text')}>
          {(control) => (
            <textarea
              {...control}
              rows={2}
              maxLength={1000}
              value={text}
              onChange={(event) => form.set('text', event.target.value)}
            />
          )}
        </Field>
      </div>
    </Panel>
  );
}

/** The chip's words as the beginning of a sentence. */
function sentence(words: string): string {
  return words.charAt(0).toLocaleUpperCase() + words.slice(1);
}
