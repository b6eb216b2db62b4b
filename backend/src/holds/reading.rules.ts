import type { GaugeValve, Medium, System } from '@holdwater/shared-types/holds/hold.states.js';
import { refuse } from '../common/errors/app-error.js';

/** What of a test decides how it is read. */
export interface ReadTest {
  readonly system: System;
  readonly medium: Medium;
  readonly gauge: { readonly rangePsi: number } | null;
}

export interface TypedReading {
  readonly pressurePsi?: number | null;
  readonly levelIn?: number | null;
  readonly gaugeValve?: GaugeValve | null;
}

/** Standing water in a drain is read as a level with a tape; everything else at a gauge. */
export function isLevelTest(test: Pick<ReadTest, 'system' | 'medium'>): boolean {
  return test.system === 'dwv' && test.medium === 'water';
}

/**
 * Refuses a reading that does not fit its test. `path` leads to it inside the input, with its dot (`firstReading.`).
 * @throws bad-input, reading-out-of-gauge
 */
export function checkReading(test: ReadTest, reading: TypedReading, path = ''): void {
  const fields = isLevelTest(test) ? levelFaults(reading) : pressureFaults(reading);
  if (Object.keys(fields).length > 0) refuse('bad-input', {}, prefixed(fields, path));
  const { pressurePsi } = reading;
  if (typeof pressurePsi === 'number') checkGaugeRange(test, pressurePsi, `${path}pressurePsi`);
}

/** @throws reading-out-of-gauge when the needle could not have shown it */
export function checkGaugeRange(test: Pick<ReadTest, 'gauge'>, pressurePsi: number, field: string): void {
  if (test.gauge === null || pressurePsi <= test.gauge.rangePsi) return;
  refuse('reading-out-of-gauge', { rangePsi: test.gauge.rangePsi, pressurePsi }, { [field]: 'above-gauge-range' });
}

function levelFaults(reading: TypedReading): Record<string, string> {
  return {
    ...(isGiven(reading.levelIn) ? {} : { levelIn: 'required' }),
    ...(isGiven(reading.pressurePsi) ? { pressurePsi: 'not-for-a-level' } : {}),
    ...(isGiven(reading.gaugeValve) ? { gaugeValve: 'not-for-a-level' } : {}),
  };
}

function pressureFaults(reading: TypedReading): Record<string, string> {
  return {
    ...(isGiven(reading.pressurePsi) ? {} : { pressurePsi: 'required' }),
    ...(isGiven(reading.gaugeValve) ? {} : { gaugeValve: 'required' }),
    ...(isGiven(reading.levelIn) ? { levelIn: 'not-for-a-gauge' } : {}),
  };
}

function isGiven(value: unknown): boolean {
  return value !== null && value !== undefined;
}

function prefixed(fields: Record<string, string>, path: string): Record<string, string> {
  return Object.fromEntries(Object.entries(fields).map(([name, why]) => [path + name, why]));
}
