import { refuse } from '../errors/app-error.js';
import { currentRequest } from './request-context.js';

/** Clocks drift; past this an instant in the future is a fault, not drift. */
const toleratedAheadMs = 2 * 60_000;
/** An offset below this is transport time, not a wrong clock. */
const ignoredOffsetMs = 5_000;

/**
 * When an entry was really made: the phone's time, corrected by the clock offset measured on this request. Never later than now.
 * Throws `reading-in-the-future` when it lies further ahead than clocks drift.
 */
export function correctedMadeAt(madeAt: string, now: Date): Date {
  const offset = currentRequest()?.clockOffsetMs ?? 0;
  const corrected = Date.parse(madeAt) + (Math.abs(offset) > ignoredOffsetMs ? offset : 0);
  if (corrected > now.getTime() + toleratedAheadMs) refuse('reading-in-the-future', {}, { madeAt: 'in-the-future' });
  return new Date(Math.min(corrected, now.getTime()));
}
