import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { HeadRow } from './cutaway-heads';
import { feetWords, useRowWords } from './use-cutaway-words';

interface TwinProps {
  rows: readonly HeadRow[];
  /** Feet above the plug: from the water to the vent terminal; null when all is under test. */
  bare: { fromFt: number; toFt: number } | null;
}

/** The section in words: floors with head and pressure, and what is not under test. For readers who do not see the drawing. */
export function CutawayTwin({ rows, bare }: TwinProps): ReactNode {
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
            <th scope="col">{t('cutaway.height')}</th>
            <th scope="col">{t('cutaway.head')}</th>
            <th scope="col">{t('cutaway.pressure')}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.key}>
              <th scope="row">{wordsOf(row)}</th>
              <td>{feetWords(row.heightFt)}</td>
              <td>{row.headFt === null ? '–' : feetWords(row.headFt)}</td>
              <td>{row.pressurePsi.toFixed(1)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {bare ? <p>{t('cutaway.notUnderTest', { from: feetWords(bare.fromFt), to: feetWords(bare.toFt) })}</p> : null}
    </div>
  );
}
