import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { HeadRow } from './cutaway-heads';
import type { DrawnHouse } from './cutaway-house';
import type { CutawayScale } from './cutaway-scale';
import { feetWords, useRowWords } from './use-cutaway-words';

const rowHeight = 31;

/** The left edge: a rule of feet above the lowest test plug. */
export function FeetRule({ house, scale }: { house: DrawnHouse; scale: CutawayScale }): ReactNode {
  const { t } = useTranslation('marks');
  const at = 34;
  const top = Math.ceil(house.ventFt);
  const feet = Array.from({ length: top + 1 }, (_, foot) => foot);
  const tick = (foot: number): number => (foot % 10 === 0 ? 12 : foot % 5 === 0 ? 9 : 5);
  return (
    <g>
      <path
        d={`M${at} ${scale.y(0)}V${scale.y(top)}${feet.map((foot) => `M${at} ${scale.y(foot)}h${tick(foot)}`).join('')}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1"
      />
      {feet
        .filter((foot) => foot % 5 === 0)
        .map((foot) => (
          <text key={foot} className="m halo s12 mid" x={at - 6} y={scale.y(foot) + 4} textAnchor="end">
            {foot}
          </text>
        ))}
      <text className="s12 mut" x="2" y={Math.max(12, scale.y(top) - 10)}>
        {t('cutaway.height')}
      </text>
    </g>
  );
}

interface ChainProps {
  rows: readonly HeadRow[];
  scale: CutawayScale;
  levelFt: number | null;
}

/** The right chain: the head to each floor in feet and psi, dimensioned from the water down to the plug. */
export function HeadChain({ rows, scale, levelFt }: ChainProps): ReactNode {
  const { t } = useTranslation('marks');
  const wordsOf = useRowWords();
  const at = scale.frame.left + scale.frame.width + 2;
  const levelY = levelFt === null ? null : scale.y(levelFt);
  const places = labelPlaces(
    rows.map((row) => scale.y(row.heightFt)),
    levelY,
  );
  const slash = (y: number): string => `M${at - 3.5} ${y + 3.5}l7-7`;
  return (
    <g>
      {levelY === null || levelFt === null ? null : (
        <>
          <path d={`M${at - 14} ${levelY}H${at + 8}`} stroke="var(--water)" strokeWidth="1.3" />
          <text className="s12 water b" x={at + 12} y={levelY - 5}>
            {t('cutaway.waterAt')} <tspan className="m">{feetWords(levelFt)}</tspan> {t('cutaway.feet')}
          </text>
          <path
            d={`M${at} ${levelY}V${scale.y(0)}${slash(levelY)}${rows.map((row) => slash(scale.y(row.heightFt))).join('')}`}
            fill="none"
            stroke="var(--water)"
            strokeWidth="1.3"
          />
        </>
      )}
      {rows.map((row, index) => {
        const y = scale.y(row.heightFt);
        const label = places[index] ?? y;
        return (
          <g key={row.key}>
            <path d={`M${at - 14} ${y}H${at + 8}`} stroke="var(--rule2)" strokeWidth=".8" />
            <text className="s12 mut" x={at + 12} y={label - 3}>
              {wordsOf(row)}
            </text>
            <text className="s12 med" x={at + 12} y={label + 12}>
              <RowNumbers row={row} />
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** The number in Mono, its unit in Sans; nothing stands on a floor above the water. */
function RowNumbers({ row }: { row: HeadRow }): ReactNode {
  const { t } = useTranslation('marks');
  if (row.headFt === 0) return t('cutaway.vent');
  return (
    <>
      {row.headFt === null ? null : (
        <>
          <tspan className="m">{feetWords(row.headFt)}</tspan> {t('cutaway.feet')}{' '}
        </>
      )}
      <tspan className="m water b">{row.pressurePsi.toFixed(1)}</tspan>
      <tspan className="water b"> {t('cutaway.psi')}</tspan>
    </>
  );
}

/** Labels keep their lines apart: from the plug up, each at its height or a row above the one below; none over the water's. */
function labelPlaces(heights: readonly number[], levelY: number | null): number[] {
  const places = [...heights];
  for (let index = places.length - 2; index >= 0; index -= 1) {
    places[index] = Math.min(places[index] ?? 0, (places[index + 1] ?? 0) - rowHeight);
  }
  if (levelY === null) return places;
  let free = levelY + 22;
  return places.map((place) => {
    const put = Math.max(place, free);
    free = put + rowHeight;
    return put;
  });
}
