import type { MemberRole, OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import { describe, expect, it } from 'vitest';
import type { Actor } from '../../common/access/actor.js';
import { canApplyHouseModels, canReadHouseModels, canWriteHouseModels, modellingRole } from './house-models.policy.js';

const actorOf = (organizationId: string, kind: OrganizationKind, ...roles: MemberRole[]): Actor => ({
  ...{ personId: 'person', sessionId: 'session', name: 'Person', isOperator: false },
  memberships: [{ organizationId, kind, roles }],
});

/** The rights of definitions.md, "Who may": the owner has no say in a lot's house by that role alone. */
describe('house models', () => {
  it.each([
    ['superintendent', actorOf('builder', 'builder', 'superintendent'), [true, true, true]],
    ['owner', actorOf('builder', 'builder', 'owner'), [true, true, false]],
    ['superintendent of another builder', actorOf('other', 'builder', 'superintendent'), [false, false, false]],
    ['plumber', actorOf('plumber', 'plumber', 'plumber', 'owner'), [false, false, false]],
    ['desk', actorOf('department', 'department', 'desk'), [false, false, false]],
  ])('%s: read, write, give to lots', (_name, actor, may) => {
    expect(
      [canReadHouseModels, canWriteHouseModels, canApplyHouseModels].map((rule) => rule(actor, 'builder')),
    ).toEqual(may);
  });

  it('are written in the stronger role', () => {
    expect(modellingRole(actorOf('builder', 'builder', 'owner', 'superintendent'), 'builder')).toBe('superintendent');
    expect(modellingRole(actorOf('builder', 'builder', 'owner'), 'builder')).toBe('owner');
  });
});
