import { refuse } from '../common/errors/app-error.js';

/** A place on earth has both numbers or neither. Throws `bad-input` on the one that is missing. */
export function refuseHalfPlace(latitude: number | null, longitude: number | null): void {
  if ((latitude === null) === (longitude === null)) return;
  refuse('bad-input', {}, { [latitude === null ? 'latitude' : 'longitude']: 'both-or-neither' });
}
