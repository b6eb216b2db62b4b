import { useId, type InputHTMLAttributes, type ReactNode, type Ref } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from './icon';

/** What a control inside a field needs to be named and described. */
export interface FieldControl {
  id: string;
  'aria-invalid': true | undefined;
  'aria-describedby': string | undefined;
}

export interface FieldProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'children' | 'size'> {
  label: ReactNode;
  /** Inside the cell where cells are ruled together. */
  labelPlace?: 'above' | 'inside';
  /** At the right: psi, ft, °F. */
  unit?: ReactNode;
  /** What is wrong. */
  error?: ReactNode;
  /** The likely fix, as an act: "Use it". */
  fix?: { word: string; onUse: () => void };
  hint?: ReactNode;
  /** Required is the rule; optional fields say so. */
  isOptional?: boolean;
  /** Numerals that are read off or compared stand in Mono. */
  isNumeral?: boolean;
  /** The one large entry of a phone page. */
  isEntry?: boolean;
  /** At the right end, after the unit: a small act. */
  trailing?: ReactNode;
  /** Another control instead of the input: `(control) => <select {...control}>…</select>`. */
  children?: (control: FieldControl) => ReactNode;
  ref?: Ref<HTMLInputElement>;
}

function boxClass({ error, labelPlace, isNumeral, isEntry }: FieldProps): string {
  const parts = [
    'field',
    error ? 'bad' : '',
    labelPlace === 'inside' ? 'inside' : '',
    isNumeral ? 'mono' : '',
    isEntry ? 'entry' : '',
  ];
  return parts.filter(Boolean).join(' ');
}

/** A ruled field: label, control, unit, and beneath it what is wrong with the likely fix. */
export function Field(props: FieldProps): ReactNode {
  const {
    label,
    labelPlace = 'above',
    unit,
    error,
    fix,
    hint,
    isOptional,
    isNumeral,
    isEntry: _isEntry,
    trailing,
    ...rest
  } = props;
  const { children, ref, id: ownId, ...input } = rest;
  const made = useId();
  const { t } = useTranslation('marks');
  const id = ownId ?? made;
  const noteId = `${id}-note`;
  const control: FieldControl = {
    id,
    'aria-invalid': error ? true : undefined,
    'aria-describedby': error || hint ? noteId : undefined,
  };
  const labelLine = (
    <label className="lab" htmlFor={id}>
      {label}
      {isOptional ? `, ${t('page.optional')}` : null}
    </label>
  );
  return (
    <div className="field-box">
      {labelPlace === 'above' ? labelLine : null}
      <div className={boxClass(props)}>
        {labelPlace === 'inside' ? labelLine : null}
        {children ? (
          children(control)
        ) : (
          <input ref={ref} inputMode={isNumeral ? 'decimal' : undefined} {...input} {...control} />
        )}
        {unit ? <span className="mid">{unit}</span> : null}
        {trailing ? <span className="no-ring">{trailing}</span> : null}
      </div>
      <FieldNote id={noteId} error={error} fix={fix} hint={hint} />
    </div>
  );
}

function FieldNote({ id, error, fix, hint }: Pick<FieldProps, 'error' | 'fix' | 'hint'> & { id: string }): ReactNode {
  if (error) {
    return (
      <div className="field-error" id={id}>
        <Icon name="caution" size={16} />
        <span>
          {error}{' '}
          {fix ? (
            <button type="button" onClick={fix.onUse}>
              {fix.word}
            </button>
          ) : null}
        </span>
      </div>
    );
  }
  return hint ? (
    <div className="field-note" id={id}>
      {hint}
    </div>
  ) : null;
}
