/** A reading on the chart; `value` grows with what the system holds (psi, or inches below the rim made negative). */
export interface ChartPoint {
  readonly atMs: number;
  readonly value: number;
  readonly temperatureF: number | null;
  /** With the valve shut it tells of the gauge only. */
  readonly isOpen: boolean;
  readonly isUsed: boolean;
  /** Stands before the last pump-up: drawn where it fits, never widens the scale. */
  readonly isPast?: boolean;
}

export interface ChartBand {
  readonly atMs: number;
  readonly low: number;
  readonly high: number;
}

export interface ChartCone extends ChartBand {
  readonly mid: number;
  readonly temperatureF: number | null;
}

export interface ChartSpan {
  readonly fromMs: number;
  readonly toMs: number;
}

/** Everything a test's chart shows, unrounded. */
export interface TestChartData {
  readonly points: readonly ChartPoint[];
  readonly minimum: number | null;
  readonly increment: number;
  /** Readings in it are not counted: the pipe stretches. */
  readonly settling: ChartSpan | null;
  /** What the trend, or temperature, explains, give or take the gauge. */
  readonly band: readonly ChartBand[];
  readonly bandIs: 'trend' | 'temperature';
  /** From the last used reading to the end of the window. */
  readonly cone: readonly ChartCone[];
  readonly window: ChartSpan | null;
  readonly pumpedUp: { readonly atMs: number; readonly from: number; readonly to: number } | null;
  /** The valve was opened after shut readings. */
  readonly jumps: readonly { readonly atMs: number; readonly from: number; readonly to: number }[];
  readonly isLevel: boolean;
}
