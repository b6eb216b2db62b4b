import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { severities } from '@holdwater/shared-types/outcomes/correction.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useRuleCardWords } from '../rule-card-words';
import { CheckList } from './check-fields';
import { DraftSection } from './draft-section';
import { freshCode } from './fresh-code';
import { ListFields } from './list-fields';
import { OwnWordsFields, TextField } from './text-fields';

type Corrections = RuleCardContent['corrections'];

/** Corrections written often, the department's code sections, and what a photo is enough for. */
export function CorrectionsSection(props: {
  value: Corrections;
  onChange: (path: string, value: Corrections) => void;
}): ReactNode {
  const { value, onChange } = props;
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const set = (change: Partial<Corrections>): void =>
    onChange(`corrections.${Object.keys(change)[0]}`, { ...value, ...change });
  return (
    <DraftSection title={words.t('notes.corrections')} paths={['corrections']}>
      <CheckList
        label={words.t('rows.fromPhoto')}
        path="corrections.acceptFromPhoto"
        options={severities.map((each) => ({ value: each, label: words.t(`severities.${each}`) }))}
        value={value.acceptFromPhoto}
        whenNone={words.t('says.onSiteOnly')}
        onChange={(acceptFromPhoto) => set({ acceptFromPhoto })}
      />
      <ListFields
        items={value.frequent}
        fresh={() => ({ code: freshCode(value.frequent), label: { en: '' }, section: null })}
        addWord={t('form.addFrequent')}
        nameOf={(index) => t('form.frequent', { number: index + 1 })}
        onChange={(frequent) => set({ frequent })}
      >
        {(item, index, change) => (
          <>
            <OwnWordsFields
              label={t('form.words')}
              path={`corrections.frequent.${index}.label`}
              value={item.label}
              onChange={(label) => change({ ...item, label })}
            />
            <TextField
              label={t('form.section')}
              path={`corrections.frequent.${index}.section`}
              value={item.section ?? ''}
              maxLength={40}
              isOptional
              onChange={(section) => change({ ...item, section: section === '' ? null : section })}
            />
          </>
        )}
      </ListFields>
      <ListFields
        items={value.sections}
        fresh={() => ({ section: '', says: { en: '' } })}
        addWord={t('form.addSection')}
        nameOf={(index) => t('form.sectionNamed', { number: index + 1 })}
        onChange={(sections) => set({ sections })}
      >
        {(item, index, change) => (
          <>
            <TextField
              label={t('form.section')}
              path={`corrections.sections.${index}.section`}
              value={item.section}
              maxLength={40}
              onChange={(section) => change({ ...item, section })}
            />
            <OwnWordsFields
              label={t('form.says')}
              path={`corrections.sections.${index}.says`}
              value={item.says}
              onChange={(says) => change({ ...item, says })}
            />
          </>
        )}
      </ListFields>
    </DraftSection>
  );
}
