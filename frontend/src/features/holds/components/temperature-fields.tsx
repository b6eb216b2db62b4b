import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import { temperatureOf, type TypedTemperatures } from '../kept-temperatures';
import { useFaultWords } from '../use-fault-words';

export interface TemperatureFieldsProps {
  typed: TypedTemperatures;
  /** What they are remembered for: "Millpond". */
  place: string;
  onChange: (typed: TypedTemperatures) => void;
}

/** Air in the house now, at the window and coldest tonight: typed once, remembered for the tract. */
export function TemperatureFields({ typed, place, onChange }: TemperatureFieldsProps): ReactNode {
  const { t } = useTranslation('holds');
  const words = useFaultWords();
  const names = ['now', 'window', 'coldest'] as const;
  return (
    <div className="temperature-fields">
      <div className="three">
        {names.map((name) => (
          <Field
            key={name}
            label={t(`air.${name}`)}
            labelPlace="inside"
            unit="°F"
            isNumeral
            inputMode="decimal"
            autoComplete="off"
            value={typed[name]}
            error={typed[name].trim() !== '' && temperatureOf(typed[name]) === null ? words('out-of-range') : undefined}
            onChange={(event) => onChange({ ...typed, [name]: event.target.value })}
          />
        ))}
      </div>
      <p className="s mut">{t('air.kept', { place })}</p>
    </div>
  );
}
