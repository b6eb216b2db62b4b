import type { Me } from '@holdwater/shared-types/accounts/person.contract.js';
import type { ChosenOrganization } from '../lib/session-context';

/** Kept in place of an organization's id when an operator works on the installation. */
export const operatorsFrame = 'operations';

const storageKey = (personId: string): string => `holdwater.organization.${personId}`;

/** What this person chose last on this device. */
export function keptChoice(personId: string): string | null {
  try {
    return window.localStorage.getItem(storageKey(personId));
  } catch {
    return null;
  }
}

export function keepChosen(personId: string, choice: string): void {
  try {
    window.localStorage.setItem(storageKey(personId), choice);
  } catch {
    // Storage may be blocked: the choice then lasts as long as the page.
  }
}

export interface Frame {
  readonly chosen: ChosenOrganization | null;
  readonly isOperatorFrame: boolean;
}

/** The frame a choice leads to: a choice that is no longer theirs falls back to the first organization, an operator's to the installation. */
export function chosenOf(me: Me | null, choice: string | null): Frame {
  if (me === null) return { chosen: null, isOperatorFrame: false };
  const first = me.memberships[0] ?? null;
  if (me.isOperator && (choice === operatorsFrame || first === null)) return { chosen: null, isOperatorFrame: true };
  const picked = me.memberships.find(({ organization }) => organization.id === choice) ?? first;
  return { chosen: picked, isOperatorFrame: false };
}
