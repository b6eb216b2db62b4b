import type { PlatDrawing } from '@holdwater/shared-types/lots/tract.contract.js';

type Point = [number, number];

const radians = (degrees: number) => (degrees * Math.PI) / 180;
const rounded = ([x, y]: Point): Point => [Math.round(x * 10) / 10, Math.round(y * 10) / 10];

/** Points on an arc about `[cx, cy]`, both ends included. */
function arc([cx, cy]: Point, radius: number, from: number, to: number, steps = 8): Point[] {
  return Array.from({ length: steps + 1 }, (_, i) => {
    const angle = radians(from + ((to - from) * i) / steps);
    return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)];
  });
}

/** A straight run of lots of one width along a street, from `[x, y]` on, `dx` a lot. */
function row(from: number, count: number, [x, y]: Point, dx: number, depth: number): Array<[string, Point[]]> {
  return Array.from({ length: count }, (_, i) => {
    const left = x + i * dx;
    return [
      String(from + i),
      [
        [left, y],
        [left + dx, y],
        [left + dx, y + depth],
        [left, y + depth],
      ],
    ];
  });
}

/** Lots of equal angle round the bend of a street. */
function bend(
  from: number,
  count: number,
  center: Point,
  near: number,
  far: number,
  startAngle: number,
  step: number,
): Array<[string, Point[]]> {
  return Array.from({ length: count }, (_, i) => {
    const a0 = startAngle + i * step;
    return [String(from + i), [...arc(center, near, a0, a0 + step), ...arc(center, far, a0 + step, a0)]];
  });
}

const draw = (
  widthFt: number,
  heightFt: number,
  lots: Array<[string, Point[]]>,
  roads: PlatDrawing['roads'],
  shift: Point,
): PlatDrawing => ({
  widthFt,
  heightFt,
  northDegrees: 0,
  parcels: lots.map(([lotNumber, points]) => ({
    lotNumber,
    points: points.map(([x, y]) => rounded([x + shift[0], y + shift[1]])),
  })),
  roads: roads.map((road) => ({ ...road, points: road.points.map(([x, y]) => rounded([x + shift[0], y + shift[1]])) })),
});

/** Sorrel Bench, phase 2: 28 lots on Teasel Way, which bends into Sedge Loop. */
export function sorrelBench(): PlatDrawing {
  const bendCenter: Point = [400, 220];
  const [near, far] = [202, 306];
  const lots: Array<[string, Point[]]> = [
    ...row(1, 6, [0, 422], 66.7, 104),
    ...bend(7, 5, bendCenter, near, far, 90, -18),
    ...Array.from({ length: 4 }, (_, i): [string, Point[]] => {
      const y = 220 - (i + 1) * 66;
      return [
        String(12 + i),
        [
          [602, y],
          [706, y],
          [706, y + 66],
          [602, y + 66],
        ],
      ];
    }),
    ...Array.from({ length: 4 }, (_, i): [string, Point[]] => {
      const y = -44 + i * 66;
      return [
        String(16 + i),
        [
          [454, y],
          [558, y],
          [558, y + 66],
          [454, y + 66],
        ],
      ];
    }),
    ...bend(20, 3, bendCenter, 158, 54, 0, 30),
    ...Array.from({ length: 6 }, (_, i): [string, Point[]] => {
      const right = 400 - i * 66.7;
      return [
        String(23 + i),
        [
          [right, 378],
          [right - 66.7, 378],
          [right - 66.7, 274],
          [right, 274],
        ],
      ];
    }),
  ];
  return draw(
    730,
    600,
    lots,
    [
      {
        name: 'Teasel Way',
        widthFt: 44,
        points: [
          [-10, 400],
          [400, 400],
        ],
      },
      { name: 'Sedge Loop', widthFt: 44, points: [...arc(bendCenter, 180, 90, 0), [580, -44]] },
    ],
    [12, 58],
  );
}

/** Millpond, phase 1: 12 lots on both sides of Rushlight Street. */
export function millpond(): PlatDrawing {
  return draw(
    460,
    300,
    [...row(51, 6, [0, 0], 72, 110), ...row(57, 6, [0, 154], 72, 110)],
    [
      {
        name: 'Rushlight Street',
        widthFt: 44,
        points: [
          [-10, 132],
          [442, 132],
        ],
      },
    ],
    [14, 16],
  );
}

/** Kettle Rise: 14 lots on both sides of one street. */
export function kettleRise(): PlatDrawing {
  return draw(
    490,
    300,
    [...row(31, 7, [0, 0], 66, 110), ...row(38, 7, [0, 154], 66, 110)],
    [
      {
        name: 'Kettle Rise',
        widthFt: 44,
        points: [
          [-10, 132],
          [472, 132],
        ],
      },
    ],
    [14, 16],
  );
}
