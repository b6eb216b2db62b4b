import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { plugFt, stackFt, type DrawnHouse } from './cutaway-house';
import type { CutawayScale } from './cutaway-scale';

/** The surface of the water across the house, with the surveyor's sign on it. */
export function LevelLine({ scale, levelFt }: { scale: CutawayScale; levelFt: number }): ReactNode {
  const y = scale.y(levelFt);
  const sign = scale.x(13.2);
  return (
    <g fill="none" stroke="var(--water)">
      <path d={`M${scale.x(-0.2)} ${y}H${scale.x(31.4)}`} strokeWidth="1.3" strokeDasharray="9 3" />
      <path d={`M${sign - 7} ${y - 12}h14l-7 11Z`} fill="var(--paper)" strokeWidth="1.8" strokeLinejoin="round" />
      <path d={`M${sign - 5.5} ${y + 4}h11M${sign - 2.5} ${y + 7.5}h5`} strokeWidth="1.5" />
    </g>
  );
}

/** The stack cut through in the attic: a gap with two slanted edges, the water in it. */
export function AtticCut({ scale, cutFt }: { scale: CutawayScale; cutFt: number }): ReactNode {
  const x = scale.x(stackFt);
  const y = scale.y(cutFt);
  return (
    <g fill="none">
      <path d={`M${x - 10} ${y - 1}l20 -6M${x - 10} ${y + 6}l20 -6`} stroke="var(--paper)" strokeWidth="3.5" />
      <path d={`M${x - 11} ${y - 2}l22 -6.5`} stroke="var(--ink)" strokeWidth="1.3" />
    </g>
  );
}

/** The test plug in the building drain, with the tee beyond it that is not under test. */
export function TestPlug({ scale, hatchFill }: { scale: CutawayScale; hatchFill: string }): ReactNode {
  const { x, y } = scale;
  const thick = Math.max(0.62, Math.min(1.8, scale.pxPerFt / 13));
  const tee = `M${x(1.1)} ${y(0.25)}V`;
  return (
    <g fill="none">
      <path d={`${tee}${y(1.5)}`} stroke="var(--ink)" strokeWidth={8 * thick} />
      <path d={`${tee}${y(1.42)}`} stroke="var(--paper)" strokeWidth={6 * thick} />
      <path d={`${tee}${y(1.42)}`} stroke={hatchFill} strokeWidth={6 * thick} />
      <path
        d={`M${x(plugFt - 0.3)} ${y(0.55)}H${x(plugFt + 0.7)}V${y(-0.55)}H${x(plugFt - 0.3)}Z`}
        fill="var(--brassFill)"
        stroke="var(--ink)"
        strokeWidth="1.2"
      />
      <path d={`M${x(plugFt - 0.3)} ${y(0.1)}h-7`} stroke="var(--ink)" strokeWidth="1.6" />
    </g>
  );
}

/** The laundry box on its wall. */
export function LaundryBox({ house, scale }: { house: DrawnHouse; scale: CutawayScale }): ReactNode {
  if (house.laundryOutletFt === null) return null;
  return (
    <rect
      x={scale.x(8.5)}
      y={scale.y(house.laundryOutletFt + 1)}
      width={2.6 * scale.pxPerFt}
      height={1.5 * scale.pxPerFt}
      fill="none"
      stroke="var(--ink)"
      strokeWidth="1.1"
    />
  );
}

/** Does the method break the stack in the attic? */
export function isCut(method: DwvMethod | null): boolean {
  return method === 'attic-cut';
}
