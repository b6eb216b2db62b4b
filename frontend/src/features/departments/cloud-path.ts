/** How wide a scallop of a revision cloud is, about, in px. */
const scallopPx = 17;
/** How far a scallop stands out, as a share of its width. */
const bulge = 0.42;

/** The outline of a revision cloud round a box, as an SVG path: whole scallops on every side, bulging outward, clockwise. */
export function cloudPath(widthPx: number, heightPx: number): string {
  if (widthPx <= 0 || heightPx <= 0) return '';
  const inset = (scallopPx * bulge) / 2;
  const [left, top, right, bottom] = [inset, inset, widthPx - inset, heightPx - inset];
  const corners = [
    [left, top],
    [right, top],
    [right, bottom],
    [left, bottom],
  ] as const;
  const sides = corners.map(([x, y], at) => {
    const [toX, toY] = corners[(at + 1) % corners.length] ?? [x, y];
    return scallops(x, y, toX, toY);
  });
  return `M${round(left)} ${round(top)}${sides.join('')}Z`;
}

function scallops(x: number, y: number, toX: number, toY: number): string {
  const [dx, dy] = [toX - x, toY - y];
  const length = Math.hypot(dx, dy);
  const count = Math.max(1, Math.round(length / scallopPx));
  const radius = round((length / count) * 0.56);
  return Array.from({ length: count }, (_, at) => {
    const part = (at + 1) / count;
    return `A${radius} ${radius} 0 0 1 ${round(x + dx * part)} ${round(y + dy * part)}`;
  }).join('');
}

function round(px: number): number {
  return Math.round(px * 10) / 10;
}
