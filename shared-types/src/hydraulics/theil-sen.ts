/** A point of a series; any units. */
export interface Point {
  x: number;
  y: number;
}

/** Slopes between every two points with different x, sorted upward. */
export function pairwiseSlopes(points: readonly Point[]): number[] {
  const slopes = points.flatMap((a, index) => points.slice(index + 1).map((b) => (b.y - a.y) / (b.x - a.x)));
  return slopes.filter(Number.isFinite).sort((a, b) => a - b);
}

/** The median of the sorted pairwise slopes (Theil 1950, Sen 1968); 0 when there is none. */
export function medianSlope(sorted: readonly number[]): number {
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? 0;
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] ?? 0) + upper) / 2;
}

/** Normal quantile of a two-sided 95 % interval. */
export const z95 = 1.96;

/**
 * Sen's interval of the slope of `pointCount` points with distinct x: ranks by the normal approximation of Kendall's statistic, held to the
 * slopes there are. Null without slopes.
 */
export function senInterval(
  sorted: readonly number[],
  pointCount: number,
  z = z95,
): { low: number; high: number } | null {
  const n = pointCount;
  const spread = z * Math.sqrt((n * (n - 1) * (2 * n + 5)) / 18);
  const count = sorted.length;
  const at = (rank: number): number | undefined => sorted[Math.min(count, Math.max(1, rank)) - 1];
  const low = at(Math.round((count - spread) / 2));
  const high = at(Math.round((count + spread) / 2) + 1);
  return low === undefined || high === undefined ? null : { low, high };
}
