import type { ReactNode } from 'react';
import type { DrawnHouse } from './cutaway-house';
import { feetPath, type CutawayScale, type Feet } from './cutaway-scale';

/** The water lines: dashed and grey beneath a DWV view, full in their own. One trunk, a branch on every floor. */
export function WaterLines(props: {
  house: DrawnHouse;
  scale: CutawayScale;
  isOwnView: boolean;
  gaugeFt: number | null;
}): ReactNode {
  const { house, scale, isOwnView, gaugeFt } = props;
  const lowest = house.floors[0]?.heightFt ?? 3;
  const trunk = lowest - 1.1;
  const highest = house.floors.at(-1)?.heightFt ?? lowest;
  const lines: Feet[][] = [
    [
      [-2.4, trunk],
      [14.6, trunk],
      [14.6, highest - 1.5],
    ],
    [
      [14.6, lowest + 1.9],
      [12.6, lowest + 1.9],
    ],
    [
      [11.9, trunk],
      [11.9, lowest + 6.6],
    ],
    ...house.floors.slice(1).flatMap((floor): Feet[][] => {
      const under = floor.heightFt - 1.5;
      return [
        [
          [14.6, under],
          [9.2, under],
          [9.2, floor.heightFt + 3.6],
        ],
        [
          [14.6, under],
          [27.2, under],
          [27.2, floor.heightFt + 4],
        ],
        [
          [18.6, under],
          [18.6, floor.heightFt + 2.2],
        ],
      ];
    }),
  ];
  return (
    <g fill="none" strokeLinejoin="round">
      <path
        d={lines.map((line) => feetPath(scale, line)).join('')}
        stroke={isOwnView ? 'var(--water)' : 'var(--rule2)'}
        strokeWidth={isOwnView ? 2.6 : 1.1}
        strokeDasharray={isOwnView ? undefined : '5 2.5'}
      />
      {isOwnView ? <GaugeSign scale={scale} at={[9.2, gaugeFt ?? highest + 4.6]} /> : null}
    </g>
  );
}

function GaugeSign({ scale, at: [x, height] }: { scale: CutawayScale; at: Feet }): ReactNode {
  return (
    <>
      <circle cx={scale.x(x)} cy={scale.y(height)} r="8" fill="var(--paper)" stroke="var(--ink)" strokeWidth="1.4" />
      <path d={`M${scale.x(x)} ${scale.y(height)}l4-4`} stroke="var(--red)" strokeWidth="1.6" />
    </>
  );
}
