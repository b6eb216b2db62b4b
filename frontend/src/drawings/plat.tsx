import type { ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import { useId, useMemo, type KeyboardEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { North, PlatRoad, ScaleBar } from './plat-signs';
import { PlatLot, type PlacedLot } from './plat-lot';
import { boundsOf, findNext, inset, isWay, polygonPath, roomiestPoint, type PlatPoint } from './plat-geometry';
import { usePatterns } from './patterns';
import { useDrawnWidth } from './use-drawn-width';

export type { PlatPoint } from './plat-geometry';

export interface PlatLotShape {
  id: string;
  number: string;
  /** Corners in feet, y growing south. */
  polygon: readonly PlatPoint[];
  state: ClearState;
}

export interface PlatProps {
  tract: string;
  lots: readonly PlatLotShape[];
  roads?: readonly { name: string; centerline: readonly PlatPoint[] }[];
  /** Parcels that are no lots, drawn with a broken line. */
  otherParcels?: readonly { name: string; polygon: readonly PlatPoint[] }[];
  chosen: string | null;
  onChoose: (id: string) => void;
  onOpen?: (id: string) => void;
  /** Degrees clockwise from up to north. */
  northDegrees?: number;
  /** px */
  maxHeight?: number;
}

const margin = 14;

/** The plat of a tract: each lot in its plumbing state, one chosen. A list to assistive readers; arrow keys go to the lot beside. */
export function Plat(props: PlatProps): ReactNode {
  const {
    tract,
    lots,
    roads = [],
    otherParcels = [],
    chosen,
    onChoose,
    onOpen,
    northDegrees = 0,
    maxHeight = 560,
  } = props;
  const { t } = useTranslation('marks');
  const id = useId();
  const [place, width] = useDrawnWidth(760);
  const patterns = usePatterns(['waves', 'batt']);
  const all = useMemo(
    () =>
      boundsOf(
        [...lots, ...otherParcels].flatMap((parcel) => parcel.polygon).concat(roads.flatMap((r) => r.centerline)),
      ),
    [lots, otherParcels, roads],
  );
  const footer = 44;
  const pxPerFt = Math.min(
    (width - 2 * margin) / (all.maxX - all.minX),
    (maxHeight - 2 * margin - footer) / (all.maxY - all.minY),
  );
  const height = Math.ceil((all.maxY - all.minY) * pxPerFt + 2 * margin + footer);
  const toPx = ([x, y]: PlatPoint): PlatPoint => [margin + (x - all.minX) * pxPerFt, margin + (y - all.minY) * pxPerFt];
  const placed: PlacedLot[] = lots.map((lot) => {
    const polygon = lot.polygon.map(toPx);
    const { point, room } = roomiestPoint(polygon);
    return { id: lot.id, number: lot.number, state: lot.state, polygon, middle: point, room };
  });
  const optionId = (lotId: string): string => `${id}-${lotId}`;
  const walk = (event: KeyboardEvent<SVGSVGElement>): void => walkLots(event, placed, chosen, onChoose, onOpen);
  const chosenLot = placed.find((lot) => lot.id === chosen);
  return (
    <div className="drawing plat" ref={place}>
      <svg
        width={width}
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        role="listbox"
        tabIndex={0}
        aria-label={t('plat.name', { tract, count: lots.length })}
        aria-activedescendant={chosenLot ? optionId(chosenLot.id) : undefined}
        onKeyDown={walk}
      >
        {patterns.defs}
        {otherParcels.map((parcel) => (
          <path
            key={parcel.name}
            d={polygonPath(parcel.polygon.map(toPx))}
            fill="none"
            stroke="var(--rule2)"
            strokeDasharray="10 3 2 3"
          />
        ))}
        {placed.map((lot) => (
          <PlatLot
            key={lot.id}
            lot={lot}
            id={optionId(lot.id)}
            isChosen={lot.id === chosen}
            fill={patterns.fill}
            onChoose={onChoose}
          />
        ))}
        {roads.map((road) => (
          <PlatRoad key={road.name} name={road.name} line={road.centerline.map(toPx)} />
        ))}
        {chosenLot ? <Chosen lot={chosenLot} /> : null}
        <ScaleBar x={margin} y={height - 10} pxPerFt={pxPerFt} />
        <North x={width - margin - 22} y={height - 24} degrees={northDegrees} />
      </svg>
    </div>
  );
}

function walkLots(
  event: KeyboardEvent<SVGSVGElement>,
  placed: readonly PlacedLot[],
  chosen: string | null,
  onChoose: (id: string) => void,
  onOpen?: (id: string) => void,
): void {
  const [first] = placed;
  const from = placed.find((lot) => lot.id === chosen);
  if (event.key === 'Enter' && from && onOpen) {
    event.preventDefault();
    onOpen(from.id);
  }
  if (!isWay(event.key) || !first) return;
  event.preventDefault();
  const next = from ? findNext(placed, from, event.key) : first;
  if (next) onChoose(next.id);
}

/** A heavy line with a thin one inside, as a plat draws the lot it is about; no handles. */
function Chosen({ lot }: { lot: PlacedLot }): ReactNode {
  const inner = inset(lot.polygon, 6.5);
  return (
    <g fill="none" stroke="var(--primer)" pointerEvents="none">
      <path d={polygonPath(lot.polygon)} strokeWidth="4" />
      <path d={polygonPath(inner)} strokeWidth="1.2" />
    </g>
  );
}
