import { gaugeFindings, type GaugeFinding } from '../hold.contract.js';
import { isAbove, isBelow } from '../tolerance.js';
import type { HoldLog, LogReading } from './hold-log.js';
import { carry } from './rules.js';
import type { Standing } from './standing.js';

/** Shut readings between two open ones; the second may not have come yet. */
interface ShutRun {
  before: LogReading;
  lastShut: LogReading;
  after: LogReading | null;
}

/** What shutting the gauge valve has shown: the worst over all runs of shut readings; null when there was none (a level has no valve). */
export function gaugeFindingOf(log: HoldLog, standing: Standing): GaugeFinding | null {
  const found = new Set(shutRuns(standing.readings).map((run) => findingOf(run, log)));
  return gaugeFindings.find((finding) => found.has(finding)) ?? null;
}

function shutRuns(readings: readonly LogReading[]): ShutRun[] {
  const runs: ShutRun[] = [];
  readings.forEach((lastShut, index) => {
    const after = readings[index + 1] ?? null;
    if (lastShut.isOpen || (after && !after.isOpen)) return;
    const before = readings.slice(0, index).findLast(({ isOpen }) => isOpen);
    if (before) runs.push({ before, lastShut, after });
  });
  return runs;
}

/** Corrected to the open reading's temperature, so that a cold night is not taken for a leak: in doubt the rule that falls least. */
function findingOf({ before, lastShut, after }: ShutRun, { rules, increment }: HoldLog): GaugeFinding {
  const highest = (reading: LogReading): number =>
    Math.max(...rules.map((rule) => carry(rule, reading.value, reading.temperatureF, before.temperatureF)));
  if (!isAbove(before.value - highest(lastShut), increment)) return 'gauge-sound';
  if (!after) return 'open-the-valve-to-know';
  return isBelow(highest(after), before.value - increment) ? 'system-dropped' : 'gauge-leaks-system-held';
}
