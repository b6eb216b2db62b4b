import { useId, type ReactNode } from 'react';
import { Icon, type IconName } from './icon';
import { Mark, type MarkName } from './mark';

export interface ChoiceOption<V extends string> {
  value: V;
  label: ReactNode;
  icon?: IconName;
  mark?: MarkName;
  /** Hatched: this one cannot be chosen now. Say why beside the choice. */
  isOff?: boolean;
}

export interface ChoiceProps<V extends string> {
  /** Read aloud as the group's name; shown above it with `isLabelShown`. */
  label: string;
  isLabelShown?: boolean;
  options: readonly ChoiceOption<V>[];
  value: V | null;
  onChange: (value: V) => void;
  size?: 'md' | 'lg';
  wide?: boolean;
  stacked?: boolean;
  'aria-describedby'?: string;
}

/**
 * One of a few: a row of ruled cells, the chosen one dimensioned. Native radio buttons underneath, so arrow keys, forms and
 * screen readers work as everywhere.
 */
export function Choice<V extends string>(props: ChoiceProps<V>): ReactNode {
  const { label, isLabelShown, options, value, onChange, size = 'md', wide, stacked } = props;
  const name = useId();
  const shape = ['seg', size === 'lg' ? 'lg' : '', wide ? 'wide' : '', stacked ? 'stacked' : ''];
  return (
    <div>
      {isLabelShown ? (
        <div className="lab" id={`${name}-label`}>
          {label}
        </div>
      ) : null}
      <div
        role="radiogroup"
        className={shape.filter(Boolean).join(' ')}
        aria-label={isLabelShown ? undefined : label}
        aria-labelledby={isLabelShown ? `${name}-label` : undefined}
        aria-describedby={props['aria-describedby']}
      >
        {options.map((option) => (
          <label key={option.value} className={optionClass(option, value)}>
            <input
              type="radio"
              className="hidden-words"
              name={name}
              value={option.value}
              checked={option.value === value}
              disabled={option.isOff}
              onChange={() => onChange(option.value)}
            />
            {option.icon ? <Icon name={option.icon} size={18} /> : null}
            {option.mark ? <Mark name={option.mark} /> : null}
            <span>{option.label}</span>
          </label>
        ))}
      </div>
    </div>
  );
}

function optionClass<V extends string>(option: ChoiceOption<V>, value: V | null): string | undefined {
  if (option.isOff) return 'off';
  return option.value === value ? 'on' : undefined;
}
