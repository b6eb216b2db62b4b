import { hydraulicLimits } from '@holdwater/shared-types/hydraulics/hydraulic-limits.js';
import { materials } from '@holdwater/shared-types/hydraulics/materials.js';
import { nominalSizesIn, pipeKinds, waterSizesIn } from '@holdwater/shared-types/hydraulics/pipes.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { newFloor, newPipe, newPlug, newWaterPipe } from '../house-draft';
import { sizeWords } from '../size-words';
import type { HouseFieldsProps } from './house-fields';

type ListName = 'floors' | 'plugs' | 'pipes' | 'waterPipes';

const mostRows = { ...hydraulicLimits, waterPipes: hydraulicLimits.pipes };

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
      {rows.length < mostRows[name] ? (
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
      fields={[{ name: 'name' }, { name: 'elevationFt', unit: form.values.measures.unitOf('length') }]}
      onChange={(floors) => form.set('floors', floors)}
    />
  );
}

export function PlugRows({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const words = sizeWords(form.values.measures.units);
  const { unitOf } = form.values.measures;
  const sizes = nominalSizesIn.map((size) => ({ value: String(size), word: words(size) }));
  return (
    <Rows
      form={form}
      name="plugs"
      rows={form.values.plugs}
      empty={newPlug}
      fields={[
        { name: 'name' },
        { name: 'elevationFt', unit: unitOf('length') },
        { name: 'ratedPsi', unit: unitOf('pressure') },
        { name: 'nominalIn', options: [{ value: '', word: t('house.chooseSize') }, ...sizes] },
      ]}
      onChange={(plugs) => form.set('plugs', plugs)}
    />
  );
}

export function PipeRows({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const words = sizeWords(form.values.measures.units);
  const unit = form.values.measures.unitOf('length');
  return (
    <Rows
      form={form}
      name="pipes"
      rows={form.values.pipes}
      empty={newPipe}
      fields={[
        { name: 'nominalIn', options: nominalSizesIn.map((size) => ({ value: String(size), word: words(size) })) },
        { name: 'material', options: pipeKinds.map((kind) => ({ value: kind, word: t(`materials.${kind}`) })) },
        { name: 'bottomFt', unit },
        { name: 'topFt', unit },
        { name: 'lengthFt', unit },
      ]}
      onChange={(pipes) => form.set('pipes', pipes)}
    />
  );
}

export function WaterPipeRows({ form }: HouseFieldsProps): ReactNode {
  const { t } = useTranslation('lots');
  const words = sizeWords(form.values.measures.units);
  return (
    <Rows
      form={form}
      name="waterPipes"
      rows={form.values.waterPipes}
      empty={newWaterPipe}
      fields={[
        { name: 'material', options: materials.map((one) => ({ value: one, word: t(`materials.${one}`) })) },
        { name: 'nominalIn', options: waterSizesIn.map((size) => ({ value: String(size), word: words(size) })) },
        { name: 'lengthFt', unit: form.values.measures.unitOf('length') },
      ]}
      onChange={(waterPipes) => form.set('waterPipes', waterPipes)}
    />
  );
}
