import type { Medium } from './water.input.js';

export interface HoldReading {
  at: string;
  psi: number;
  temperatureF?: number | null;
  gaugeValve: 'open' | 'shut';
}

export interface ForecastRequest {
  from: string;
  to: string;
  temperatureF?: number | null;
  coldestF?: number | null;
  hottestF?: number | null;
}

/** The log of a line under pressure. */
export interface HoldRequest {
  medium: Medium;
  elevationFt?: number;
  minimumPsi: number;
  ceilingPsi?: number | null;
  holdMinutes: number;
  settleMinutes?: number;
  plastic?: boolean;
  gauge: { incrementPsi: number };
  readings: HoldReading[];
  forecast?: ForecastRequest | null;
}
