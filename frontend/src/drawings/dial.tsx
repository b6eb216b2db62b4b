import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { arcPath, polar } from '../components/mark-geometry';
import { usePatterns } from './patterns';

export interface DialProps {
  /** Full scale of the gauge; 0 is at the lower left, 270 degrees round to it. */
  max: number;
  unit: string;
  /** A tick stands for every mark of the gauge. */
  increment?: number;
  /** What is typed; null while nothing is. */
  value: number | null;
  minimum: number;
  /** The ceiling: above it is over the lowest-rated part. */
  limit?: number | null;
  /** The forecast at the window: a dashed needle. */
  ghost?: number | null;
  /** Pump to: a pointer outside the ring. */
  pumpTo?: number | null;
  /** px, both ways. */
  size?: number;
}

const from = 135;
const sweep = 270;
/** Below this size every fifth mark is ticked. */
const smallSize = 150;
/** More ticks than this would be a grey ring. */
const mostTicks = 200;

/** A gauge: below the minimum hatched, good in blue, over the limit hatched red. */
export function Dial(props: DialProps): ReactNode {
  const { max, unit, value, minimum, ghost = null, pumpTo = null, size = 220 } = props;
  const { t } = useTranslation('marks');
  const patterns = usePatterns(['hatch', 'over-limit']);
  const middle = size / 2;
  const radius = middle - 22;
  const limit = Math.min(props.limit ?? max, max);
  const angle = (reading: number): number => from + (sweep * Math.min(max, Math.max(0, reading))) / max;
  const at = (r: number, reading: number): [number, number] => polar(middle, middle, r, angle(reading));
  const name = value === null ? t('dial.empty', { min: minimum, unit }) : t('dial.name', { value, unit, min: minimum });
  const also = [
    props.limit ? t('dial.limit', { limit }) : '',
    ghost === null ? '' : t('dial.ghost', { value: ghost }),
    pumpTo === null ? '' : t('dial.pump', { value: pumpTo }),
  ];
  const band = (a: number, b: number, stroke: string): ReactNode =>
    b > a ? <path d={arcPath(middle, middle, radius - 3, angle(a), angle(b))} stroke={stroke} strokeWidth="9" /> : null;
  const [m1, m2] = [at(radius + 6, minimum), at(radius - 12, minimum)];
  return (
    <svg
      width={size}
      height={size}
      viewBox={`0 0 ${size} ${size}`}
      role="img"
      aria-label={[name, ...also].filter(Boolean).join('; ')}
    >
      {patterns.defs}
      <g fill="none">
        <circle cx={middle} cy={middle} r={middle - 2} fill="var(--paper)" stroke="var(--ink)" strokeWidth="1.2" />
        <circle cx={middle} cy={middle} r={middle - 6} stroke="var(--rule2)" />
        {band(0, Math.min(minimum, max), patterns.fill('hatch'))}
        {band(minimum, limit, 'var(--waterFill)')}
        {band(limit, max, patterns.fill('over-limit'))}
        <Ticks {...props} at={at} radius={radius} />
        <path d={`M${m1.join(' ')}L${m2.join(' ')}`} stroke="var(--ink)" strokeWidth="3" />
        {ghost === null ? null : (
          <path
            d={`M${at(20, ghost).join(' ')}L${at(radius - 6, ghost).join(' ')}`}
            stroke="var(--brass)"
            strokeWidth="2.2"
            strokeDasharray="5 4"
          />
        )}
      </g>
      {pumpTo === null ? null : <Pointer middle={middle} radius={radius} angle={angle(pumpTo)} />}
      {value === null ? null : <Needle middle={middle} radius={radius} degrees={angle(value)} />}
    </svg>
  );
}

type At = (radius: number, reading: number) => [number, number];

function Ticks({ max, increment = 1, size = 220, at, radius }: DialProps & { at: At; radius: number }): ReactNode {
  const isSmall = size < smallSize;
  const fewest = Math.ceil(max / mostTicks / increment);
  const step = increment * Math.max(isSmall ? 5 : 1, fewest);
  const major = majorStep(max);
  const lengthOf = (reading: number): number =>
    isMultiple(reading, major) ? 11 : isMultiple(reading, major / 2) ? 8 : isMultiple(reading, major / 4) ? 5 : 2;
  const readings = Array.from({ length: Math.round(max / step) + 1 }, (_, index) => index * step);
  const line = (reading: number): string =>
    `M${at(radius + 2, reading).join(' ')}L${at(radius - lengthOf(reading), reading).join(' ')}`;
  const numbers = Array.from({ length: Math.floor(max / major) + 1 }, (_, index) => index * major);
  return (
    <>
      <path
        d={readings
          .filter((r) => !isMultiple(r, major))
          .map(line)
          .join('')}
        stroke="var(--ink)"
        strokeWidth=".7"
      />
      <path d={numbers.map(line).join('')} stroke="var(--ink)" strokeWidth="1.6" />
      {numbers
        .filter((_, index) => !isSmall || index % 2 === 0)
        .map((reading) => {
          const [x, y] = at(radius - (isSmall ? 19 : 25), reading);
          return (
            <text key={reading} className="m s12 med" x={x} y={y + 4.5} textAnchor="middle">
              {reading}
            </text>
          );
        })}
    </>
  );
}

/** Numbered marks: about eight round the dial. */
function majorStep(max: number): number {
  const steps = [0.5, 1, 2, 3, 5, 10, 20, 25, 50, 100, 200];
  return steps.find((step) => max / step <= 8 && isMultiple(max, step)) ?? max / 5;
}

function isMultiple(reading: number, step: number): boolean {
  const ratio = reading / step;
  return Math.abs(ratio - Math.round(ratio)) < 1e-6;
}

function Pointer({ middle, radius, angle }: { middle: number; radius: number; angle: number }): ReactNode {
  const tip = polar(middle, middle, radius + 3, angle);
  const left = polar(middle, middle, radius + 17, angle - 4.2);
  const right = polar(middle, middle, radius + 17, angle + 4.2);
  return (
    <path
      d={`M${tip.join(' ')}L${left.join(' ')}L${right.join(' ')}Z`}
      fill="var(--brassFill)"
      stroke="var(--ink)"
      strokeWidth="1.2"
      strokeLinejoin="round"
    />
  );
}

/** Drawn pointing right and turned, so that it swings when the reading changes. */
function Needle({ middle, radius, degrees }: { middle: number; radius: number; degrees: number }): ReactNode {
  return (
    <g transform={`translate(${middle} ${middle})`}>
      <g className="needle" style={{ transform: `rotate(${degrees}deg)` }}>
        <path d={`M0 -5L${radius - 2} 0L0 5L-24 0Z`} fill="var(--ink)" />
      </g>
      <circle r="7" fill="var(--ink)" />
      <circle r="2.5" fill="var(--paper)" />
    </g>
  );
}
