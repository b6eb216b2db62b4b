import { useId, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/icon';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import type { UnitToAsk } from '../requested-units';
import './unit-chips.css';

export interface UnitChipsProps {
  lotNumber: string;
  units: readonly UnitToAsk[];
  onToggle: (unitNumber: number) => void;
}

/** The units of one lot: which of them the visit is for. One that has passed cannot be asked for. */
export function UnitChips({ lotNumber, units, onToggle }: UnitChipsProps): ReactNode {
  const { t } = useTranslation('visits');
  const id = useId();
  return (
    <div className="unit-chips" role="group" aria-labelledby={id}>
      <span className="s mid" id={id}>
        <Numeral text={t('req.units', { lot: lotNumber })} />
      </span>
      {units.map(({ number, label, hasPassed, isChosen }) => (
        <button
          key={number}
          type="button"
          className="chip unit-chip"
          aria-pressed={isChosen}
          aria-disabled={hasPassed || undefined}
          onClick={() => (hasPassed ? undefined : onToggle(number))}
        >
          {hasPassed ? <Mark name="put-back-due" /> : <Icon name={isChosen ? 'check' : 'minus'} size={14} />}
          <span>
            {label}
            {hasPassed ? `, ${t('req.unitPassed')}` : null}
          </span>
        </button>
      ))}
    </div>
  );
}
