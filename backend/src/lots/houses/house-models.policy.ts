import { type Actor, hasRole, isMember } from '../../common/access/actor.js';

/** A builder's house models are known to its own people only; the other parties see the houses on their lots. */
export function canReadHouseModels(actor: Actor, builderId: string): boolean {
  return isMember(actor, builderId);
}

/** Save, rename, make a new version of, remove. */
export function canWriteHouseModels(actor: Actor, builderId: string): boolean {
  return hasRole(actor, builderId, 'superintendent', 'owner');
}

/** Giving a model to lots sets their houses, which of the builder the superintendent alone may. */
export function canApplyHouseModels(actor: Actor, builderId: string): boolean {
  return hasRole(actor, builderId, 'superintendent');
}

/** The role a model is written in, for the record. */
export function modellingRole(actor: Actor, builderId: string): string {
  return hasRole(actor, builderId, 'superintendent') ? 'superintendent' : 'owner';
}
