import { permitStatuses } from '@holdwater/shared-types/lots/lot.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import type { ContractForm } from '../../../lib/use-contract-form';
import type { LotValues } from '../lot-values';

export interface LotFieldsProps {
  form: ContractForm<LotValues>;
}

/** Number, address and place on earth. */
export function PlaceFields({ form: { values, set, faultOf } }: LotFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <>
      <div className="fields number-address">
        <Field
          label={t('form.number')}
          isNumeral
          inputMode="text"
          maxLength={20}
          value={values.number}
          error={faultOf('number')}
          onChange={(event) => set('number', event.target.value)}
        />
        <Field
          label={t('title.address')}
          maxLength={200}
          value={values.address}
          error={faultOf('address')}
          onChange={(event) => set('address', event.target.value)}
        />
      </div>
      <div className="fields two">
        {(['latitude', 'longitude'] as const).map((name) => (
          <Field
            key={name}
            label={t(`form.${name}`)}
            isNumeral
            isOptional
            unit="°"
            value={values[name]}
            error={faultOf(name)}
            hint={name === 'latitude' ? t('form.placeHint') : undefined}
            onChange={(event) => set(name, event.target.value)}
          />
        ))}
      </div>
    </>
  );
}

/** Permit: its number, how far it is, who holds it. */
export function PermitFields({ form: { values, set, faultOf } }: LotFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const { permit } = values;
  return (
    <div className="fields two">
      <Field
        label={t('form.permitNumber')}
        isNumeral
        inputMode="text"
        isOptional
        maxLength={60}
        value={permit.number}
        error={faultOf('permit.number')}
        onChange={(event) => set('permit', { ...permit, number: event.target.value })}
      />
      <Field label={t('form.permitStatus')} error={faultOf('permit.status')}>
        {(control) => (
          <select
            {...control}
            value={permit.status}
            onChange={(event) => {
              const status = permitStatuses.find((one) => one === event.target.value);
              if (status !== undefined) set('permit', { ...permit, status });
            }}
          >
            {permitStatuses.map((status) => (
              <option key={status} value={status}>
                {t(`permits.${status}`)}
              </option>
            ))}
          </select>
        )}
      </Field>
      <Field
        label={t('form.permitHolder')}
        isOptional
        maxLength={120}
        value={permit.holder}
        error={faultOf('permit.holder')}
        onChange={(event) => set('permit', { ...permit, holder: event.target.value })}
      />
    </div>
  );
}

/** How to get in: shown to the builder, the plumber and that day's inspector only. */
export function AccessFields({ form: { values, set, faultOf } }: LotFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const { access } = values;
  return (
    <div className="fields two">
      {(['gateCode', 'contactName', 'contactPhone', 'hazards'] as const).map((name) => (
        <Field
          key={name}
          label={t(`form.${name}`)}
          isOptional
          isNumeral={name === 'gateCode' || name === 'contactPhone'}
          inputMode={name === 'contactPhone' ? 'tel' : 'text'}
          maxLength={name === 'hazards' ? 1000 : name === 'gateCode' ? 40 : 120}
          value={access[name]}
          error={faultOf(`access.${name}`)}
          onChange={(event) => set('access', { ...access, [name]: event.target.value })}
        />
      ))}
    </div>
  );
}

/** Whether the plumber may request, and when the walls are to be covered. */
export function RequestFields({ form: { values, set, faultOf } }: LotFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <div className="fields two">
      <label className="check-row">
        <input
          type="checkbox"
          checked={values.mayPlumberRequest}
          onChange={(event) => set('mayPlumberRequest', event.target.checked)}
        />
        {t('form.mayPlumberRequest')}
      </label>
      <Field
        label={t('title.coverDate')}
        type="date"
        isNumeral
        isOptional
        value={values.coverDate}
        error={faultOf('coverDate')}
        hint={t('form.coverHint')}
        onChange={(event) => set('coverDate', event.target.value)}
      />
    </div>
  );
}

/** The units of a new lot; one house is one unit without a name. */
export function UnitFields({ form: { values, set, faultOf } }: LotFieldsProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const { units } = values;
  const isHouse = units.length === 1;
  return (
    <div className="fields">
      {units.map((label, index) => (
        <Field
          key={index}
          label={isHouse ? t('form.unitName') : t('common.unit', { number: index + 1 })}
          isOptional={isHouse}
          maxLength={40}
          value={label}
          error={faultOf(`units.${index}.label`)}
          hint={isHouse ? t('form.unitHint') : undefined}
          onChange={(event) => set('units', units.with(index, event.target.value))}
          trailing={
            isHouse ? undefined : (
              <Act
                kind="text"
                size="sm"
                aria-label={t('form.removeUnit', { number: index + 1 })}
                onClick={() =>
                  set(
                    'units',
                    units.filter((_, at) => at !== index),
                  )
                }
              >
                {t('form.remove')}
              </Act>
            )
          }
        />
      ))}
      {units.length < 12 ? (
        <div>
          <Act size="sm" icon="plus" onClick={() => set('units', [...units, ''])}>
            {t('form.addUnit')}
          </Act>
        </div>
      ) : null}
    </div>
  );
}
