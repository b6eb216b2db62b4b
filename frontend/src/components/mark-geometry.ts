/** Shared geometry of round drawings: degrees clockwise from three o'clock, y growing downward. */
export function polar(cx: number, cy: number, radius: number, degrees: number): [number, number] {
  const angle = (degrees * Math.PI) / 180;
  return [round2(cx + radius * Math.cos(angle)), round2(cy + radius * Math.sin(angle))];
}

/** A path along a circle from one angle to another. */
export function arcPath(cx: number, cy: number, radius: number, from: number, to: number): string {
  const [x0, y0] = polar(cx, cy, radius, from);
  const [x1, y1] = polar(cx, cy, radius, to);
  return `M${x0} ${y0}A${radius} ${radius} 0 ${Math.abs(to - from) > 180 ? 1 : 0} ${to > from ? 1 : 0} ${x1} ${y1}`;
}

/** Two decimals are finer than a device pixel. */
export function round2(value: number): number {
  return Math.round(value * 100) / 100;
}
