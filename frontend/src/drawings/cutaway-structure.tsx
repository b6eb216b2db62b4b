import type { ReactNode } from 'react';
import { houseWidthFt, type DrawnHouse } from './cutaway-house';
import { feetPath, type CutawayScale } from './cutaway-scale';

interface StructureProps {
  house: DrawnHouse;
  scale: CutawayScale;
  soilFill: string;
  /** Groundwork: nothing stands above the slab yet. */
  isGroundwork: boolean;
}

/** Soil, footings, floors, walls and roof, in the order they cover one another. */
export function Structure({ house, scale, soilFill, isGroundwork }: StructureProps): ReactNode {
  const lowest = house.floors[0]?.heightFt ?? 3;
  return (
    <g>
      <Ground scale={scale} gradeFt={lowest - 1.4} soilFill={soilFill} />
      {house.floors.slice(0, isGroundwork ? 1 : undefined).map((floor) => (
        <Slab key={floor.name} scale={scale} at={floor.heightFt} thickness={1} />
      ))}
      {isGroundwork ? null : (
        <>
          <Slab scale={scale} at={house.atticFt} thickness={0.55} />
          <Walls house={house} scale={scale} />
          <Roof house={house} scale={scale} />
        </>
      )}
    </g>
  );
}

function Ground({ scale, gradeFt, soilFill }: { scale: CutawayScale; gradeFt: number; soilFill: string }): ReactNode {
  const { x, y } = scale;
  const side = (from: number, to: number): string => `M${x(from)} ${y(gradeFt)}H${x(to)}V${y(-2.6)}H${x(from)}Z`;
  const footing = (from: number, to: number): string =>
    `M${x(from)} ${y(gradeFt + 0.6)}H${x(to)}V${y(-1.5)}H${x(from)}Z`;
  return (
    <>
      <path
        d={`${side(-2.3, -0.8)}${side(30.8, 33)}M${x(-2.3)} ${y(-1.5)}H${x(33)}V${y(-2.6)}H${x(-2.3)}Z`}
        fill={soilFill}
      />
      <path
        d={`M${x(-2.3)} ${y(gradeFt)}H${x(-0.8)}M${x(30.8)} ${y(gradeFt)}H${x(33)}`}
        stroke="var(--ink)"
        strokeWidth="1.2"
      />
      <path d={footing(-0.8, 0) + footing(30, 30.8)} fill="var(--poche)" stroke="var(--ink)" strokeWidth="1" />
    </>
  );
}

function Slab({ scale, at, thickness }: { scale: CutawayScale; at: number; thickness: number }): ReactNode {
  const { x, y } = scale;
  return (
    <>
      <path
        d={`M${x(-0.3)} ${y(at)}H${x(30.3)}V${y(at - thickness)}H${x(-0.3)}Z`}
        fill="var(--paper)"
        stroke="var(--ink)"
        strokeWidth="1"
      />
      <path d={`M${x(-0.3)} ${y(at - 0.22)}H${x(30.3)}`} stroke="var(--ink)" strokeWidth=".7" />
    </>
  );
}

function Walls({ house, scale }: { house: DrawnHouse; scale: CutawayScale }): ReactNode {
  const spans = house.floors.map((floor, index) => {
    const above = house.floors[index + 1];
    return { from: floor.heightFt, to: above ? above.heightFt - 1 : house.atticFt - 0.55, isOdd: index % 2 === 1 };
  });
  const stud = (at: number, wide: number, from: number, to: number): string =>
    feetPath(scale, [
      [at, from],
      [at, to],
    ]) +
    feetPath(scale, [
      [at + wide, from],
      [at + wide, to],
    ]);
  const outer = spans
    .map(({ from, to }) => stud(0, 0.46, from, to) + stud(houseWidthFt - 0.46, 0.46, from, to))
    .join('');
  const inner = spans
    .flatMap(({ from, to, isOdd }) => (isOdd ? [15.5, 7.6] : [4, 13.2]).map((at) => stud(at, 0.4, from, to)))
    .join('');
  return (
    <>
      <path d={outer} fill="none" stroke="var(--ink)" strokeWidth=".9" />
      <path d={inner} fill="none" stroke="var(--rule2)" strokeWidth=".7" opacity=".7" />
    </>
  );
}

function Roof({ house, scale }: { house: DrawnHouse; scale: CutawayScale }): ReactNode {
  const { eaveFt, slope, ridgeFt, atticFt } = house;
  const middle = houseWidthFt / 2;
  const side = (over: number, lift: number): string =>
    feetPath(scale, [
      [-over, eaveFt - over * slope + lift],
      [middle, ridgeFt + lift],
      [houseWidthFt + over, eaveFt - over * slope + lift],
    ]);
  const at = (x: number): number => eaveFt + Math.min(x, houseWidthFt - x) * slope;
  const webs =
    feetPath(scale, [
      [0.4, atticFt],
      [7.5, at(7.5)],
      [10, atticFt],
      [15, at(15)],
      [17.6, atticFt],
    ]) +
    feetPath(scale, [
      [24.4, at(24.4)],
      [23, atticFt],
    ]);
  return (
    <>
      <path d={side(1.6, 0) + side(1.75, 0.5)} fill="none" stroke="var(--ink)" strokeWidth="1" />
      <path d={webs} fill="none" stroke="var(--rule2)" strokeWidth=".6" opacity=".55" />
    </>
  );
}
