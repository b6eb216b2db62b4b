import { angleBetween } from './dial-angle.js';
import type { DialInput, DialReading } from './dial.contract.js';
import { isAbove } from './tolerance.js';

/**
 * Reads a gauge from points on its photo: the share of the sweep, clockwise from the zero mark, that the needle has gone through, times the
 * range. Takes input that `dialInput` has parsed; throws nothing.
 */
export function readDial({
  center,
  zeroMark,
  fullMark,
  needleTip,
  rangePsi,
  typedPsi,
  incrementPsi,
}: DialInput): DialReading {
  const sweepDegrees = angleBetween(center, zeroMark, fullMark);
  const psi = shareOfSweep(angleBetween(center, zeroMark, needleTip), sweepDegrees) * rangePsi;
  const agrees = typedPsi === null || incrementPsi === null ? null : !isAbove(Math.abs(psi - typedPsi), incrementPsi);
  return { psi, sweepDegrees, agrees };
}

/** In the dead sector a needle rests on the nearer end; on a tie it is taken for zero. */
function shareOfSweep(angle: number, sweep: number): number {
  if (angle <= sweep) return angle / sweep;
  const pastFull = angle - sweep;
  const beforeZero = 360 - angle;
  return isAbove(beforeZero, pastFull) ? 1 : 0;
}
