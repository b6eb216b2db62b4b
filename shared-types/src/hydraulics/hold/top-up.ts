import { reasonOf, type Reason } from '../findings.js';
import type { HoldVerdict } from '../hold.contract.js';
import { isAbove, isBelow, nextMultipleAbove, roundUpTo } from '../tolerance.js';
import type { HoldLog, LogReading } from './hold-log.js';
import type { Projection } from './projection.js';
import { carry } from './rules.js';

export interface TopUp {
  value: number | null;
  reason: Reason | null;
}

/** What to pump to so that the middle of the forecast stays above the minimum at both ends of the window, or why not to. */
export function topUpOf(
  log: HoldLog,
  last: LogReading,
  projection: Projection,
  verdict: HoldVerdict,
  minimum: number,
): TopUp {
  if (verdict === 'dropping') return refused(reasonOf('find-the-leak'));
  const lasts = (value: number): boolean => doesLast(value, projection, minimum, log.increment);
  if (lasts(last.value)) return refused(reasonOf('read-again'));
  const value = smallestThatLasts(last.value, projection, minimum, log.increment, lasts);
  const { ceiling } = log;
  if (ceiling === null) return { value, reason: null };
  const params = { topUpToPsi: value, ceilingPsi: ceiling };
  if (isAbove(value, ceiling)) return refused(reasonOf('over-ceiling', params));
  const warmPsi = valueWhenWarm(value, log, last);
  return isAbove(warmPsi, ceiling)
    ? refused(reasonOf('over-ceiling-when-warm', { ...params, warmPsi }))
    : { value, reason: null };
}

const refused = (reason: Reason): TopUp => ({ value: null, reason });

function doesLast(
  value: number,
  { expect, hoursToFrom, hoursToTo }: Projection,
  minimum: number,
  increment: number,
): boolean {
  return [hoursToFrom, hoursToTo].every((hours) => !isBelow(expect(value, hours).mid - increment / 2, minimum));
}

/** The middle of a forecast is a straight line over what the system stands at, so the value needed is found on it and rounded up. */
function smallestThatLasts(
  lastValue: number,
  { expect, hoursToFrom, hoursToTo }: Projection,
  minimum: number,
  increment: number,
  lasts: (value: number) => boolean,
): number {
  const needed = [hoursToFrom, hoursToTo].map((hours) => {
    const atZero = expect(0, hours).mid;
    const perUnit = expect(1, hours).mid - atZero;
    return (minimum + increment / 2 - atZero) / perUnit;
  });
  const value = Math.max(nextMultipleAbove(increment, lastValue), roundUpTo(increment, Math.max(...needed)));
  return lasts(value) ? value : nextMultipleAbove(increment, value);
}

/** What it would stand at on the hottest air to come, by the rule that rises most. */
function valueWhenWarm(value: number, { rules, forecast }: HoldLog, last: LogReading): number {
  const hottestF = forecast?.hottestF ?? null;
  return Math.max(...rules.map((rule) => carry(rule, value, last.temperatureF, hottestF)));
}
