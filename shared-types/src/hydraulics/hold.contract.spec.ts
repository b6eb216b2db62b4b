import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { holdInput } from './hold.contract.js';
import { issueCodes } from './issue-codes.js';

const reading = (at: string, psi = 120) => ({ at, psi, temperatureF: 68, gaugeValve: 'open' });
const water = {
  medium: 'water',
  elevationFt: 850,
  minimumPsi: 100,
  ceilingPsi: 146,
  holdMinutes: 15,
  settleMinutes: 60,
  plastic: true,
  gauge: { incrementPsi: 1 },
  readings: [reading('2027-03-02T15:00:00Z'), reading('2027-03-02T16:00:00Z')],
  forecast: { from: '2027-03-03T14:00:00Z', to: '2027-03-03T16:00:00Z', temperatureF: 41, coldestF: 28, hottestF: 70 },
};
const dwv = {
  maximumFallIn: 0.5,
  holdMinutes: 15,
  gauge: { incrementIn: 0.125 },
  readings: [{ at: '2027-03-02T15:00:00Z', levelIn: 0 }],
};
const refusals = (given: unknown) =>
  Object.fromEntries(
    (holdInput.safeParse(given).error?.issues ?? []).map(({ path, message }) => [path.join('.'), message]),
  );

describe('input of a test log', () => {
  it('takes both kinds, told apart by the medium', () => {
    expect(refusals(water)).toEqual({});
    expect(refusals(dwv)).toEqual({});
    expect(refusals({ ...dwv, medium: null })).toEqual({});
    expect(holdInput.parse({ ...dwv, readings: null, settleMinutes: null, forecast: null })).toMatchObject({
      readings: [],
      settleMinutes: 0,
      forecast: null,
    });
  });

  it.each<[string, Record<string, unknown>, Record<string, string>]>([
    ['an unknown medium', { medium: 'steam' }, { medium: 'not-one-of-the-choices' }],
    ['an unknown key', { note: 'x' }, { '': 'unknown' }],
    ['an increment of zero', { gauge: { incrementPsi: 0 } }, { 'gauge.incrementPsi': 'must-be-positive' }],
    ['no minimum', { minimumPsi: undefined }, { minimumPsi: 'required' }],
    ['no minutes', { holdMinutes: undefined }, { holdMinutes: 'required' }],
    ['negative minutes', { settleMinutes: -1 }, { settleMinutes: 'must-not-be-negative' }],
    [
      'readings out of order',
      { readings: [reading('2027-03-02T16:00:00Z'), reading('2027-03-02T15:00:00Z')] },
      { 'readings.1.at': 'readings-out-of-order' },
    ],
    [
      'two at one instant in two zones',
      { readings: [reading('2027-03-02T16:00:00Z'), reading('2027-03-02T09:00:00-07:00')] },
      { 'readings.1.at': 'readings-out-of-order' },
    ],
    [
      'a date that does not exist',
      { readings: [reading('2027-02-30T16:00:00Z')] },
      { 'readings.0.at': 'must-be-an-instant' },
    ],
    [
      'an instant without a zone',
      { readings: [reading('2027-02-03T16:00:00')] },
      { 'readings.0.at': 'must-be-an-instant' },
    ],
    [
      'an offset that does not exist',
      { readings: [reading('2027-02-03T16:00:00+25:00')] },
      { 'readings.0.at': 'must-be-an-instant' },
    ],
    [
      'absolute zero',
      { readings: [{ ...reading('2027-03-02T15:00:00Z'), temperatureF: -459.67 }] },
      { 'readings.0.temperatureF': 'at-or-below-absolute-zero' },
    ],
    ['no valve', { readings: [{ at: '2027-03-02T15:00:00Z', psi: 1 }] }, { 'readings.0.gaugeValve': 'required' }],
    [
      'a window that ends before it starts',
      { forecast: { from: '2027-03-03T14:00:00Z', to: '2027-03-03T13:00:00Z' } },
      { 'forecast.to': 'ends-before-it-starts' },
    ],
    [
      '501 readings',
      { readings: Array.from({ length: 501 }, (_, n) => reading(new Date(1.8e12 + n * 60_000).toISOString())) },
      { readings: 'too-many' },
    ],
  ])('%s is refused', (_, changes, expected) => {
    expect(refusals({ ...water, ...changes })).toEqual(expected);
    for (const code of Object.values(expected)) expect(issueCodes).toContain(code);
  });

  it.each<[string, Record<string, unknown>, Record<string, string>]>([
    ['a ceiling', { ceilingPsi: 10 }, { '': 'unknown' }],
    [
      'a valve',
      { readings: [{ at: '2027-03-02T15:00:00Z', levelIn: 0, gaugeValve: 'open' }] },
      { 'readings.0': 'unknown' },
    ],
    [
      'a level above the rim',
      { readings: [{ at: '2027-03-02T15:00:00Z', levelIn: -0.1 }] },
      { 'readings.0.levelIn': 'must-not-be-negative' },
    ],
    ['no fall allowed or not', { maximumFallIn: undefined }, { maximumFallIn: 'required' }],
  ])('%s is refused for a level', (_, changes, expected) => {
    expect(refusals({ ...dwv, ...changes })).toEqual(expected);
  });

  it('allows a window of one instant', () => {
    expect(refusals({ ...water, forecast: { from: '2027-03-03T14:00:00Z', to: '2027-03-03T14:00:00Z' } })).toEqual({});
  });

  it('refuses what is no object', () => {
    expect(refusals(null)).toEqual({ '': 'must-be-an-object' });
    expect(refusals([])).toEqual({ '': 'must-be-an-object' });
  });

  it('can be written as JSON schema', () => {
    expect(z.toJSONSchema(holdInput, { io: 'input' })).toHaveProperty('oneOf');
  });
});
