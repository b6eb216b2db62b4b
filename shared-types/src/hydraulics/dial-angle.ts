/** A pixel of a photo; y grows downward. */
export interface Pixel {
  x: number;
  y: number;
}

export const isSamePoint = (a: Pixel, b: Pixel): boolean => Math.hypot(a.x - b.x, a.y - b.y) < 1e-9;

/** Direction from the center in degrees; because y grows downward it rises clockwise as seen. */
const directionDegrees = (center: Pixel, point: Pixel): number =>
  (Math.atan2(point.y - center.y, point.x - center.x) * 180) / Math.PI;

/** Clockwise angle as seen from one point to another around the center, degrees from 0 up to 360. */
export function angleBetween(center: Pixel, from: Pixel, to: Pixel): number {
  const turn = directionDegrees(center, to) - directionDegrees(center, from);
  return ((turn % 360) + 360) % 360;
}
