import type { HoldReading, HoldRequest } from './hold.input.js';
import { atmospherePsi, isAbove, rankine } from './physics.js';

export type Rule = 'water' | 'air';

export const rulesOf = ({ medium }: HoldRequest): Rule[] =>
  medium === 'water' ? ['water'] : medium === 'air' ? ['air'] : ['water', 'air'];

/** A pressure of kept air at one temperature as it would be at another; as it is, where a temperature is missing. */
export function airAt(psi: number, from: number | null | undefined, to: number | null | undefined, atmosphere: number) {
  if (from == null || to == null) return psi;
  return ((psi + atmosphere) * rankine(to)) / rankine(from) - atmosphere;
}

/** A reading's values, one for each rule of the medium, at the temperature of another. */
export function valuesAt(given: HoldRequest, reading: HoldReading, reference: HoldReading): number[] {
  const atmosphere = atmospherePsi(given.elevationFt ?? 0);
  return rulesOf(given).map((rule) =>
    rule === 'water' ? reading.psi : airAt(reading.psi, reading.temperatureF, reference.temperatureF, atmosphere),
  );
}

export interface Log {
  /** From the last pump-up on, shut ones too. */
  since: HoldReading[];
  open: HoldReading[];
  used: HoldReading[];
  toppedUpAt: string | null;
  topUps: number;
  settledAt: string | null;
}

/** Steps 1 and 2: what counts of the readings. */
export function readLog(given: HoldRequest): Log {
  const { readings } = given;
  let topUps = 0;
  let start = 0;
  let before: HoldReading | null = null;
  readings.forEach((reading, index) => {
    if (reading.gaugeValve !== 'open') return;
    const past = before;
    before = reading;
    if (!past) return;
    const rise = Math.min(...valuesAt(given, reading, past).map((value) => value - past.psi));
    if (!isAbove(rise, given.gauge.incrementPsi)) return;
    topUps += 1;
    start = index;
  });
  const since = readings.slice(start);
  const open = since.filter(({ gaugeValve }) => gaugeValve === 'open');
  const first = open[0];
  const settledMs = first ? Date.parse(first.at) + (given.settleMinutes ?? 0) * 60_000 : null;
  return {
    since,
    open,
    used: open.filter(({ at }) => settledMs !== null && Date.parse(at) >= settledMs),
    toppedUpAt: topUps > 0 ? (first?.at ?? null) : null,
    topUps,
    settledAt: settledMs === null ? null : new Date(settledMs).toISOString(),
  };
}

const findings = ['system-dropped', 'open-the-valve-to-know', 'gauge-leaks-system-held', 'gauge-sound'];

/** Step 6: the worst of what the runs of shut readings tell. */
export function gaugeFindingOf(given: HoldRequest, { since }: Log): string | null {
  const credible = given.gauge.incrementPsi;
  const told = since.flatMap((reading, index) => {
    const next = since[index + 1];
    const isEndOfRun = reading.gaugeValve === 'shut' && next?.gaugeValve !== 'shut';
    const open = since.slice(0, index).findLast(({ gaugeValve }) => gaugeValve === 'open');
    if (!isEndOfRun || !open) return [];
    const fall = Math.min(...valuesAt(given, reading, open).map((value) => open.psi - value));
    if (!isAbove(fall, credible)) return ['gauge-sound'];
    if (!next) return ['open-the-valve-to-know'];
    const back = Math.max(...valuesAt(given, next, open));
    return [isAbove(open.psi - credible, back) ? 'system-dropped' : 'gauge-leaks-system-held'];
  });
  return findings.find((finding) => told.includes(finding)) ?? null;
}
