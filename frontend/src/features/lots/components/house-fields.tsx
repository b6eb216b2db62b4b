import { materials } from '@holdwater/shared-types/hydraulics/materials.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import type { ContractForm } from '../../../lib/use-contract-form';
import type { HouseDraft, NumberField } from '../house-draft';

export interface HouseFieldsProps {
  form: ContractForm<HouseDraft>;
}

const heights: readonly NumberField[] = [
  'lowestFittingFt',
  'highestFittingFt',
  'ventTerminalFt',
  'atticCutFt',
  'standpipeFt',
];
const waterHeights: readonly NumberField[] = ['gaugeFt', 'highestOutletFt', 'waterLowestFittingFt'];
const pressures: readonly NumberField[] = ['lowestRatedPsi', 'lowestRatedAirPsi', 'supplyPsi'];

function Measured({ form, name, unit }: HouseFieldsProps & { name: NumberField; unit?: string }): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <Field
      label={t(`house.fields.${name}`)}
      isNumeral
      isOptional
      inputMode="text"
      unit={unit}
      value={form.values[name]}
      error={form.faultOf(name)}
      onChange={(event) => form.set(name, event.target.value)}
    />
  );
}

/** Heights of the drain, waste and vent side, and what it is made of. */
export function HeightFields({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  return (
    <div className="fields two">
      {heights.map((name) => (
        <Measured key={name} form={form} name={name} unit="ft" />
      ))}
      <Measured form={form} name="cappedVents" />
      <Field label={t('house.fields.pipeMaterial')} isOptional error={form.faultOf('pipeMaterial')}>
        {(control) => (
          <select
            {...control}
            value={form.values.pipeMaterial}
            onChange={(event) => form.set('pipeMaterial', event.target.value)}
          >
            <option value="">{t('house.notKnown')}</option>
            {materials.map((material) => (
              <option key={material} value={material}>
                {t(`materials.${material}`)}
              </option>
            ))}
          </select>
        )}
      </Field>
      <Measured form={form} name="elevationFt" unit="ft" />
    </div>
  );
}

/** The laundry: its floor, and the heights a test through it needs. */
export function LaundryFields({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const { laundry, floors } = form.values;
  const names = floors.map(({ name }) => name.trim()).filter((name) => name !== '');
  const known = laundry.floor === '' || names.includes(laundry.floor) ? names : [...names, laundry.floor];
  return (
    <div className="fields two">
      <Field label={t('house.fields.laundryFloor')} error={form.faultOf('laundry.floor')}>
        {(control) => (
          <select
            {...control}
            value={laundry.floor}
            onChange={(event) => form.set('laundry', { ...laundry, floor: event.target.value })}
          >
            <option value="">{t('house.noLaundry')}</option>
            {known.map((name) => (
              <option key={name} value={name}>
                {name}
              </option>
            ))}
          </select>
        )}
      </Field>
      {laundry.floor === ''
        ? null
        : (['boxOutletFt', 'branchFt'] as const).map((name) => (
            <Field
              key={name}
              label={t(`house.fields.${name}`)}
              isNumeral
              isOptional
              inputMode="text"
              unit="ft"
              value={laundry[name]}
              error={form.faultOf(`laundry.${name}`)}
              onChange={(event) => form.set('laundry', { ...laundry, [name]: event.target.value })}
            />
          ))}
    </div>
  );
}

/** The water side: heights of the gauge and of the ends of the lines, materials and ratings. */
export function WaterFields({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const { waterPipeMaterials: chosen } = form.values;
  return (
    <div className="fields">
      <div className="fields two">
        {waterHeights.map((name) => (
          <Measured key={name} form={form} name={name} unit="ft" />
        ))}
        {pressures.map((name) => (
          <Measured key={name} form={form} name={name} unit="psi" />
        ))}
      </div>
      <fieldset>
        <legend className="lab">{t('house.fields.waterPipeMaterials')}</legend>
        <div className="row wrap">
          {materials.map((material) => (
            <label key={material} className="check-row">
              <input
                type="checkbox"
                checked={chosen.includes(material)}
                onChange={(event) =>
                  form.set(
                    'waterPipeMaterials',
                    event.target.checked ? [...chosen, material] : chosen.filter((one) => one !== material),
                  )
                }
              />
              {t(`materials.${material}`)}
            </label>
          ))}
        </div>
      </fieldset>
    </div>
  );
}
