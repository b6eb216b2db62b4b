import { refuse } from '../common/errors/app-error.js';
import { constraintOf } from './constraint-of.js';

/** Constraints that keep a room and an inspector's time from being taken twice: the net below the lock of the day. */
const seatConstraints = ['visits_one_place', 'visits_inspector_once'];

/**
 * Runs a booking, its whole transaction inside `book`, and once more where another took the seat in the same moment.
 * @throws window-full when it was taken again
 */
export async function bookTwice<T>(book: () => Promise<T>): Promise<T> {
  try {
    return await book();
  } catch (error) {
    if (!isTaken(error)) throw error;
  }
  try {
    return await book();
  } catch (error) {
    if (!isTaken(error)) throw error;
    return refuse('window-full', { why: 'full' });
  }
}

function isTaken(error: unknown): boolean {
  return seatConstraints.includes(constraintOf(error) ?? '');
}
