import { airAt, type Log, rulesOf } from './hold-log.js';
import type { ForecastRequest, HoldRequest } from './hold.input.js';
import type { Trend } from './hold.js';
import { atmospherePsi, isAbove } from './physics.js';
import { hoursBetween } from './theil-sen.js';

/** Step 7. */
export function forecastOf(given: HoldRequest, asked: ForecastRequest, log: Log, trend: Trend, verdict: string) {
  const reference = log.used[0];
  const final = log.used.at(-1);
  if (!reference || !final) throw new Error('no forecast without a used reading');
  const atmosphere = atmospherePsi(given.elevationFt ?? 0);
  const increment = given.gauge.incrementPsi;
  const hoursTo = (at: string) => Math.max(0, hoursBetween(final.at, at));
  const isTrend = !isAbove(hoursTo(asked.to), trend.spanHours * 4);
  const isKnown = reference.temperatureF != null && final.temperatureF != null;
  const targetF = isKnown ? (asked.temperatureF ?? final.temperatureF) : null;

  /** Each series at a time, of a line that stands at `psi` at the last reading's time and temperature. */
  const seriesAt = (psi: number, at: string): number[] =>
    rulesOf(given).map((rule, n) => {
      const fall = isTrend ? (trend.slopes[n] ?? NaN) * hoursTo(at) : 0;
      if (rule === 'water' || !isKnown) return psi + fall;
      const corrected = airAt(psi, final.temperatureF, reference.temperatureF, atmosphere);
      return airAt(corrected + fall, reference.temperatureF, targetF, atmosphere);
    });
  const midOf = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const ends = [asked.from, asked.to];
  const isEnough = (psi: number) =>
    ends.every((at) => !isAbove(given.minimumPsi, midOf(seriesAt(psi, at)) - increment / 2));
  const [from, to] = ends.map((at) => {
    const values = seriesAt(final.psi, at);
    const off = isTrend ? trend.margin * hoursTo(at) + increment / 2 : increment;
    return { low: Math.min(...values) - off, mid: midOf(values), high: Math.max(...values) + off };
  });
  if (!from || !to) throw new Error('two ends');

  const isBelow = (psi: number) => isAbove(given.minimumPsi, psi);
  const hasFallen = isBelow(from.high) || isBelow(to.high);
  const isSure = isTrend && !isBelow(from.low) && !isBelow(to.low);
  const holdsThrough = hasFallen ? 'no' : isSure ? 'yes' : 'maybe';

  const reasons: string[] = isTrend ? [] : ['temperature-only'];
  let topUpToPsi: number | null = null;
  if (holdsThrough !== 'yes') {
    if (verdict === 'dropping') reasons.push('find-the-leak');
    else if (isEnough(final.psi)) reasons.push('read-again');
    else topUpToPsi = topUp();
  }
  return { basis: isTrend ? 'trend' : 'temperature-only', from, to, holdsThrough, topUpToPsi, reasons };

  /** The smallest multiple of the increment above the last reading that is enough, unless a part could not bear it. */
  function topUp(): number | null {
    let steps = Math.floor((final?.psi ?? NaN) / increment + 1e-9) + 1;
    while (!isEnough(steps * increment)) steps += 1;
    const psi = steps * increment;
    const ceiling = given.ceilingPsi ?? Infinity;
    if (isAbove(psi, ceiling)) return refused('over-ceiling');
    const warm = rulesOf(given).map((rule) =>
      rule === 'water' || asked.hottestF == null ? psi : airAt(psi, final?.temperatureF, asked.hottestF, atmosphere),
    );
    return isAbove(Math.max(...warm), ceiling) ? refused('over-ceiling-when-warm') : psi;
  }

  function refused(code: string): null {
    reasons.push(code);
    return null;
  }
}
