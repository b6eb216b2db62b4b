import { airGaugePsiAt } from '@holdwater/shared-types/hydraulics/air.js';
import type { ChartBand, ChartCone, ChartPoint, TestChartData } from '../../drawings/test-chart.types';
import { gaugeJumps } from './gauge-jump';
import { countedReadings, type AnalysedTest, type TestAnalysis } from './test-analysis';
import type { FoundAnalysis } from './use-test-analysis';

/** What the chart of a test draws, of the log and what was worked out of it. */
export function testChartOf({ test, analysis, terms }: FoundAnalysis): TestChartData {
  const points = pointsOf(test, analysis);
  const used = points.filter(({ isUsed }) => isUsed);
  const { isLevel, increment, minimumPsi } = analysis;
  const { forecast } = terms;
  return {
    points,
    isLevel,
    increment,
    minimum: minimumPsi,
    settling: settlingOf(points, analysis),
    ...bandOf(test, analysis, used),
    cone: coneOf({ test, analysis, terms }, used.at(-1)),
    window: forecast && { fromMs: Date.parse(forecast.from), toMs: Date.parse(forecast.to) },
    pumpedUp: pumpedUpOf(points, analysis),
    jumps: gaugeJumps(test)
      .filter(({ fromPsi, toPsi }) => Math.abs(toPsi - fromPsi) > increment)
      .map(({ openAt, fromPsi, toPsi }) => ({ atMs: Date.parse(openAt), from: fromPsi, to: toPsi })),
  };
}

function pointsOf(test: AnalysedTest, { isLevel, series, toppedUpAt }: TestAnalysis): ChartPoint[] {
  const usedAt = new Set(series.filter(({ used }) => used).map(({ at }) => Date.parse(at)));
  const sinceMs = toppedUpAt === null ? -Infinity : Date.parse(toppedUpAt);
  return countedReadings(test).flatMap(({ at, pressurePsi, levelIn, temperatureF, gaugeValve }) => {
    const value = isLevel ? levelIn : pressurePsi;
    if (value === null || (!isLevel && gaugeValve === null)) return [];
    const atMs = Date.parse(at);
    return [
      {
        ...{ atMs, temperatureF, isUsed: usedAt.has(atMs), isPast: atMs < sinceMs },
        value: isLevel ? 0 - value : value,
        isOpen: isLevel || gaugeValve === 'open',
      },
    ];
  });
}

/** From the first open reading that stands to the settle time; null where none is asked for. */
function settlingOf(points: readonly ChartPoint[], { settledAt }: TestAnalysis): TestChartData['settling'] {
  const first = points.find(({ isOpen, isPast }) => isOpen && !isPast);
  const toMs = settledAt === null ? 0 : Date.parse(settledAt);
  return first !== undefined && toMs > first.atMs ? { fromMs: first.atMs, toMs } : null;
}

function pumpedUpOf(points: readonly ChartPoint[], { toppedUpAt }: TestAnalysis): TestChartData['pumpedUp'] {
  const index = points.findIndex(({ atMs }) => toppedUpAt !== null && atMs === Date.parse(toppedUpAt));
  const before = points.slice(0, Math.max(0, index)).findLast(({ isOpen }) => isOpen);
  const at = points[index];
  return at === undefined || before === undefined ? null : { atMs: at.atMs, from: before.value, to: at.value };
}

/** With air in the pipe what temperature explains, at every reading; with water alone the trend. Give or take half a mark. */
function bandOf(
  test: AnalysedTest,
  { increment, slopePerHour, patmPsi }: TestAnalysis,
  used: readonly ChartPoint[],
): Pick<TestChartData, 'band' | 'bandIs'> {
  const [first, last] = [used[0], used.at(-1)];
  if (first === undefined || last === undefined) return { band: [], bandIs: 'trend' };
  const half = increment / 2;
  if (test.medium !== 'water') {
    const band = used.flatMap(({ atMs, temperatureF }): ChartBand[] => {
      const values = explainedBy(test, first, temperatureF, patmPsi);
      return values === null ? [] : [{ atMs, low: Math.min(...values) - half, high: Math.max(...values) + half }];
    });
    return { band, bandIs: 'temperature' };
  }
  const slope = slopePerHour?.[0] ?? 0;
  const band = [first.atMs, last.atMs].map((atMs) => {
    const mid = last.value + (slope * (atMs - last.atMs)) / 3_600_000;
    return { atMs, low: mid - half, high: mid + half };
  });
  return { band: used.length > 1 ? band : [], bandIs: 'trend' };
}

/** What the first counted reading would show at another temperature, by each rule of the medium; null where one is not known. */
export function explainedBy(
  { medium }: Pick<AnalysedTest, 'medium'>,
  first: Pick<ChartPoint, 'value' | 'temperatureF'>,
  temperatureF: number | null,
  patmPsi: number,
): number[] | null {
  if (first.temperatureF === null || temperatureF === null) return null;
  const follows = airGaugePsiAt(first.value, first.temperatureF, temperatureF, patmPsi);
  return medium === 'water-topped-with-air' ? [first.value, follows] : [follows];
}

function coneOf({ analysis, terms }: FoundAnalysis, last: ChartPoint | undefined): ChartCone[] {
  const { forecast, increment } = analysis;
  if (forecast === null || terms.forecast === null || last === undefined) return [];
  const { from, to, temperatureF } = terms.forecast;
  const half = increment / 2;
  const start = { mid: last.value, low: last.value - half, high: last.value + half };
  return [
    { atMs: last.atMs, ...start, temperatureF: last.temperatureF },
    { atMs: Date.parse(from), ...forecast.from, temperatureF },
    { atMs: Date.parse(to), ...forecast.to, temperatureF },
  ].filter(({ atMs }, index) => index === 0 || atMs > last.atMs);
}
