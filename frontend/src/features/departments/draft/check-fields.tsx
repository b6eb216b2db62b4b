import type { ReactNode } from 'react';
import { useId } from 'react';
import { useDraftFaults } from './draft-context';

/** Yes or no. */
export function CheckField(props: { label: ReactNode; value: boolean; onChange: (value: boolean) => void }): ReactNode {
  const { label, value, onChange } = props;
  return (
    <label className="check-row">
      <input type="checkbox" checked={value} onChange={(event) => onChange(event.target.checked)} />
      {label}
    </label>
  );
}

export interface CheckListProps<Value extends string | number> {
  label: ReactNode;
  path: string;
  options: readonly { value: Value; label: ReactNode }[];
  value: readonly Value[];
  onChange: (value: Value[]) => void;
  /** What none chosen means. */
  whenNone?: ReactNode;
}

/** Any of a few, in the order they are offered; what is wrong with the choice stands under it. */
export function CheckList<Value extends string | number>(props: CheckListProps<Value>): ReactNode {
  const { label, path, options, value, onChange, whenNone } = props;
  const { faultOf } = useDraftFaults();
  const id = useId();
  const fault = faultOf(path);
  const toggle = (one: Value): void => {
    const chosen = value.includes(one) ? value.filter((each) => each !== one) : [...value, one];
    onChange(options.map((option) => option.value).filter((each) => chosen.includes(each)));
  };
  return (
    <fieldset className="check-list">
      <legend className="lab">{label}</legend>
      <div className="row wrap">
        {options.map((option) => (
          <label key={option.value} className="check-row">
            <input
              type="checkbox"
              checked={value.includes(option.value)}
              aria-invalid={fault ? true : undefined}
              aria-describedby={fault ? id : undefined}
              onChange={() => toggle(option.value)}
            />
            {option.label}
          </label>
        ))}
        {value.length === 0 && whenNone ? <span className="s mid">{whenNone}</span> : null}
      </div>
      {fault ? (
        <p className="field-error" id={id}>
          {fault}
        </p>
      ) : null}
    </fieldset>
  );
}

/** What is wrong with a part that has no field of its own, such as a list that must not be empty. */
export function PartFault({ path }: { path: string }): ReactNode {
  const { faultOf } = useDraftFaults();
  const fault = faultOf(path);
  return fault ? (
    <p className="field-error" data-fault tabIndex={-1}>
      {fault}
    </p>
  ) : null;
}
