import { readLog } from './hold-log.js';
import type { HoldRequest } from './hold.input.js';
import { isAbove } from './physics.js';
import { hoursBetween } from './theil-sen.js';

/**
 * What the table of cautions pins for a log: codes that must be there (true) or must not (false). Where the text does not say which
 * readings are meant, only the cases in which every way of taking it says the same.
 */
export function holdCautions(given: HoldRequest): Record<string, boolean> {
  const { medium, readings, forecast } = given;
  const log = readLog(given);
  const last = log.open.at(-1);
  const rules: Record<string, boolean> = {
    'local-code': true,
    'compressed-air': medium !== 'water',
    'shut-gauge': readings.at(-1)?.gaugeValve === 'shut',
    'over-ceiling': last !== undefined && given.ceilingPsi != null && isAbove(last.psi, given.ceilingPsi),
    'one-reading': log.used.length === 1,
    'many-top-ups': log.topUps >= 2,
    'level-moves-with-temperature': false,
    'cement-cure': false,
  };
  const coldest = forecast?.coldestF ?? forecast?.temperatureF;
  if (medium === 'water' && (coldest == null || log.used.length > 0)) {
    rules.freeze = coldest != null && coldest <= 32;
    rules['freeze-risk'] = coldest != null && coldest > 32 && coldest <= 36;
  }
  const hasNone = (list: { temperatureF?: number | null }[]) => list.some(({ temperatureF }) => temperatureF == null);
  if (medium === 'water') rules['temperature-missing'] = false;
  else if (hasNone(log.used) || !hasNone(readings)) rules['temperature-missing'] = hasNone(log.used);
  const spread = (list: { temperatureF?: number | null }[]) => {
    const known = list.flatMap(({ temperatureF }) => (temperatureF == null ? [] : [temperatureF]));
    return known.length < 2 ? 0 : Math.max(...known) - Math.min(...known);
  };
  if (medium !== 'water') rules['water-temperature'] = false;
  else if (isAbove(spread(log.used), 2) || !isAbove(spread(readings), 2)) {
    rules['water-temperature'] = isAbove(spread(readings), 2);
  }
  if (medium !== 'water-topped-with-air') rules['air-dissolves'] = false;
  else if (forecast && log.used[0] && readings[0]) {
    const hoursSince = (at: string) => hoursBetween(at, forecast.to);
    const isLong = !isAbove(8, hoursSince(log.used[0].at));
    if (isLong || isAbove(8, hoursSince(readings[0].at))) rules['air-dissolves'] = isLong;
  }
  return rules;
}
