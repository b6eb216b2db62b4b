import { isAbove, isBelow } from '../tolerance.js';
import type { HoldLog, LogReading } from './hold-log.js';
import { carry, type Rule } from './rules.js';

/** The part of a log that speaks of the system as it stands now: everything from the last pump-up on. */
export interface Standing {
  /** Readings from the last pump-up on, valve open or shut. */
  readings: readonly LogReading[];
  open: readonly LogReading[];
  /** Open readings from the settle time on; the first is the reference. */
  used: readonly LogReading[];
  reference: LogReading | null;
  last: LogReading | null;
  topUps: number;
  toppedUpAtMs: number | null;
  settledAtMs: number | null;
}

export function standingOf(log: HoldLog): Standing {
  const pumpUps = pumpUpsOf(log);
  const lastPumpUp = pumpUps.at(-1) ?? null;
  const readings = log.readings.filter(({ atMs }) => lastPumpUp === null || atMs >= lastPumpUp.atMs);
  const open = readings.filter(({ isOpen }) => isOpen);
  const [first] = open;
  const settledAtMs = first ? first.atMs + log.settleMs : null;
  const used = open.filter(({ atMs }) => settledAtMs !== null && !isBelow(atMs, settledAtMs));
  return {
    readings,
    open,
    used,
    reference: used[0] ?? null,
    last: used.at(-1) ?? null,
    topUps: pumpUps.length,
    toppedUpAtMs: lastPumpUp?.atMs ?? null,
    settledAtMs,
  };
}

/** Open readings that stand more than one increment above the open reading before them, temperature taken out. */
function pumpUpsOf({ readings, rules, increment }: HoldLog): LogReading[] {
  const open = readings.filter(({ isOpen }) => isOpen);
  return open.filter((reading, index) => {
    const before = open[index - 1];
    return before !== undefined && isAbove(smallestRise(before, reading, rules), increment);
  });
}

function smallestRise(before: LogReading, after: LogReading, rules: readonly Rule[]): number {
  const values = rules.map((rule) => carry(rule, after.value, after.temperatureF, before.temperatureF));
  return Math.min(...values) - before.value;
}
