import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { HeadRow } from './cutaway-heads';
import type { DrawnLift } from './cutaway-lifts';
import type { CutawayUnits } from './cutaway-units';
import { useRowWords } from './use-cutaway-words';

interface TwinProps {
  rows: readonly HeadRow[];
  /** Feet above the plug: from the water to the vent terminal; null when all is under test. */
  bare: { fromFt: number; toFt: number } | null;
  lifts: readonly DrawnLift[];
  units: CutawayUnits;
}

/** The section in words: floors with head and pressure, and what is not under test. For readers who do not see the drawing. */
export function CutawayTwin({ rows, bare, lifts, units }: TwinProps): ReactNode {
  const { t } = useTranslation('marks');
  const wordsOf = useRowWords();
  if (rows.length === 0) return null;
  return (
    <div className="hidden-words">
      <table>
        <caption>{t('cutaway.tableName')}</caption>
        <thead>
          <tr>
            <th scope="col">{t('cutaway.place')}</th>
            <th scope="col">{t('cutaway.heightIn', { unit: units.lengthUnit })}</th>
            <th scope="col">{t('cutaway.headIn', { unit: units.lengthUnit })}</th>
            <th scope="col">{t('cutaway.pressureIn', { unit: units.pressureUnit })}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.key}>
              <th scope="row">{wordsOf(row)}</th>
              <td>{units.length(row.heightFt)}</td>
              <td>{row.headFt === null ? '–' : units.length(row.headFt)}</td>
              <td>{units.pressure(row.pressurePsi)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {bare ? <p>{t('cutaway.bare', { ...spanOf(bare, units), unit: units.lengthUnit })}</p> : null}
      {lifts.map((lift, index) => (
        <p key={index}>
          {t('cutaway.liftFrom', { number: index + 1, ...spanOf(lift, units), unit: units.lengthUnit })}
        </p>
      ))}
    </div>
  );
}

function spanOf({ fromFt, toFt }: DrawnLift, units: CutawayUnits): { from: string; to: string } {
  return { from: units.length(fromFt), to: units.length(toFt) };
}
