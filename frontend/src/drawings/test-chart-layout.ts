import { minutesOfDay } from '../lib/local-days';
import type { TestChartData } from './test-chart.types';

export interface ChartLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  /** The foot of the pressures; lanes stand below it. */
  readonly foot: number;
  readonly valveTop: number | null;
  readonly airTop: number | null;
  readonly axis: number;
  readonly fromMs: number;
  readonly toMs: number;
  readonly low: number;
  readonly high: number;
  readonly x: (atMs: number) => number;
  /** Held inside the chart. */
  readonly y: (value: number) => number;
  readonly valueTicks: readonly number[];
  readonly timeTicks: readonly { readonly atMs: number; readonly isLabelled: boolean }[];
  /** Midnights inside the span. */
  readonly midnights: readonly number[];
}

const left = 46;
const rightMargin = 14;
const top = 44;
const valveLane = 24;
const airLane = 44;
const axisHeight = 26;
const minuteMs = 60_000;
const dayMinutes = 1440;

/** Steps between ticks, minutes. */
const steps = [5, 10, 15, 30, 60, 120, 180, 240, 360, 720, dayMinutes, 2 * dayMinutes, 7 * dayMinutes, 28 * dayMinutes];
const wordPx = 58;
const linePx = 20;

/** Where everything stands on the chart. It never starts at 0, and the minimum is always in it. */
export function layOutChart(data: TestChartData, width: number, zone: string): ChartLayout {
  const height = width < 480 ? 290 : 330;
  const hasAir = data.points.some(({ temperatureF }) => temperatureF !== null);
  const axis = height - axisHeight;
  const airTop = hasAir ? axis - airLane : null;
  const valveTop = data.isLevel ? null : (airTop ?? axis) - valveLane;
  const foot = valveTop ?? airTop ?? axis;
  const [fromMs, toMs] = timeSpan(data);
  const [low, high] = valueSpan(data);
  const right = width - rightMargin;
  const inside = (value: number): number => Math.min(high, Math.max(low, value));
  return {
    ...{ width, height, left, right, top, foot, valveTop, airTop, axis, fromMs, toMs, low, high },
    x: (atMs) => round(left + ((atMs - fromMs) / (toMs - fromMs)) * (right - left)),
    y: (value) => round(top + ((high - inside(value)) / (high - low)) * (foot - top)),
    // nothing is read above the rim
    valueTicks: valueTicks(low, data.isLevel ? Math.min(high, 0) : high, data.increment, foot - top),
    ...timeTicks(fromMs, toMs, right - left, zone),
  };
}

const round = (px: number): number => Math.round(px * 100) / 100;

function timeSpan({ points, window }: TestChartData): [number, number] {
  const times = points.map(({ atMs }) => atMs);
  const first = Math.min(...times, ...(window === null ? [] : [window.fromMs]));
  const last = Math.max(...times, ...(window === null ? [] : [window.toMs]));
  const spare = Math.max(10 * minuteMs, (last - first) * 0.035);
  return [first - spare, last + spare];
}

function valueSpan({ points, minimum, cone, increment }: TestChartData): [number, number] {
  const values = [
    ...points.filter(({ isPast }) => !isPast).map(({ value }) => value),
    ...cone.flatMap(({ low, high }) => [low, high]),
    ...(minimum === null ? [] : [minimum]),
  ];
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const spare = Math.max(2 * increment, (most - least) * 0.16);
  return [least - spare, most + spare];
}

function valueTicks(low: number, high: number, increment: number, px: number): number[] {
  const most = Math.max(2, Math.floor(px / linePx));
  const times = [1, 2, 4, 5, 10, 20, 50, 100, 200, 500].find((one) => (high - low) / (one * increment) <= most) ?? 1000;
  const step = times * increment;
  const first = Math.ceil(low / step);
  const count = Math.floor(high / step) - first + 1;
  return Array.from({ length: count }, (_, index) => Number(((first + index) * step).toFixed(6)));
}

/** Ticks at round hours of the wall clock; those that print stand a word apart. */
function timeTicks(
  fromMs: number,
  toMs: number,
  px: number,
  zone: string,
): Pick<ChartLayout, 'timeTicks' | 'midnights'> {
  const minutes = (toMs - fromMs) / minuteMs;
  const longest = steps[steps.length - 1] ?? dayMinutes;
  const labelled = steps.find((step) => (minutes / step) * wordPx <= px) ?? longest;
  const between = steps.find((step) => labelled % step === 0 && (minutes / step) * 12 <= px) ?? labelled;
  const midnight = midnightBefore(fromMs, zone);
  const onStep = (step: number): number[] => {
    const first = Math.ceil((fromMs - midnight) / (step * minuteMs));
    const count = Math.floor((toMs - midnight) / (step * minuteMs)) - first + 1;
    return Array.from({ length: Math.max(0, count) }, (_, index) => midnight + (first + index) * step * minuteMs);
  };
  const printed = new Set(onStep(labelled));
  return {
    timeTicks: onStep(between).map((atMs) => ({ atMs, isLabelled: printed.has(atMs) })),
    midnights: labelled >= dayMinutes ? [] : onStep(dayMinutes),
  };
}

const midnightBefore = (atMs: number, zone: string): number => {
  const minute = Math.floor(atMs / minuteMs) * minuteMs;
  return minute - minutesOfDay(new Date(minute), zone) * minuteMs;
};
