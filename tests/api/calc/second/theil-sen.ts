/** Hours from one instant to another. The difference is taken first: hours since the epoch are too large a number for 1e-9. */
export const hoursBetween = (from: string, to: string) => (Date.parse(to) - Date.parse(from)) / 3_600_000;

/** Slopes per hour between every two points, ascending. Instants must differ. */
export function pairwiseSlopes(instants: readonly string[], values: readonly number[]): number[] {
  const slopes: number[] = [];
  instants.forEach((at, i) => {
    instants.slice(0, i).forEach((before, j) => {
      slopes.push(((values[i] ?? NaN) - (values[j] ?? NaN)) / hoursBetween(before, at));
    });
  });
  return slopes.sort((a, b) => a - b);
}

/** The middle of an ascending list, or the mean of its two middles; 0 of none. */
export function medianOf(ascending: readonly number[]): number {
  const count = ascending.length;
  if (count === 0) return 0;
  return ((ascending[Math.floor((count - 1) / 2)] ?? NaN) + (ascending[Math.floor(count / 2)] ?? NaN)) / 2;
}

/** Sen's interval of the slope (Sen, JASA 63 (1968) 1379), as the design pins it for 95 %. */
export function senInterval(ascending: readonly number[], points: number, z = 1.96): [number, number] {
  const count = ascending.length;
  const c = z * Math.sqrt((points * (points - 1) * (2 * points + 5)) / 18);
  const at = (rank: number) => ascending[Math.min(count, Math.max(1, rank)) - 1] ?? NaN;
  return [at(Math.round((count - c) / 2)), at(Math.round((count + c) / 2) + 1)];
}
