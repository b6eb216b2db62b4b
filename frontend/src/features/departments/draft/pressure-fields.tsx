import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import { media } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { PartFault } from './check-fields';
import { ListFields } from './list-fields';
import { NumberField, OptionalNumberField } from './text-fields';

type Pressures = TestRule['pressures'];

export interface PressureFieldsProps {
  value: Pressures;
  path: string;
  onChange: (value: Pressures) => void;
}

/** The least and the preferred pressure of each medium that is taken. */
export function PressureFields({ value, path, onChange }: PressureFieldsProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const unused = media.find((medium) => !value.some((each) => each.medium === medium)) ?? 'water';
  return (
    <ListFields
      items={value}
      fresh={() => ({ medium: unused, minimumPsi: Number.NaN, preferredPsi: null })}
      addWord={t('form.addPressure')}
      nameOf={(index) => t('form.pressure', { number: index + 1 })}
      onChange={onChange}
    >
      {(pressure, index, change) => (
        <>
          <Choice
            label={t('form.medium')}
            isLabelShown
            options={media.map((medium) => ({ value: medium, label: words.t(`media.${medium}`) }))}
            value={pressure.medium}
            onChange={(medium) => change({ ...pressure, medium })}
          />
          <PartFault path={`${path}.${index}.medium`} />
          <div className="fields two">
            <NumberField
              label={t('form.minimum')}
              unit="psi"
              path={`${path}.${index}.minimumPsi`}
              value={pressure.minimumPsi}
              onChange={(minimumPsi) => change({ ...pressure, minimumPsi })}
            />
            <OptionalNumberField
              label={t('form.preferred')}
              unit="psi"
              path={`${path}.${index}.preferredPsi`}
              value={pressure.preferredPsi}
              onChange={(preferredPsi) => change({ ...pressure, preferredPsi })}
            />
          </div>
        </>
      )}
    </ListFields>
  );
}
