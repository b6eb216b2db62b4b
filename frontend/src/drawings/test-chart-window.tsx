import type { ReactNode } from 'react';
import { useTimeWords } from '../lib/time';
import type { ChartLayout } from './test-chart-layout';
import type { TestChartData } from './test-chart.types';

interface TestChartWindowProps {
  data: TestChartData;
  layout: ChartLayout;
  zone: string;
  expected: string | null;
}

/** The booked window between brackets, with what is expected when it opens. */
export function TestChartWindow({ data, layout, zone, expected }: TestChartWindowProps): ReactNode {
  const time = useTimeWords();
  const { window, cone } = data;
  const { x, y, top, foot, right, left } = layout;
  if (window === null) return null;
  const [from, to] = [x(window.fromMs), x(window.toMs)];
  const foot6 = Math.min(6, (to - from) / 3);
  const at = cone.find(({ atMs }) => atMs === window.fromMs);
  const highest = Math.min(...cone.filter(({ atMs }) => atMs >= window.fromMs).map(({ high }) => y(high)));
  const middle = Math.max(left + 46, Math.min((from + to) / 2, right - 46));
  return (
    <>
      <path
        d={`M${from + foot6} ${top - 16}H${from}V${foot}M${to - foot6} ${top - 16}H${to}V${foot}`}
        fill="none"
        stroke="var(--primer)"
        strokeWidth="1.4"
      />
      <text className="m s12 b chart-window" x={middle} y={top - 22} textAnchor="middle">
        {time.window(new Date(window.fromMs), new Date(window.toMs), zone)}
      </text>
      {at === undefined ? null : (
        <>
          <path
            d={`M${from} ${y(at.low)}V${y(at.high)}M${from - 4} ${y(at.low)}h8M${from - 4} ${y(at.high)}h8`}
            stroke="var(--primer)"
            strokeWidth="1.8"
            fill="none"
          />
          <circle cx={from} cy={y(at.mid)} r="4.8" fill="var(--primer)" />
          {expected === null ? null : (
            <text
              className="m s12 b halo chart-window"
              x={middle}
              y={Math.max(top + 12, highest - 9)}
              textAnchor="middle"
            >
              {expected}
            </text>
          )}
        </>
      )}
    </>
  );
}

/** The present, where it lies on the chart. */
export function TestChartNow({
  layout: { x, top, axis, fromMs, toMs },
  nowMs,
  zone,
}: {
  layout: ChartLayout;
  nowMs: number;
  zone: string;
}): ReactNode {
  const time = useTimeWords();
  if (nowMs < fromMs || nowMs > toMs) return null;
  const at = x(nowMs);
  return (
    <>
      <path d={`M${at} ${top}V${axis}`} stroke="var(--primer)" strokeWidth="1.5" />
      <path d={`M${at - 6} ${top - 9}h12l-6 8Z`} fill="var(--primer)" />
      <text className="m s12 b halo chart-now" x={at - 9} y={top - 3} textAnchor="end">
        {time.clock(new Date(nowMs), zone)}
      </text>
    </>
  );
}
