import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field, type FieldProps } from '../../../components/field';
import { useDraftFaults } from './draft-context';

interface Placed<Value> extends Pick<FieldProps, 'label' | 'unit' | 'hint' | 'isOptional' | 'maxLength'> {
  path: string;
  value: Value;
  onChange: (value: Value) => void;
}

export function TextField({ path, value, onChange, ...field }: Placed<string>): ReactNode {
  const { faultOf } = useDraftFaults();
  return <Field {...field} value={value} error={faultOf(path)} onChange={(event) => onChange(event.target.value)} />;
}

/** A clock time or a day. */
export function WhenField({
  type,
  path,
  value,
  onChange,
  ...field
}: Placed<string> & { type: 'time' | 'date' }): ReactNode {
  const { faultOf } = useDraftFaults();
  return (
    <Field
      {...field}
      type={type}
      isNumeral
      value={value}
      error={faultOf(path)}
      onChange={(event) => onChange(event.target.value)}
    />
  );
}

/** A number as typed; NaN for what is none, so that the contract names the fault. */
export function NumberField({ path, value, onChange, ...field }: Placed<number>): ReactNode {
  const { faultOf } = useDraftFaults();
  const [typed, setTyped] = useState<string | null>(null);
  // what was typed stands as long as it means the value: 5.0 stays 5.0, a default taken over shows
  const shown = typed !== null && Object.is(numberOf(typed), value) ? typed : wordsOf(value);
  return (
    <Field
      {...field}
      isNumeral
      value={shown}
      error={faultOf(path)}
      onChange={(event) => {
        setTyped(event.target.value);
        onChange(numberOf(event.target.value));
      }}
    />
  );
}

/** A number that may be left out: empty is null. */
export function OptionalNumberField({ value, onChange, ...rest }: Placed<number | null>): ReactNode {
  const [isEmpty, setEmpty] = useState(value === null);
  return (
    <NumberField
      {...rest}
      isOptional
      value={value ?? Number.NaN}
      onChange={(next) => {
        setEmpty(Number.isNaN(next));
        onChange(Number.isNaN(next) ? null : next);
      }}
      hint={isEmpty ? rest.hint : undefined}
    />
  );
}

/** Words of the department in English and, where it has them, Spanish. */
export function OwnWordsFields(props: Placed<{ en: string; es?: string }>): ReactNode {
  const { path, label, value, onChange } = props;
  const { t } = useTranslation('departments');
  return (
    <div className="fields two">
      <TextField
        label={t('form.inEnglish', { what: label })}
        path={`${path}.en`}
        value={value.en}
        maxLength={300}
        onChange={(en) => onChange({ ...value, en })}
      />
      <TextField
        label={t('form.inSpanish', { what: label })}
        path={`${path}.es`}
        value={value.es ?? ''}
        maxLength={300}
        isOptional
        onChange={(es) => onChange(es === '' ? { en: value.en } : { ...value, es })}
      />
    </div>
  );
}

function numberOf(typed: string): number {
  return typed.trim() === '' ? Number.NaN : Number(typed);
}

function wordsOf(value: number): string {
  return Number.isNaN(value) ? '' : String(value);
}
