import type { Actor } from '../common/access/actor.js';
import { canTest, type LotParties } from '../lots/lots.policy.js';

/** Choose the method of a test: the plumber of the lot alone. Reading is every member's of its three parties. */
export function canChoosePlan(actor: Actor, lot: LotParties): boolean {
  return canTest(actor, lot);
}
