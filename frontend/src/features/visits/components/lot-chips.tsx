import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/icon';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import type { ChosenLot } from '../requested-lots';
import { UnitChips } from './unit-chips';
import '../request.css';

/** The lots chosen for a request, each with a way out, its units where it has several, and what stands in its way. */
export function LotChips({
  lots,
  onRemove,
  onToggleUnit,
}: {
  lots: readonly ChosenLot[];
  onRemove: (lotId: string) => void;
  onToggleUnit: (lot: LotDetail, unitNumber: number) => void;
}): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  if (lots.length === 0) return <p className="s mid">{t('req.noLots')}</p>;
  const withFault = lots.filter(({ fault, error }) => fault !== null || error !== null);
  const nameOf = ({ lot }: ChosenLot): string =>
    lot === null ? t('req.unknownLot') : t('common.lot', { number: lot.number });
  return (
    <>
      <ul className="row wrap" aria-label={t('req.lots')}>
        {lots.map((chosen) => (
          <li key={chosen.id}>
            <button
              type="button"
              className={`chip ${chosen.fault === null && chosen.error === null ? '' : 'on'}`}
              aria-label={t('req.remove', { lot: nameOf(chosen) })}
              onClick={() => onRemove(chosen.id)}
            >
              <span>
                <Numeral text={nameOf(chosen)} />
              </span>
              <Icon name="close" size={14} />
            </button>
          </li>
        ))}
      </ul>
      {lots.map(({ id, lot, units }) =>
        lot === null || units.length === 0 ? null : (
          <UnitChips
            key={id}
            lotNumber={lot.number}
            units={units}
            onToggle={(unitNumber) => onToggleUnit(lot, unitNumber)}
          />
        ),
      )}
      <ul className="req-faults">
        {withFault.map((chosen) => (
          <li key={chosen.id} className="field-error">
            {chosen.fault?.code === 'corrections' ? (
              <Mark name="correction-open" number={chosen.fault.count} />
            ) : (
              <Icon name="caution" size={16} />
            )}
            <span>
              {nameOf(chosen)}:{' '}
              {chosen.fault === null
                ? t('req.faults.unreadable')
                : t(`req.faults.${chosen.fault.code}`, { count: chosen.fault.count ?? 0 })}
            </span>
          </li>
        ))}
      </ul>
    </>
  );
}
