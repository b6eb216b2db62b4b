import { describe, expect, it } from 'vitest';
import type { Actor } from '../common/access/actor.js';
import { canManagePeople, canReadPeople, keepsOwner, rolesAmiss } from './accounts.policy.js';

const actorWith = (...memberships: Actor['memberships']): Actor => ({
  personId: 'p',
  sessionId: 's',
  name: 'Enid Odderly',
  isOperator: false,
  memberships,
});
const owner = actorWith({ organizationId: 'a', kind: 'builder', roles: ['owner'] });
const superintendent = actorWith({ organizationId: 'a', kind: 'builder', roles: ['superintendent'] });

describe('who may what with the people of an organization', () => {
  it('members read, owners manage, nobody elsewhere, an operator neither', () => {
    expect([canReadPeople(owner, 'a'), canReadPeople(superintendent, 'a'), canReadPeople(owner, 'b')]).toEqual([
      true,
      true,
      false,
    ]);
    expect([canManagePeople(owner, 'a'), canManagePeople(superintendent, 'a'), canManagePeople(owner, 'b')]).toEqual([
      true,
      false,
      false,
    ]);
    const operator = { ...actorWith(), isOperator: true };
    expect([canReadPeople(operator, 'a'), canManagePeople(operator, 'a')]).toEqual([false, false]);
  });

  it('roles belong to a kind of organization', () => {
    expect(rolesAmiss('builder', ['superintendent', 'owner'])).toEqual([]);
    expect(rolesAmiss('builder', ['inspector', 'owner', 'plumber'])).toEqual(['inspector', 'plumber']);
    expect(rolesAmiss('department', ['inspector', 'desk', 'owner'])).toEqual([]);
    expect(rolesAmiss('plumber', ['plumber', 'helper', 'owner', 'desk'])).toEqual(['desk']);
  });

  it('the last owner who can act stays', () => {
    const enid = { personId: 'enid', roles: ['owner'] as const, isDisabled: false };
    const della = { personId: 'della', roles: ['superintendent'] as const, isDisabled: false };
    const disabledOwner = { personId: 'abel', roles: ['owner'] as const, isDisabled: true };
    expect(keepsOwner([enid, della], { ...enid, roles: ['superintendent'] })).toBe(false);
    expect(keepsOwner([enid, della], { ...enid, isDisabled: true })).toBe(false);
    expect(keepsOwner([enid, disabledOwner], { ...enid, isDisabled: true })).toBe(false);
    expect(keepsOwner([enid, { ...della, roles: ['owner'] }], { ...enid, isDisabled: true })).toBe(true);
    expect(keepsOwner([enid], { ...enid, roles: ['owner', 'superintendent'] })).toBe(true);
  });
});
