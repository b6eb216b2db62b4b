import { describe, expect, it } from 'vitest';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { Actor } from '../common/access/actor.js';
import { canChoosePlan } from './plans.policy.js';

const lot = { builderId: 'builder', plumberId: 'plumber', departmentId: 'department', mayPlumberRequest: true };
type Place = [organizationId: string, ...roles: MemberRole[]];

function actor(...places: Place[]): Actor {
  const memberships = places.map(([organizationId, ...roles]) => ({ organizationId, kind: 'builder' as const, roles }));
  return { personId: 'me', sessionId: 's', name: 'Me', isOperator: false, memberships };
}

const people: Record<string, Actor> = {
  superintendent: actor(['builder', 'superintendent']),
  builderOwner: actor(['builder', 'owner']),
  plumber: actor(['plumber', 'plumber']),
  helper: actor(['plumber', 'helper']),
  plumberOwner: actor(['plumber', 'owner']),
  inspector: actor(['department', 'inspector']),
  desk: actor(['department', 'desk']),
  stranger: actor(['elsewhere', 'plumber', 'inspector', 'superintendent']),
};

describe('who may choose a method', () => {
  // definitions.md, "Who may": choose method, start and end a test, test up: plumber yes, all others no
  it('is the plumber of the lot alone', () => {
    expect(Object.keys(people).filter((name) => canChoosePlan(people[name] as Actor, lot))).toEqual(['plumber']);
  });

  it('is nobody while no plumber is attached', () => {
    expect(canChoosePlan(people.plumber as Actor, { ...lot, plumberId: null })).toBe(false);
  });
});
