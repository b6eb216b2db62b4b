import { hydraulicLimits } from '@holdwater/shared-types/hydraulics/hydraulic-limits.js';
import { nominalSizesIn, pipeKinds } from '@holdwater/shared-types/hydraulics/pipes.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { newFloor, newPipe, newPlug } from '../house-draft';
import type { HouseFieldsProps } from './house-fields';

type ListName = 'floors' | 'plugs' | 'pipes';

interface RowsProps<Row extends Readonly<Record<string, string>>> extends HouseFieldsProps {
  name: ListName;
  rows: readonly Row[];
  empty: Row;
  /** The fields of a row in order, with the unit behind each. */
  fields: ReadonlyArray<{
    name: keyof Row & string;
    unit?: string;
    options?: readonly { value: string; word: string }[];
  }>;
  onChange: (rows: readonly Row[]) => void;
}

/** Rows of a few fields each, with one to add and one to take out. */
function Rows<Row extends Readonly<Record<string, string>>>(props: RowsProps<Row>): ReactNode {
  const { form, name, rows, empty, fields, onChange } = props;
  const { t } = useTranslation('lots');
  return (
    <div className="fields">
      {rows.map((row, index) => (
        <fieldset key={index} className={`house-row of-${fields.length}`}>
          <legend className="hidden-words">{t(`house.row.${name}`, { number: index + 1 })}</legend>
          {fields.map((field) => (
            <Field
              key={field.name}
              label={t(`house.fields.${name}.${field.name}`)}
              isNumeral={field.name !== 'name' && field.options === undefined}
              inputMode="text"
              maxLength={100}
              unit={field.unit}
              value={row[field.name]}
              error={form.faultOf(`${name}.${index}.${field.name}`)}
              onChange={(event) => onChange(rows.with(index, { ...row, [field.name]: event.target.value }))}
            >
              {field.options === undefined
                ? undefined
                : (control) => (
                    <select
                      {...control}
                      value={row[field.name]}
                      onChange={(event) => onChange(rows.with(index, { ...row, [field.name]: event.target.value }))}
                    >
                      {field.options?.map(({ value, word }) => (
                        <option key={value} value={value}>
                          {word}
                        </option>
                      ))}
                    </select>
                  )}
            </Field>
          ))}
          <Act
            kind="text"
            size="sm"
            aria-label={t(`house.remove.${name}`, { number: index + 1 })}
            onClick={() => onChange(rows.filter((_, at) => at !== index))}
          >
            {t('form.remove')}
          </Act>
        </fieldset>
      ))}
      {rows.length < hydraulicLimits[name] ? (
        <div>
          <Act size="sm" icon="plus" onClick={() => onChange([...rows, empty])}>
            {t(`house.add.${name}`)}
          </Act>
        </div>
      ) : null}
    </div>
  );
}

export function FloorRows({ form }: HouseFieldsProps): ReactNode {
  return (
    <Rows
      form={form}
      name="floors"
      rows={form.values.floors}
      empty={newFloor}
      fields={[{ name: 'name' }, { name: 'elevationFt', unit: 'ft' }]}
      onChange={(floors) => form.set('floors', floors)}
    />
  );
}

const sizes = nominalSizesIn.map((size) => ({ value: String(size), word: `${size} in` }));

export function PlugRows({ form }: HouseFieldsProps): ReactNode {
  return (
    <Rows
      form={form}
      name="plugs"
      rows={form.values.plugs}
      empty={newPlug}
      fields={[
        { name: 'name' },
        { name: 'elevationFt', unit: 'ft' },
        { name: 'ratedPsi', unit: 'psi' },
        { name: 'nominalIn', options: sizes },
      ]}
      onChange={(plugs) => form.set('plugs', plugs)}
    />
  );
}

export function PipeRows({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <Rows
      form={form}
      name="pipes"
      rows={form.values.pipes}
      empty={newPipe}
      fields={[
        { name: 'nominalIn', options: sizes },
        { name: 'material', options: pipeKinds.map((kind) => ({ value: kind, word: t(`materials.${kind}`) })) },
        { name: 'bottomFt', unit: 'ft' },
        { name: 'topFt', unit: 'ft' },
        { name: 'lengthFt', unit: 'ft' },
      ]}
      onChange={(pipes) => form.set('pipes', pipes)}
    />
  );
}
