import { useId, type ReactNode } from 'react';
import { round2 } from '../components/mark-geometry';
import type { Opening, Run, Runs } from './cutaway-run';
import { feetPath, type CutawayScale } from './cutaway-scale';

interface PipesProps {
  runs: Runs;
  scale: CutawayScale;
  /** Feet above the plug; null where no water stands. */
  levelFt: number | null;
  /** The whole system is under test without water. */
  isAir: boolean;
  /** Drawn pale beneath the water lines. */
  isPale: boolean;
  hatchFill: string;
}

/** Drains, wastes and vents: outer stroke, fill to the level, hatching where nothing is under test, joints, caps. */
export function Pipes({ runs, scale, levelFt, isAir, isPale, hatchFill }: PipesProps): ReactNode {
  const clip = useId();
  const paths = runs.runs.map((run) => ({ d: runPath(run, scale), px: bore(run.nominalIn, scale) }));
  const sewer = { d: runPath(runs.sewer, scale), px: bore(runs.sewer.nominalIn, scale) };
  const edge = isPale ? 'var(--rule2)' : 'var(--ink)';
  const levelY = levelFt === null ? scale.height : scale.y(levelFt);
  const isPlanned = levelFt !== null || isAir;
  return (
    <g fill="none" strokeLinejoin="round">
      <defs>
        <clipPath id={`${clip}-under`}>
          <rect className="rise" x="0" y={levelY} width={scale.width} height={Math.max(0, scale.height - levelY)} />
        </clipPath>
        <clipPath id={`${clip}-over`}>
          <rect className="rise" x="0" y="0" width={scale.width} height={levelY} />
        </clipPath>
      </defs>
      {[...paths, sewer].map(({ d, px }, index) => (
        <path key={index} d={d} stroke={edge} strokeWidth={px + 2.2} />
      ))}
      {[...paths, sewer].map(({ d, px }, index) => (
        <path key={index} d={d} stroke="var(--paper)" strokeWidth={px} />
      ))}
      {isPale ? null : (
        <>
          <path d={sewer.d} stroke={hatchFill} strokeWidth={sewer.px} />
          <g clipPath={`url(#${clip}-under)`}>
            {paths.map(({ d, px }, index) => (
              <path key={index} d={d} stroke="var(--waterFill)" strokeWidth={px} />
            ))}
          </g>
          {isPlanned && !isAir ? (
            <g clipPath={`url(#${clip}-over)`}>
              {paths.map(({ d, px }, index) => (
                <path key={index} d={d} stroke={hatchFill} strokeWidth={px} />
              ))}
            </g>
          ) : null}
          <Joints runs={runs} scale={scale} />
          {runs.openings
            .filter((opening) => isAir || (levelFt !== null && opening.at[1] < levelFt - 0.05))
            .map((opening) => (
              <Cap key={opening.at.join()} opening={opening} scale={scale} />
            ))}
        </>
      )}
    </g>
  );
}

/** Pipes are drawn wider than to scale, so that the fill shows on a phone. */
function thickness(scale: CutawayScale): number {
  return Math.max(0.62, Math.min(1.8, scale.pxPerFt / 13));
}

function bore(nominalIn: number, scale: CutawayScale): number {
  return round2(Math.max(4.2, nominalIn * 2.15) * thickness(scale));
}

function runPath(run: Run, scale: CutawayScale): string {
  const last = run.points.at(-1);
  if (!run.trap || !last) return feetPath(scale, run.points);
  const { riserFt, topFt } = run.trap;
  const [weir, height] = last;
  const isLeft = riserFt < weir;
  const radius = round2((Math.abs(riserFt - weir) / 2) * scale.pxPerFt);
  const before = weir + (isLeft ? 0.22 : -0.22);
  const arm = feetPath(scale, [...run.points.slice(0, -1), [before, height]]);
  const dip = scale.y(height - 0.2);
  const bend = `A${radius} ${radius} 0 0 ${isLeft ? 1 : 0} ${scale.x(riserFt)} ${dip}`;
  return `${arm}Q${scale.x(weir)} ${scale.y(height)} ${scale.x(weir)} ${dip}${bend}V${scale.y(topFt)}`;
}

function Joints({ runs, scale }: { runs: Runs; scale: CutawayScale }): ReactNode {
  const thick = thickness(scale);
  return runs.joints.map(({ at: [x, height], nominalIn }) => {
    const wide = bore(nominalIn, scale) + 5 * thick;
    return (
      <rect
        key={`${x} ${height}`}
        x={scale.x(x) - wide / 2}
        y={scale.y(height) - 8.5 * thick}
        width={wide}
        height={3 * thick}
        fill="var(--primer)"
      />
    );
  });
}

function Cap({ opening, scale }: { opening: Opening; scale: CutawayScale }): ReactNode {
  const [x, height] = opening.at;
  const thick = thickness(scale);
  const across = bore(opening.nominalIn, scale) + 6 * thick;
  const along = 5 * thick;
  const [width, tall] = opening.isSideways ? [along, across] : [across, along];
  return (
    <rect
      x={scale.x(x) - width / 2}
      y={scale.y(height) - tall / 2}
      width={width}
      height={tall}
      fill="var(--brassFill)"
      stroke="var(--ink)"
      strokeWidth="1"
    />
  );
}
