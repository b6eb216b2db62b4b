import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { HeadRow } from './cutaway-heads';
import type { DrawnHouse } from './cutaway-house';
import type { CutawayScale } from './cutaway-scale';
import type { CutawayUnits } from './cutaway-units';
import { useRowWords } from './use-cutaway-words';

const rowHeight = 31;

interface RuleProps {
  house: DrawnHouse;
  scale: CutawayScale;
  units: CutawayUnits;
}

/** The left edge: a rule of feet (or metres) above the lowest test plug. */
export function FeetRule({ house, scale, units }: RuleProps): ReactNode {
  const { t } = useTranslation('marks');
  const at = 34;
  const top = Math.ceil(house.ventFt / units.markFt);
  const marks = Array.from({ length: top + 1 }, (_, mark) => mark);
  const y = (mark: number): number => scale.y(mark * units.markFt);
  const tick = (mark: number): number => (mark % 10 === 0 ? 12 : mark % 5 === 0 ? 9 : 5);
  const numbered = units.lengthUnit === 'ft' ? 5 : 2;
  return (
    <g>
      <path
        d={`M${at} ${y(0)}V${y(top)}${marks.map((mark) => `M${at} ${y(mark)}h${tick(mark)}`).join('')}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1"
      />
      {marks
        .filter((mark) => mark % numbered === 0)
        .map((mark) => (
          <text key={mark} className="m halo s12 mid" x={at - 6} y={y(mark) + 4} textAnchor="end">
            {mark}
          </text>
        ))}
      <text className="s12 mut" x="2" y={Math.max(12, y(top) - 10)}>
        {t('cutaway.heightIn', { unit: units.lengthUnit })}
      </text>
    </g>
  );
}

interface ChainProps {
  rows: readonly HeadRow[];
  scale: CutawayScale;
  levelFt: number | null;
  units: CutawayUnits;
}

/** The right chain: the head to each floor in feet and psi, dimensioned from the water down to the plug. */
export function HeadChain({ rows, scale, levelFt, units }: ChainProps): ReactNode {
  const { t } = useTranslation('marks');
  const wordsOf = useRowWords();
  const at = scale.frame.left + scale.frame.width + 2;
  const levelY = levelFt === null ? null : scale.y(levelFt);
  const places = labelPlaces(
    rows.map((row) => scale.y(row.heightFt)),
    levelY,
  );
  const slash = (y: number): string => `M${at - 3.5} ${y + 3.5}l7-7`;
  const wetRows = rows.filter(({ heightFt }) => levelFt !== null && heightFt <= levelFt);
  return (
    <g>
      {levelY === null || levelFt === null ? null : (
        <>
          <path d={`M${at - 14} ${levelY}H${at + 8}`} stroke="var(--water)" strokeWidth="1.3" />
          <text className="s12 water b" x={at + 12} y={levelY - 5}>
            {t('cutaway.waterAt')} <tspan className="m">{units.length(levelFt)}</tspan> {units.lengthUnit}
          </text>
          <path
            d={`M${at} ${levelY}V${scale.y(0)}${slash(levelY)}${wetRows.map((row) => slash(scale.y(row.heightFt))).join('')}`}
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
              <RowNumbers row={row} units={units} />
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** The number in Mono, its unit in Sans; nothing stands on a floor above the water. */
function RowNumbers({ row, units }: { row: HeadRow; units: CutawayUnits }): ReactNode {
  const { t } = useTranslation('marks');
  if (row.headFt === 0) return t('cutaway.vent');
  return (
    <>
      {row.headFt === null ? null : (
        <>
          <tspan className="m">{units.length(row.headFt)}</tspan> {units.lengthUnit}{' '}
        </>
      )}
      <tspan className="m water b">{units.pressure(row.pressurePsi)}</tspan>
      <tspan className="water b"> {units.pressureUnit}</tspan>
    </>
  );
}

/**
 * Labels keep their lines apart: from the plug up, each at its height or a row above the one below; those of the water below its line, those
 * of floors above it over the water's own words.
 */
function labelPlaces(heights: readonly number[], levelY: number | null): number[] {
  if (levelY === null) return packedUp(heights, Infinity);
  const wet = heights.filter((y) => y >= levelY);
  const dry = heights.filter((y) => y < levelY);
  let free = levelY + 22;
  const below = packedUp(wet, Infinity).map((place) => {
    const put = Math.max(place, free);
    free = put + rowHeight;
    return put;
  });
  return [...packedUp(dry, levelY - rowHeight), ...below];
}

/** Places from the top down, none lower than its height, than `lowest`, or closer than a row to the next. */
function packedUp(heights: readonly number[], lowest: number): number[] {
  const places = [...heights];
  let next = lowest + rowHeight;
  for (let index = places.length - 1; index >= 0; index -= 1) {
    next = Math.min(places[index] ?? 0, next - rowHeight);
    places[index] = next;
  }
  return places;
}
