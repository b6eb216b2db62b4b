import { type Actor, hasRole, isMember } from '../common/access/actor.js';

/** Everyone signed in may read departments and published rule cards: whoever builds has to know them. */
export function canReadDepartments(_actor: Actor): boolean {
  return true;
}

/** Drafts are the department's own business. */
export function canReadDraft(actor: Actor, departmentId: string): boolean {
  return isMember(actor, departmentId);
}

export function canEditRuleCards(actor: Actor, departmentId: string): boolean {
  return hasRole(actor, departmentId, 'desk');
}

export function canClose(actor: Actor, departmentId: string): boolean {
  return hasRole(actor, departmentId, 'desk');
}
