import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { describe, expect, it } from 'vitest';
import type { Actor } from '../common/access/actor.js';
import { canClose, canEditRuleCards, canReadDepartments, canReadDraft } from './departments.policy.js';

const own = 'department-one';
const actorOf = (organizationId: string, ...roles: MemberRole[]): Actor => ({
  personId: 'p',
  sessionId: 's',
  name: 'P',
  isOperator: false,
  memberships: [{ organizationId, kind: 'department', roles }],
});

// definitions: "rule card, closures: desk"; the owner has nothing more by that role alone (product)
describe('departments policy', () => {
  it.each<[MemberRole, boolean]>([
    ['desk', true],
    ['inspector', false],
    ['owner', false],
  ])('lets the %s of the department edit and close: %s', (role, may) => {
    expect(canEditRuleCards(actorOf(own, role), own)).toBe(may);
    expect(canClose(actorOf(own, role), own)).toBe(may);
  });

  it('gives the desk of another department nothing', () => {
    const stranger = actorOf('department-two', 'desk');
    expect(canEditRuleCards(stranger, own)).toBe(false);
    expect(canClose(stranger, own)).toBe(false);
    expect(canReadDraft(stranger, own)).toBe(false);
  });

  it('shows drafts to every member of the department, and departments to everyone', () => {
    expect(canReadDraft(actorOf(own, 'inspector'), own)).toBe(true);
    expect(canReadDepartments(actorOf('builder', 'superintendent'))).toBe(true);
  });
});
