export interface Point {
  x: number;
  y: number;
}

export interface DialRequest {
  center: Point;
  zeroMark: Point;
  fullMark: Point;
  needleTip: Point;
  rangePsi: number;
  typedPsi?: number | null;
  incrementPsi?: number | null;
}

/** The answer to a dial reading, as the last paragraph of the design's section 4 has it. */
export function secondDial(given: DialRequest) {
  const { center, zeroMark, fullMark, needleTip, rangePsi, typedPsi, incrementPsi } = given;
  const sweepDegrees = clockwise(center, zeroMark, fullMark);
  const turned = clockwise(center, zeroMark, needleTip);
  const beyondFull = turned - sweepDegrees;
  const isDead = beyondFull > 0;
  const isNearerFull = beyondFull < 360 - turned;
  const psi = isDead ? (isNearerFull ? rangePsi : 0) : (turned / sweepDegrees) * rangePsi;
  const isCompared = typedPsi != null && incrementPsi != null;
  return { psi, sweepDegrees, agrees: isCompared ? Math.abs(psi - typedPsi) <= incrementPsi + 1e-9 : null };
}

/** Degrees from `a` to `b` around the center, 0 to 360; on an image, whose y grows downward, the clock's way is that of growing atan2. */
function clockwise(center: Point, a: Point, b: Point): number {
  const angle = (point: Point) => Math.atan2(point.y - center.y, point.x - center.x);
  const degrees = ((angle(b) - angle(a)) * 180) / Math.PI;
  return degrees < 0 ? degrees + 360 : degrees;
}
