import { round2 } from '../components/mark-geometry';
import type { DrawnHouse } from './cutaway-house';

/** Feet to px. x runs from the left wall, height from the lowest test plug up. */
export interface CutawayScale {
  width: number;
  height: number;
  pxPerFt: number;
  x: (feet: number) => number;
  y: (feet: number) => number;
  /** The part that correction places are fractions of, the same whatever stands around it. */
  frame: { left: number; top: number; width: number; height: number };
}

const leftFt = -2.5;
const rightFt = 33;
const belowFt = -2.7;

/** Fits the house into a width; its height follows. Labels need room at both sides and above. */
export function cutawayScale(house: DrawnHouse, width: number, maxHeight: number, hasLabels: boolean): CutawayScale {
  const isNarrow = width < 480;
  const left = hasLabels ? (isNarrow ? 40 : 46) : 4;
  const right = hasLabels ? (isNarrow ? 110 : 118) : 4;
  const top = hasLabels ? 26 : 6;
  const highFt = Math.max(house.ridgeFt + 0.7, house.ventFt + 0.3);
  const tallFt = highFt - belowFt;
  const pxPerFt = Math.max(3, Math.min((width - left - right) / (rightFt - leftFt), (maxHeight - top) / tallFt));
  const height = Math.ceil(top + tallFt * pxPerFt);
  const slack = Math.max(0, width - left - right - (rightFt - leftFt) * pxPerFt) / 2;
  const x = (feet: number): number => round2(left + slack + (feet - leftFt) * pxPerFt);
  const y = (feet: number): number => round2(top + (highFt - feet) * pxPerFt);
  return {
    width,
    height,
    pxPerFt,
    x,
    y,
    frame: {
      left: x(leftFt),
      top: y(highFt),
      width: (rightFt - leftFt) * pxPerFt,
      height: tallFt * pxPerFt,
    },
  };
}

export type Feet = readonly [x: number, height: number];

/** A path through points in feet. */
export function feetPath(scale: CutawayScale, points: readonly Feet[]): string {
  return `M${points.map(([x, height]) => `${scale.x(x)} ${scale.y(height)}`).join('L')}`;
}
