import {
  dwvHoldInput,
  waterHoldInput,
  type DwvHoldAnalysis,
  type HoldGiven,
  type WaterHoldAnalysis,
} from '../hold.contract.js';
import { analyseHold } from './analyse-hold.js';

/** Every check's log starts here. */
export const startMs = Date.parse('2027-03-02T15:00:00Z');

/** An instant so many hours after the start. */
export const hoursOn = (hours: number): string => new Date(startMs + Math.round(hours * 3_600_000)).toISOString();

/** Hours after the start, psi, °F (null: not noted), gauge valve (open unless said). */
export type Row = readonly [hours: number, psi: number, temperatureF?: number | null, gaugeValve?: 'open' | 'shut'];

export type WaterHoldGiven = Extract<HoldGiven, { minimumPsi: number }>;
export type DwvHoldGiven = Extract<HoldGiven, { maximumFallIn: number }>;

/** A sound test of copper lines on a 1 psi gauge at sea level, 100 psi asked for. */
const waterSample: WaterHoldGiven = { medium: 'water', minimumPsi: 100, holdMinutes: 15, gauge: { incrementPsi: 1 } };

export function analyseRows(rows: readonly Row[], changes: Partial<WaterHoldGiven> = {}): WaterHoldAnalysis {
  const readings = rows.map(([hours, psi, temperatureF = 68, gaugeValve = 'open']) => ({
    at: hoursOn(hours),
    psi,
    temperatureF,
    gaugeValve,
  }));
  return analyseHold(waterHoldInput.parse({ ...waterSample, readings, ...changes }));
}

/** Hours after the start, inches below the rim, °F. */
export type LevelRow = readonly [hours: number, levelIn: number, temperatureF?: number | null];

/** A stack watched at its rim with a rule of 1/8 in, half an inch of fall allowed. */
const dwvSample: DwvHoldGiven = { maximumFallIn: 0.5, holdMinutes: 15, gauge: { incrementIn: 0.125 } };

export function analyseLevels(rows: readonly LevelRow[], changes: Partial<DwvHoldGiven> = {}): DwvHoldAnalysis {
  const readings = rows.map(([hours, levelIn, temperatureF = null]) => ({ at: hoursOn(hours), levelIn, temperatureF }));
  return analyseHold(dwvHoldInput.parse({ ...dwvSample, readings, ...changes }));
}

export const codesOf = (findings: readonly { code: string }[]): string[] => findings.map(({ code }) => code);
