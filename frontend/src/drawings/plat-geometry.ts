import { round2 } from '../components/mark-geometry';

/** A point of a plat in feet: x grows east, y grows south, as on the sheet. */
export type PlatPoint = readonly [x: number, y: number];

export interface Bounds {
  minX: number;
  minY: number;
  maxX: number;
  maxY: number;
}

export function boundsOf(points: readonly PlatPoint[]): Bounds {
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  if (points.length === 0) return { minX: 0, minY: 0, maxX: 1, maxY: 1 };
  return { minX: Math.min(...xs), minY: Math.min(...ys), maxX: Math.max(...xs), maxY: Math.max(...ys) };
}

/** The middle of a polygon's area; of its corners where it has none. */
export function centroid(polygon: readonly PlatPoint[]): PlatPoint {
  let area = 0;
  let sumX = 0;
  let sumY = 0;
  polygon.forEach(([x0, y0], index) => {
    const [x1, y1] = polygon[(index + 1) % polygon.length] ?? [x0, y0];
    const cross = x0 * y1 - x1 * y0;
    area += cross;
    sumX += (x0 + x1) * cross;
    sumY += (y0 + y1) * cross;
  });
  if (Math.abs(area) > 1e-9) return [sumX / (3 * area), sumY / (3 * area)];
  const { minX, minY, maxX, maxY } = boundsOf(polygon);
  return [(minX + maxX) / 2, (minY + maxY) / 2];
}

/** How far inside a polygon a point lies; negative outside. */
function depth(polygon: readonly PlatPoint[], [px, py]: PlatPoint): number {
  let isInside = false;
  let nearest = Infinity;
  polygon.forEach(([x0, y0], index) => {
    const [x1, y1] = polygon[(index + 1) % polygon.length] ?? [x0, y0];
    if (y0 > py !== y1 > py && px < ((x1 - x0) * (py - y0)) / (y1 - y0) + x0) isInside = !isInside;
    const length = (x1 - x0) ** 2 + (y1 - y0) ** 2 || 1;
    const share = Math.max(0, Math.min(1, ((px - x0) * (x1 - x0) + (py - y0) * (y1 - y0)) / length));
    nearest = Math.min(nearest, Math.hypot(px - x0 - share * (x1 - x0), py - y0 - share * (y1 - y0)));
  });
  return isInside ? nearest : -nearest;
}

/** The point of a polygon with the most room about it, by a grid made finer four times: where its number stands. */
export function roomiestPoint(polygon: readonly PlatPoint[]): { point: PlatPoint; room: number } {
  const { minX, minY, maxX, maxY } = boundsOf(polygon);
  let point = centroid(polygon);
  let room = depth(polygon, point);
  let [middle, half]: [PlatPoint, PlatPoint] = [
    [(minX + maxX) / 2, (minY + maxY) / 2],
    [(maxX - minX) / 2, (maxY - minY) / 2],
  ];
  for (let pass = 0; pass < 4; pass += 1) {
    for (let step = 0; step < 121; step += 1) {
      const tried: PlatPoint = [
        middle[0] + half[0] * ((step % 11) / 5 - 1),
        middle[1] + half[1] * (Math.floor(step / 11) / 5 - 1),
      ];
      const found = depth(polygon, tried);
      // A hair more room is not worth leaving the middle for.
      if (found > room * 1.04 + 1e-9) [point, room] = [tried, found];
    }
    middle = point;
    half = [half[0] / 4, half[1] / 4];
  }
  return { point, room };
}

export function polygonPath(points: readonly PlatPoint[], isClosed = true): string {
  return `M${points.map(([x, y]) => `${round2(x)} ${round2(y)}`).join('L')}${isClosed ? 'Z' : ''}`;
}

/** Each corner moved toward the middle by so many units: the thin line inside a chosen lot. */
export function inset(polygon: readonly PlatPoint[], by: number): PlatPoint[] {
  const [cx, cy] = centroid(polygon);
  return polygon.map(([x, y]) => {
    const distance = Math.hypot(x - cx, y - cy) || 1;
    return [x - ((x - cx) * by) / distance, y - ((y - cy) * by) / distance];
  });
}

export type Way = 'ArrowLeft' | 'ArrowRight' | 'ArrowUp' | 'ArrowDown';

const ways: Record<Way, PlatPoint> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

export function isWay(key: string): key is Way {
  return Object.hasOwn(ways, key);
}

/** The nearest point in a direction: what lies aside counts double against it, what lies behind is left out. Null where none is. */
export function findNext<T extends { middle: PlatPoint }>(all: readonly T[], from: T, way: Way): T | null {
  const [wx, wy] = ways[way];
  let best: T | null = null;
  let bestCost = Infinity;
  for (const other of all) {
    const [dx, dy] = [other.middle[0] - from.middle[0], other.middle[1] - from.middle[1]];
    const along = dx * wx + dy * wy;
    const aside = Math.abs(dx * wy - dy * wx);
    const cost = along + 2 * aside;
    if (other === from || along <= 1e-6 || aside > along * 2 || cost >= bestCost) continue;
    best = other;
    bestCost = cost;
  }
  return best;
}

const barSteps = [20, 40, 60, 80, 120, 200, 300, 400, 600, 1000, 2000, 4000];

/** A round number of feet whose bar is long enough for its three numbers. */
export function scaleBarFt(pxPerFt: number): number {
  return barSteps.find((step) => step * pxPerFt >= 110) ?? 8000;
}
