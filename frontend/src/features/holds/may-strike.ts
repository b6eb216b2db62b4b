import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';

/**
 * Whether striking a reading is offered: while its test stands, to the plumber for those of the own side, to anybody else for their own.
 * The server has the last word.
 */
export function mayStrike(
  hold: Pick<Hold, 'state'>,
  reading: Pick<Reading, 'isStruck' | 'byName' | 'byRole'>,
  abilities: Pick<LotAbilities, 'canTest' | 'canAddReading'>,
  me: { readonly name: string },
): boolean {
  if (hold.state !== 'standing' || reading.isStruck) return false;
  const isOfPlumber = reading.byRole === 'plumber' || reading.byRole === 'helper';
  if (abilities.canTest && isOfPlumber) return true;
  return abilities.canAddReading && reading.byName === me.name;
}
