import { materials } from '@holdwater/shared-types/hydraulics/materials.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import type { ContractForm } from '../../../lib/use-contract-form';
import { kindOf, type HouseDraft, type NumberField } from '../house-draft';

export interface HouseFieldsProps {
  form: ContractForm<HouseDraft>;
}

const heights: readonly NumberField[] = ['lowestFittingFt', 'highestFittingFt', 'ventTerminalFt', 'atticCutFt'];
const waterSide: readonly NumberField[] = ['gaugeFt', 'highestOutletFt', 'waterLowestFittingFt', 'lowestRatedPsi'];

function Measured({ form, name }: HouseFieldsProps & { name: NumberField }): ReactNode {
  const { t } = useTranslation('lots');
  const kind = kindOf(name);
  return (
    <Field
      label={t(`house.fields.${name}`)}
      isNumeral
      isOptional
      inputMode="text"
      unit={kind === null ? undefined : form.values.measures.unitOf(kind)}
      value={form.values[name]}
      error={form.faultOf(name)}
      onChange={(event) => form.set(name, event.target.value)}
    />
  );
}

/** Heights of the drain, waste and vent side. */
export function HeightFields({ form }: HouseFieldsProps): ReactNode {
  return (
    <div className="fields two">
      {heights.map((name) => (
        <Measured key={name} form={form} name={name} />
      ))}
      <Measured form={form} name="cappedVents" />
    </div>
  );
}

/** What few houses need: a standpipe for groundwork, what the drains are of, the site, ratings beside the lowest for water. */
export function FinerFields({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <div className="fields two">
      <Measured form={form} name="standpipeFt" />
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
      {(['elevationFt', 'supplyPsi', 'lowestRatedAirPsi'] as const).map((name) => (
        <Measured key={name} form={form} name={name} />
      ))}
    </div>
  );
}

/** The laundry: its floor, and the heights a test through it needs. */
export function LaundryFields({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const { laundry, floors, measures } = form.values;
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
            {known.map((name, index) => (
              <option key={`${index} ${name}`} value={name}>
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
              unit={measures.unitOf('length')}
              value={laundry[name]}
              error={form.faultOf(`laundry.${name}`)}
              onChange={(event) => form.set('laundry', { ...laundry, [name]: event.target.value })}
            />
          ))}
      {laundry.floor === '' ? null : <Measured form={form} name="laundryTrapFt" />}
    </div>
  );
}

/** The water side: heights of the gauge and of the ends of the lines, the lowest-rated part and the materials. */
export function WaterFields({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const { waterPipeMaterials: chosen } = form.values;
  return (
    <div className="fields">
      <div className="fields two">
        {waterSide.map((name) => (
          <Measured key={name} form={form} name={name} />
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
                onChange={(event) => {
                  const next = event.target.checked ? [...chosen, material] : chosen.filter((one) => one !== material);
                  form.set(
                    'waterPipeMaterials',
                    materials.filter((one) => next.includes(one)),
                  );
                }}
              />
              {t(`materials.${material}`)}
            </label>
          ))}
        </div>
      </fieldset>
    </div>
  );
}
