import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useTimeWords } from '../lib/time';
import type { ChartLayout } from './test-chart-layout';
import type { TestChartData } from './test-chart.types';

interface TestChartLanesProps {
  data: TestChartData;
  layout: ChartLayout;
  zone: string;
  degrees: (temperatureF: number) => string;
  degreesUnit: string;
}

/** Under the pressures: the gauge valve, the air in the house, and the hours. */
export function TestChartLanes(props: TestChartLanesProps): ReactNode {
  return (
    <>
      <ValveLane {...props} />
      <AirLane {...props} />
      <Hours {...props} />
    </>
  );
}

function ValveLane({ data: { points }, layout: { valveTop, left, x } }: TestChartLanesProps): ReactNode {
  const { t } = useTranslation('marks');
  if (valveTop === null || points.length === 0) return null;
  const changes = points.filter(({ isOpen }, index) => index === 0 || points[index - 1]?.isOpen !== isOpen);
  const lastMs = points[points.length - 1]?.atMs ?? 0;
  return (
    <>
      <text className="s12 mut" x={left - 7} y={valveTop + 18} textAnchor="end">
        {t('testChart.valve')}
      </text>
      {changes.map(({ atMs, isOpen }, index) => (
        <rect
          key={atMs}
          x={x(atMs)}
          y={valveTop + 9}
          width={Math.max(2, x(changes[index + 1]?.atMs ?? lastMs) - x(atMs))}
          height="10"
          fill={isOpen ? 'var(--paper)' : 'var(--ink2)'}
          stroke="var(--ink2)"
        />
      ))}
    </>
  );
}

function AirLane({ data, layout, degrees, degreesUnit }: TestChartLanesProps): ReactNode {
  const { airTop, axis, left, x } = layout;
  const known = (list: readonly { atMs: number; temperatureF: number | null }[]): { atMs: number; f: number }[] =>
    list.flatMap(({ atMs, temperatureF }) => (temperatureF === null ? [] : [{ atMs, f: temperatureF }]));
  const read = known(data.points);
  const last = read.at(-1);
  if (airTop === null || last === undefined) return null;
  const coming = known(data.cone.slice(1));
  const all = [...read, ...coming].map(({ f }) => f);
  const [least, most] = [Math.min(...all), Math.max(...all)];
  const spread = Math.max(8, most - least);
  const y = (f: number): number => axis - 7 - ((f - least) / spread) * (axis - airTop - 24);
  const line = (along: readonly { atMs: number; f: number }[]): string =>
    along.map(({ atMs, f }) => `${x(atMs)} ${y(f)}`).join('L');
  const named = new Map([read[0], last, coming[0]].flatMap((one) => (one === undefined ? [] : [[one.atMs, one]])));
  return (
    <>
      <text className="s12 mut" x={left - 7} y={axis - 10} textAnchor="end">
        {degreesUnit}
      </text>
      {read.length > 1 ? <path d={`M${line(read)}`} fill="none" stroke="var(--ink2)" strokeWidth="1.4" /> : null}
      {coming.length > 0 ? (
        <path
          d={`M${line([last, ...coming])}`}
          fill="none"
          stroke="var(--ink2)"
          strokeWidth="1.4"
          strokeDasharray="4 3"
        />
      ) : null}
      {[...named.values()].map(({ atMs, f }) => (
        <text key={atMs} className="m s12 mid halo" x={x(atMs)} y={y(f) - 5} textAnchor="middle">
          {degrees(f)}
        </text>
      ))}
    </>
  );
}

const dayMs = 86_400_000;

function Hours({ layout, zone }: TestChartLanesProps): ReactNode {
  const time = useTimeWords();
  const { left, right, axis, x, timeTicks } = layout;
  const printed = timeTicks.filter(({ isLabelled }) => isLabelled);
  const isDaily = (printed[1]?.atMs ?? 0) - (printed[0]?.atMs ?? 0) >= dayMs - 3_600_000;
  const ticks = timeTicks.map(({ atMs, isLabelled }) => `M${x(atMs)} ${axis}v${isLabelled ? 7 : 4}`).join('');
  // am and pm are left out only here, on the rule's own hours
  const hour = (atMs: number): string => time.clock(new Date(atMs), zone).replace(/\s*[ap]\.?\s?m\.?$/i, '');
  return (
    <>
      <path d={`M${left} ${axis}H${right}${ticks}`} stroke="var(--ink)" fill="none" />
      {printed
        .filter(({ atMs }) => x(atMs) > left + 8 && x(atMs) < right - 10)
        .map(({ atMs }) => (
          <text key={atMs} className="m s12 mid" x={x(atMs)} y={axis + 21} textAnchor="middle">
            {isDaily ? time.day(new Date(atMs), zone).replace(/^\S+\s/, '') : hour(atMs)}
          </text>
        ))}
    </>
  );
}
