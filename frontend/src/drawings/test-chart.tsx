import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useTimeWords } from '../lib/time';
import { usePatterns, type Patterns } from './patterns';
import { TestChartLanes } from './test-chart-lanes';
import { layOutChart, type ChartLayout } from './test-chart-layout';
import { TestChartLegend } from './test-chart-legend';
import { TestChartPoints } from './test-chart-points';
import { TestChartNow, TestChartWindow } from './test-chart-window';
import type { ChartBand, TestChartData } from './test-chart.types';
import { useDrawnWidth } from './use-drawn-width';
import './test-chart.css';

export interface TestChartProps {
  data: TestChartData;
  zone: string;
  nowMs: number;
  /** Its values in the reader's unit, never finer than the gauge; no unit behind it. */
  number: (value: number) => string;
  unit: string;
  degrees: (temperatureF: number) => string;
  degreesUnit: string;
  /** The text in place of the drawing. */
  name: string;
  /** "111–113", what is expected at the window. */
  expected: string | null;
}

/** A test's log drawn: readings, what is not counted, what trend or temperature explains, and where it will stand at the window. */
export function TestChart(props: TestChartProps): ReactNode {
  const { data, zone, name } = props;
  const [place, width] = useDrawnWidth(600);
  const patterns = usePatterns(['hatch']);
  if (data.points.length === 0 && data.window === null) return null;
  const layout = layOutChart(data, width, zone);
  return (
    <div className="test-chart">
      <div className="drawing" ref={place}>
        <svg
          width={width}
          height={layout.height}
          viewBox={`0 0 ${width} ${layout.height}`}
          role="img"
          aria-label={name}
        >
          {patterns.defs}
          <Grounds {...props} layout={layout} patterns={patterns} />
          <Spread data={data} layout={layout} />
          <Minimum {...props} layout={layout} />
          <TestChartPoints {...props} layout={layout} />
          <TestChartWindow {...props} layout={layout} />
          <Frame {...props} layout={layout} />
          <TestChartLanes {...props} layout={layout} />
          <TestChartNow {...props} layout={layout} />
        </svg>
      </div>
      <TestChartLegend data={data} />
    </div>
  );
}

type Drawn = TestChartProps & { layout: ChartLayout };

function Grounds({ data, layout, patterns, number }: Drawn & { patterns: Patterns }): ReactNode {
  const { t } = useTranslation('marks');
  const { x, y, top, foot, left, right } = layout;
  const { settling, window, minimum } = data;
  const settledX = settling === null ? 0 : Math.min(right, x(settling.toMs));
  const floor = minimum === null ? foot : y(minimum);
  return (
    <>
      {window === null ? null : (
        <rect
          x={x(window.fromMs)}
          y={top}
          width={x(window.toMs) - x(window.fromMs)}
          height={foot - top}
          fill="var(--primerWash)"
        />
      )}
      {layout.valueTicks.map((value) => (
        <g key={value}>
          <path d={`M${left} ${y(value)}H${right}`} stroke="var(--rule)" strokeWidth=".8" />
          <text className="m s12 mid" x={left - 7} y={y(value) + 4} textAnchor="end">
            {number(value)}
          </text>
        </g>
      ))}
      {minimum === null ? null : (
        <rect
          x={left}
          y={floor}
          width={right - left}
          height={foot - floor}
          fill={patterns.fill('hatch')}
          opacity=".55"
        />
      )}
      {settling === null ? null : (
        <>
          <rect
            x={x(settling.fromMs)}
            y={top}
            width={Math.max(0, settledX - x(settling.fromMs))}
            height={floor - top}
            fill={patterns.fill('hatch')}
          />
          <path d={`M${settledX} ${top}V${floor}`} stroke="var(--ink2)" />
          {right - settledX > 190 ? (
            <text className="s12 med halo" x={settledX + 8} y={top + 16}>
              {t('testChart.settling')}
            </text>
          ) : null}
        </>
      )}
    </>
  );
}

const join = (points: readonly (readonly [number, number])[]): string =>
  points.map((point) => point.join(' ')).join('L');

/** The band of what is explained, and the cone from the last used reading. */
function Spread({ data, layout: { x, y } }: { data: TestChartData; layout: ChartLayout }): ReactNode {
  const { band, cone } = data;
  const edge = (points: readonly ChartBand[], which: 'low' | 'high'): (readonly [number, number])[] =>
    points.map((point) => [x(point.atMs), y(point[which])] as const);
  const area = (points: readonly ChartBand[]): string =>
    `M${join([...edge(points, 'low'), ...edge(points, 'high').reverse()])}Z`;
  return (
    <>
      {band.length > 1 ? <path d={area(band)} fill="var(--waterFill)" opacity=".75" /> : null}
      {cone.length > 1 ? (
        <>
          <path d={area(cone)} fill="var(--primer)" opacity=".15" />
          <path
            d={`M${join(edge(cone, 'high'))}M${join(edge(cone, 'low'))}`}
            fill="none"
            stroke="var(--primer)"
            strokeWidth=".9"
          />
          <path
            d={`M${join(cone.map(({ atMs, mid }) => [x(atMs), y(mid)] as const))}`}
            fill="none"
            stroke="var(--primer)"
            strokeWidth="2"
            strokeDasharray="6 4"
          />
        </>
      ) : null}
    </>
  );
}

function Minimum({ data: { minimum }, layout: { left, right, y }, number, unit }: Drawn): ReactNode {
  const { t } = useTranslation('marks');
  if (minimum === null) return null;
  return (
    <>
      <path d={`M${left} ${y(minimum)}H${right}`} stroke="var(--ink)" strokeWidth="1.8" />
      <text className="s12 b halo" x={left + 8} y={y(minimum) + 15}>
        {t('testChart.minimum', { value: number(minimum), unit })}
      </text>
    </>
  );
}

function Frame({ layout, unit, zone }: Drawn): ReactNode {
  const time = useTimeWords();
  const { left, right, top, foot, axis, x } = layout;
  return (
    <>
      <path d={`M${left} ${top}V${foot}H${right}`} stroke="var(--ink)" fill="none" />
      <text className="s12 mut" x={left - 7} y={top - 8} textAnchor="end">
        {unit}
      </text>
      {layout.midnights.map((atMs) => (
        <g key={atMs}>
          <path d={`M${x(atMs)} ${top - 14}V${axis}`} stroke="var(--rule2)" strokeDasharray="2 3" />
          {right - x(atMs) > 80 ? (
            <text className="s12 mut halo" x={x(atMs) + 6} y={top - 4}>
              {time.day(new Date(atMs + 60_000), zone)}
            </text>
          ) : null}
        </g>
      ))}
    </>
  );
}
