import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { ChartLayout } from './test-chart-layout';
import type { ChartPoint, TestChartData } from './test-chart.types';

interface TestChartPointsProps {
  data: TestChartData;
  layout: ChartLayout;
  number: (value: number) => string;
}

/** Open readings as circles, blue where they count; shut ones as grey squares with the jump drawn; the last pump-up. */
export function TestChartPoints({ data, layout, number }: TestChartPointsProps): ReactNode {
  const { t } = useTranslation('marks');
  const { x, y, low, high, left } = layout;
  const { points, pumpedUp, jumps } = data;
  const open = points.filter(({ isOpen, isPast }) => isOpen && !isPast);
  const used = open.filter(({ isUsed }) => isUsed);
  const early = [...open.filter(({ isUsed }) => !isUsed), ...used.slice(0, 1)];
  const line = (along: readonly ChartPoint[]): string =>
    along.map(({ atMs, value }) => `${x(atMs)} ${y(value)}`).join('L');
  const isInside = ({ value }: ChartPoint): boolean => value >= low && value <= high;
  const shown = points.filter(isInside);
  const named = new Set([used[0], used.at(-1)]);
  return (
    <>
      {early.length > 1 ? (
        <path d={`M${line(early)}`} fill="none" stroke="var(--ink2)" strokeWidth="1.4" strokeDasharray="3 3" />
      ) : null}
      {used.length > 1 ? <path d={`M${line(used)}`} fill="none" stroke="var(--water)" strokeWidth="2" /> : null}
      {pumpedUp === null ? null : (
        <>
          <path
            d={`M${x(pumpedUp.atMs)} ${y(pumpedUp.from)}V${y(pumpedUp.to)}m-4 11l4 -7l4 7`}
            fill="none"
            stroke="var(--brass)"
            strokeWidth="2.2"
          />
          <text className="s12 b halo chart-brass" x={Math.max(left + 4, x(pumpedUp.atMs) - 6)} y={y(pumpedUp.to) - 10}>
            {t('testChart.pumped', { value: number(pumpedUp.to) })}
          </text>
        </>
      )}
      {jumps.map(({ atMs, from, to }) => (
        <path key={atMs} d={`M${x(atMs)} ${y(from)}V${y(to)}`} stroke="var(--brass)" strokeWidth="2" />
      ))}
      {shown.map((point) =>
        point.isOpen ? (
          <circle
            key={point.atMs}
            cx={x(point.atMs)}
            cy={y(point.value)}
            r="4.2"
            fill="var(--paper)"
            stroke={point.isUsed ? 'var(--water)' : 'var(--ink2)'}
            strokeWidth={point.isUsed ? 2 : 1.6}
          />
        ) : (
          <rect
            key={point.atMs}
            x={x(point.atMs) - 4}
            y={y(point.value) - 4}
            width="8"
            height="8"
            fill="var(--paper)"
            stroke="var(--ink2)"
            strokeWidth="1.8"
          />
        ),
      )}
      {shown
        .filter((point) => named.has(point))
        .map((point) => (
          <text key={point.atMs} className="m s12 b halo" x={x(point.atMs)} y={y(point.value) + 20} textAnchor="middle">
            {number(point.value)}
          </text>
        ))}
    </>
  );
}
