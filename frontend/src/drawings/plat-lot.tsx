import type { ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { MarkAt } from '../components/mark';
import { polygonPath, type PlatPoint } from './plat-geometry';
import type { PatternName } from './patterns';

/** A lot in px. */
export interface PlacedLot {
  id: string;
  number: string;
  state: ClearState;
  polygon: readonly PlatPoint[];
  /** Where its number stands, and how much room is about it in px. */
  middle: PlatPoint;
  room: number;
}

/** The ground of a parcel by its plumbing state; shape first, colour after. */
export const parcelGrounds: Record<ClearState, { ground: string; pattern?: PatternName; edge?: string }> = {
  'not-tested': { ground: 'var(--paper)' },
  'under-test': { ground: 'var(--paper)', pattern: 'waves' },
  'awaiting-visit': { ground: 'var(--waterFill)' },
  'corrections-open': { ground: 'var(--redWash)', edge: 'var(--red)' },
  'put-back-due': { ground: 'var(--greenWash)' },
  clear: { ground: 'var(--greenWash)', pattern: 'batt' },
};

const onPattern: readonly ClearState[] = ['under-test', 'clear', 'awaiting-visit'];

interface PlatLotProps {
  lot: PlacedLot;
  id: string;
  isChosen: boolean;
  fill: (name: PatternName) => string;
  onChoose: (id: string) => void;
}

/** One parcel with its number and mark; the mark is left out where there is no room for it. */
export function PlatLot({ lot, id, isChosen, fill, onChoose }: PlatLotProps): ReactNode {
  const { t } = useTranslation('marks');
  const d = polygonPath(lot.polygon);
  const { ground, pattern, edge } = parcelGrounds[lot.state];
  const isRoomy = lot.room > 20;
  const [x, y] = lot.middle;
  const top = isRoomy ? y - 25 : y - 11;
  return (
    <g
      id={id}
      role="option"
      aria-selected={isChosen}
      aria-label={t('plat.lot', { number: lot.number, state: t(lot.state) })}
      className="parcel"
      onClick={() => onChoose(lot.id)}
    >
      <path d={d} fill={ground} />
      {pattern ? <path d={d} fill={fill(pattern)} opacity=".6" /> : null}
      <path d={d} fill="none" stroke={edge ?? 'var(--ink)'} strokeWidth={edge ? 2.4 : 1.1} />
      {onPattern.includes(lot.state) ? (
        <rect x={x - 15} y={top} width="30" height={isRoomy ? 48 : 22} fill="var(--paper)" opacity=".93" />
      ) : null}
      <text className="m lot-no" x={x} y={isRoomy ? y - 9 : y + 5} textAnchor="middle">
        {lot.number}
      </text>
      {isRoomy ? <MarkAt name={lot.state} x={x - 10.5} y={y - 2} size={21} /> : null}
    </g>
  );
}
