import type { ReactNode } from 'react';
import { usePatterns } from './patterns';
import { useDrawnWidth } from './use-drawn-width';

export interface TestChartScaleProps {
  low: number;
  mid: number;
  high: number;
  minimum: number;
  increment: number;
  pumpTo: number | null;
  /** Read aloud in place of the drawing. */
  name: string;
  /** "at 9:00 am" */
  atWord: string;
  pumpWord: string;
}

const height = 66;
const [top, bottom] = [26, 42];

/** A short rule of the gauge round the minimum: below it hatched, the expected range on it, the pump-to pointer over it. */
export function TestChartScale(props: TestChartScaleProps): ReactNode {
  const { low, mid, high, minimum, increment, pumpTo, name, atWord, pumpWord } = props;
  const [place, width] = useDrawnWidth(340);
  const patterns = usePatterns(['hatch']);
  const [from, to] = spanOf(props);
  const x = (value: number): number => 16 + ((value - from) / (to - from)) * (width - 32);
  const step = labelStep(from, to, increment, width);
  const marks = Math.round((to - from) / increment);
  const ticks = marks > 60 ? [] : Array.from({ length: marks + 1 }, (_, index) => from + index * increment);
  const labels = Array.from(
    { length: Math.floor((to - from) / step) + 1 },
    (_, index) => Math.ceil(from / step) * step + index * step,
  );
  const isShort = low < minimum;
  const tone = isShort ? 'var(--brass)' : 'var(--water)';
  const middle = (low + high) / 2;
  return (
    <div className="drawing" ref={place}>
      <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={name}>
        {patterns.defs}
        <rect x={x(from)} y={top} width={x(minimum) - x(from)} height={bottom - top} fill={patterns.fill('hatch')} />
        <rect x={x(minimum)} y={top} width={x(to) - x(minimum)} height={bottom - top} fill="var(--waterFill)" />
        <path
          d={`M${x(from)} ${bottom}H${x(to)}${ticks.map((value) => `M${x(value)} ${bottom}v5`).join('')}`}
          stroke="var(--ink)"
          fill="none"
        />
        <path d={`M${x(minimum)} ${top - 6}V${bottom + 6}`} stroke="var(--ink)" strokeWidth="3" />
        <path
          d={`M${x(low)} ${middleY}H${x(high)}M${x(low)} ${middleY - 5}v10M${x(high)} ${middleY - 5}v10`}
          stroke={tone}
          strokeWidth="2.4"
          fill="none"
        />
        <circle cx={x(mid)} cy={middleY} r="5.5" fill="var(--paper)" stroke={tone} strokeWidth="2.4" />
        <text className="s12 b" x={within(x(middle), width)} y={13} textAnchor="middle">
          {atWord}
        </text>
        {pumpTo === null ? null : (
          <>
            <path
              d={`M${x(pumpTo)} ${bottom - 1}l-6 -13h12Z`}
              fill="var(--brassFill)"
              stroke="var(--ink)"
              strokeWidth="1.2"
              strokeLinejoin="round"
            />
            {Math.abs(x(pumpTo) - x(middle)) < 80 ? null : (
              <text className="s12 b" x={within(x(pumpTo), width)} y={13} textAnchor="middle">
                {pumpWord}
              </text>
            )}
          </>
        )}
        {labels
          .filter((value) => value <= to + 1e-9)
          .map((value) => (
            <text key={value} className="m s12 mid" x={x(value)} y={bottom + 19} textAnchor="middle">
              {Number(value.toFixed(3))}
            </text>
          ))}
      </svg>
    </div>
  );
}

const middleY = (top + bottom) / 2;

const within = (x: number, width: number): number => Math.min(width - 44, Math.max(44, x));

/** Whole marks round everything shown, a few to spare. */
function spanOf({ low, high, minimum, increment, pumpTo }: TestChartScaleProps): [number, number] {
  const least = Math.min(low, minimum);
  const most = Math.max(high, minimum, pumpTo ?? minimum);
  const spare = Math.max(2 * increment, (most - least) * 0.15);
  return [Math.floor((least - spare) / increment) * increment, Math.ceil((most + spare) / increment) * increment];
}

/** Numbers stand 40 px apart at the least. */
function labelStep(from: number, to: number, increment: number, width: number): number {
  const most = Math.max(2, Math.floor((width - 32) / 40));
  const times = [1, 2, 5, 10, 20, 50, 100, 200, 500].find((one) => (to - from) / (one * increment) <= most) ?? 1000;
  return times * increment;
}
