import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { PartFault } from './check-fields';
import { ListFields } from './list-fields';
import { NumberField } from './text-fields';

type Increments = TestRule['gaugeIncrements'];

export interface GaugeFieldsProps {
  value: Increments;
  path: string;
  onChange: (value: Increments) => void;
}

/** How fine the marks of the gauge must be, by the pressure of the test. */
export function GaugeFields({ value, path, onChange }: GaugeFieldsProps): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <ListFields
      items={value}
      fresh={() => ({ upToPsi: 100, incrementPsi: 1 })}
      addWord={t('form.addGauge')}
      nameOf={(index) => t('form.gauge', { number: index + 1 })}
      onChange={onChange}
    >
      {(rule, index, change) => (
        <>
          <Choice
            label={t('form.gaugeBy')}
            options={(['marks', 'percent'] as const).map((each) => ({
              value: each,
              label: t(`form.gaugeKinds.${each}`),
            }))}
            value={'percent' in rule ? 'percent' : 'marks'}
            onChange={(kind) => change(kind === 'percent' ? { percent: 2 } : { upToPsi: 100, incrementPsi: 1 })}
          />
          {'percent' in rule ? (
            <NumberField
              label={t('form.percent')}
              unit="%"
              path={`${path}.${index}.percent`}
              value={rule.percent}
              onChange={(percent) => change({ percent })}
            />
          ) : (
            <div className="fields two">
              <NumberField
                label={t('form.upToPsi')}
                unit="psi"
                path={`${path}.${index}.upToPsi`}
                value={rule.upToPsi}
                onChange={(upToPsi) => change({ ...rule, upToPsi })}
              />
              <NumberField
                label={t('form.incrementPsi')}
                unit="psi"
                path={`${path}.${index}.incrementPsi`}
                value={rule.incrementPsi}
                onChange={(incrementPsi) => change({ ...rule, incrementPsi })}
              />
            </div>
          )}
          <PartFault path={`${path}.${index}`} />
        </>
      )}
    </ListFields>
  );
}
