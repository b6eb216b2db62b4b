import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { PartFault } from './check-fields';
import { NumberField } from './text-fields';

type HeadRule = TestRule['headRule'];

export interface HeadRuleFieldsProps {
  value: HeadRule;
  path: string;
  onChange: (value: HeadRule) => void;
}

/** How high the water stands: at the level of the method, or so many feet above the highest fitting. */
export function HeadRuleFields({ value, path, onChange }: HeadRuleFieldsProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  return (
    <>
      <Choice
        label={words.t('rows.level')}
        isLabelShown
        stacked
        options={(['fill-level', 'above-highest-fitting', 'none'] as const).map((kind) => ({
          value: kind,
          label: t(`form.level.${kind}`),
        }))}
        value={value?.kind ?? 'none'}
        onChange={(kind) =>
          onChange(kind === 'none' ? null : { kind, feet: kind === 'fill-level' ? null : (value?.feet ?? Number.NaN) })
        }
      />
      <PartFault path={path} />
      {value?.kind === 'above-highest-fitting' ? (
        <NumberField
          label={t('form.feet')}
          unit="ft"
          path={`${path}.feet`}
          value={value.feet ?? Number.NaN}
          onChange={(feet) => onChange({ ...value, feet })}
        />
      ) : null}
    </>
  );
}
