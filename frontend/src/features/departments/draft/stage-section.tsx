import type { RuleCardContent, Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { CheckList } from './check-fields';
import { DraftSection } from './draft-section';
import { freshCode } from './fresh-code';
import { ListFields } from './list-fields';
import { findTestIndex, withoutStage, withStage } from './stages-of-draft';
import { TestFields } from './test-fields';
import { NumberField, OwnWordsFields, TextField } from './text-fields';

export interface StageSectionProps {
  content: RuleCardContent;
  index: number;
  onChange: (path: string, content: RuleCardContent) => void;
}

/** One stage: its name and place, what is looked at, and how each of its systems is tested. */
export function StageSection({ content, index, onChange }: StageSectionProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const stage = content.stages[index];
  if (stage === undefined) return null;
  const at = (name: string): string => `stages.${index}.${name}`;
  const tests = stage.systems.map((system) => findTestIndex(content, stage.code, system)).filter((test) => test >= 0);
  const set = (change: Partial<Stage>): void =>
    onChange(at(Object.keys(change)[0] ?? ''), withStage(content, index, { ...stage, ...change }));
  const paths = [`stages.${index}`, ...tests.map((test) => `tests.${test}`)];
  return (
    <DraftSection title={words.name(stage.name) || t('form.newStage')} paths={paths}>
      <OwnWordsFields label={t('form.name')} path={at('name')} value={stage.name} onChange={(name) => set({ name })} />
      <div className="fields two">
        <TextField
          label={words.t('rows.code')}
          path={at('inspectionCode')}
          value={stage.inspectionCode}
          maxLength={20}
          isOptional
          onChange={(inspectionCode) => set({ inspectionCode })}
        />
        <TextField
          label={t('form.stageCode')}
          hint={t('form.stageCodeHint')}
          path={at('code')}
          value={stage.code}
          maxLength={40}
          onChange={(code) => set({ code })}
        />
        <NumberField
          label={words.t('rows.order')}
          path={at('order')}
          value={stage.order}
          onChange={(order) => set({ order })}
        />
        <NumberField
          label={words.t('rows.minutes')}
          unit="min"
          path={at('minutesPerVisit')}
          value={stage.minutesPerVisit}
          onChange={(minutesPerVisit) => set({ minutesPerVisit })}
        />
      </div>
      <Choice
        label={words.t('rows.covers')}
        isLabelShown
        options={(['slab', 'wall', 'nothing'] as const).map((each) => ({
          value: each,
          label: words.t(`says.covers.${each}`),
        }))}
        value={stage.covers ?? 'nothing'}
        onChange={(covers) => set({ covers: covers === 'nothing' ? null : covers })}
      />
      <CheckList
        label={words.t('rows.systems')}
        path={at('systems')}
        options={(['dwv', 'water'] as const).map((each) => ({ value: each, label: words.t(`says.systems.${each}`) }))}
        value={stage.systems}
        whenNone={words.t('says.notTested')}
        onChange={(systems) => set({ systems })}
      />
      {tests.map((test) => (
        <TestFields key={test} content={content} index={test} onChange={onChange} />
      ))}
      <WorkFields stage={stage} path={at('work')} onChange={(work) => set({ work })} />
      {content.stages.length > 1 ? (
        <Act kind="text" size="sm" onClick={() => onChange('stages', withoutStage(content, index))}>
          {t('form.takeOutStage', { stage: words.name(stage.name) })}
        </Act>
      ) : null}
    </DraftSection>
  );
}

function WorkFields(props: { stage: Stage; path: string; onChange: (work: Stage['work']) => void }): ReactNode {
  const { stage, path, onChange } = props;
  const { t } = useTranslation('departments');
  return (
    <ListFields
      items={stage.work}
      fresh={() => ({ code: freshCode(stage.work), label: { en: '' } })}
      addWord={t('form.addPoint')}
      nameOf={(index) => t('form.point', { number: index + 1 })}
      onChange={onChange}
    >
      {(point, index, change) => (
        <OwnWordsFields
          label={t('form.words')}
          path={`${path}.${index}.label`}
          value={point.label}
          onChange={(label) => change({ ...point, label })}
        />
      )}
    </ListFields>
  );
}
