import { describe, expect, it } from 'vitest';
import { holdInputs } from './inputs/hold-inputs.js';
import { holdCautions } from './second/hold-cautions.js';
import { levelInputs } from './inputs/level-inputs.js';
import { secondHold } from './second/hold.js';
import { secondLevelLog } from './second/level-log.js';
import { agree } from './support/agreement.js';
import { useCalcServer } from './support/calc-server.js';
import { codeDifferences, codesOf, differences, ruleDifferences } from './support/differences.js';

describe('the log of a test left standing', () => {
  const server = useCalcServer();

  it('of a line under pressure, computed twice, is the same in every field', async () => {
    await agree(
      holdInputs,
      async (given) => {
        const { forecast, settledAt, toppedUpAt, series, ...expected } = secondHold(given);
        const body = await server.answer('hold', given);
        const instants = { settledAt: body.settledAt, toppedUpAt: body.toppedUpAt } as Record<string, string | null>;
        const told = body.forecast as { reasons: unknown } | null;
        const { reasons, ...figures } = forecast ?? { reasons: [] };
        return [
          ...differences(expected, body),
          ...differences(atMs({ settledAt, toppedUpAt }), atMs(instants)),
          ...differences(timed(series), timed(body.series as typeof series), 'series'),
          ...differences(forecast && figures, told, 'forecast'),
          ...codeDifferences(reasons, told?.reasons ?? [], 'forecast.reasons'),
          ...ruleDifferences(holdCautions(given), body.cautions, 'cautions'),
        ];
      },
      300,
    );
  });

  it('answers instants in Z', async () => {
    const readings = [{ at: '2027-03-02T09:00:00-06:00', psi: 100, gaugeValve: 'open' }];
    const given = { medium: 'water', minimumPsi: 50, holdMinutes: 15, gauge: { incrementPsi: 1 }, readings };
    const { settledAt, series } = await server.answer('hold', given);
    for (const at of [settledAt, (series as { at: string }[])[0]?.at]) {
      expect(at).toMatch(/Z$/);
      expect(Date.parse(String(at))).toBe(Date.parse('2027-03-02T15:00:00Z'));
    }
  });

  it('of a DWV test, computed twice, is the same in every field', async () => {
    await agree(
      levelInputs,
      async (given) => {
        const { settledAt, toppedUpAt, series, ...expected } = secondLevelLog(given);
        const body = await server.answer('hold', given);
        const instants = { settledAt: body.settledAt, toppedUpAt: body.toppedUpAt } as Record<string, string | null>;
        const isLate = (body.forecast as { basis: string } | null)?.basis === 'temperature-only';
        const late = isLate && !codesOf((body.forecast as { reasons: unknown }).reasons).includes('temperature-only');
        return [
          ...differences(expected, body),
          ...differences(atMs({ settledAt, toppedUpAt }), atMs(instants)),
          ...differences(timed(series), timed(body.series as typeof series), 'series'),
          ...(late ? ['forecast.reasons: temperature-only missing'] : []),
          ...warmthDifferences(given.readings, body.cautions),
        ];
      },
      200,
    );
  });
});

/** Instants by what they are, whichever way they are written. */
const atMs = (instants: Record<string, string | null>) =>
  Object.fromEntries(Object.entries(instants).map(([key, at]) => [key, at === null ? null : Date.parse(at)]));
const timed = (series: { at: string }[]) => series.map((each) => ({ ...each, at: Date.parse(each.at) }));

/** `level-moves-with-temperature`: readings more than 5 °F apart; asked only of logs filled once, where no reading is left out. */
function warmthDifferences(readings: { levelIn: number; temperatureF?: number | null }[], cautions: unknown): string[] {
  const known = readings.flatMap(({ temperatureF }) => (temperatureF == null ? [] : [temperatureF]));
  const isWide = known.length > 1 && Math.max(...known) - Math.min(...known) > 5;
  const isFalling = readings.every(({ levelIn }, index) => levelIn >= (readings[index - 1]?.levelIn ?? 0));
  if (isWide && !isFalling) return [];
  const isTold = codesOf(cautions).includes('level-moves-with-temperature');
  return isTold === isWide ? [] : [`cautions: level-moves-with-temperature ${isWide ? 'missing' : 'not due'}`];
}
