import type { Refuse } from './house-refusals.js';

interface Log {
  readings: readonly { at: string }[];
  forecast: { from: string; to: string } | null;
}

/** Readings stand in the order of their instants, no two at one; a window does not end before it starts. */
export function refuseHoldInput({ readings, forecast }: Log, refuse: Refuse): void {
  readings.forEach(({ at }, index) => {
    const before = readings[index - 1];
    if (before && Date.parse(at) <= Date.parse(before.at)) refuse(['readings', index, 'at'], 'readings-out-of-order');
  });
  if (forecast && Date.parse(forecast.to) < Date.parse(forecast.from))
    refuse(['forecast', 'to'], 'ends-before-it-starts');
}
