import type { ModelledUnit } from '@holdwater/shared-types/lots/house-model.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { useHouseChangeWords } from '../house-change-words';

/** The units taken from a model: their version, and what was changed on the lot. */
export function HouseUnits({ units, newest }: { units: readonly ModelledUnit[]; newest: number }): ReactNode {
  const { t } = useTranslation('houses');
  const changeWords = useHouseChangeWords();
  const unitCount = new Map<string, number>();
  for (const { lotId } of units) unitCount.set(lotId, (unitCount.get(lotId) ?? 0) + 1);
  return (
    <table className="ruled" aria-label={t('use.title')}>
      <thead>
        <tr>
          <th scope="col">{t('columns.lot')}</th>
          <th scope="col">{t('columns.version')}</th>
          <th scope="col">{t('columns.ownChanges')}</th>
        </tr>
      </thead>
      <tbody>
        {units.map(({ lotId, lotNumber, tractName, address, unitNumber, unitLabel, origin }) => (
          <tr key={`${lotId} ${unitNumber}`}>
            <th scope="row">
              <Link to={`/lots/${lotId}`}>
                <span className="n">{lotNumber}</span> {tractName ?? address}
                {(unitCount.get(lotId) ?? 0) > 1 ? `, ${unitLabel}` : null}
              </Link>
            </th>
            <td
              data-label={t('columns.version')}
              className={origin !== null && origin.version < newest ? 'n t-brass' : 'n'}
            >
              {origin?.version}
            </td>
            <td data-label={t('columns.ownChanges')}>
              {origin === null || origin.changes.length === 0 ? t('use.noChanges') : changeWords(origin.changes)}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
