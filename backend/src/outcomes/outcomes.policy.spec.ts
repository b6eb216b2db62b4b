import { describe, expect, it } from 'vitest';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { Actor } from '../common/access/actor.js';
import {
  canDecideCorrection,
  canFixCorrection,
  canInspect,
  correctionAbilities,
  isOwnVisit,
} from './outcomes.policy.js';

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
  departmentOwner: actor(['department', 'owner']),
  inspectorElsewhere: actor(['elsewhere', 'inspector']),
  inspectorWithTheBuilder: actor(['department', 'inspector'], ['builder', 'owner']),
  inspectorWithThePlumber: actor(['department', 'inspector', 'desk'], ['plumber', 'helper']),
};

function whoMay(may: (actor: Actor) => boolean): string[] {
  return Object.keys(people).filter((name) => may(people[name] as Actor));
}

describe('who decides', () => {
  it('is an inspector of the department who belongs neither to the builder nor to the plumber, whatever other roles they hold', () => {
    expect(whoMay((each) => canInspect(each, lot))).toEqual(['inspector']);
    expect(whoMay((each) => canDecideCorrection(each, lot))).toEqual(['inspector']);
  });

  it('is the plumber of the lot for a fix', () => {
    expect(whoMay((each) => canFixCorrection(each, lot))).toEqual(['plumber']);
  });

  it('is whoever the visit stands in the name of', () => {
    expect(isOwnVisit(people.inspector as Actor, { inspectorId: 'me' })).toBe(true);
    expect(isOwnVisit(people.inspector as Actor, { inspectorId: null })).toBe(false);
  });
});

describe('what the page offers on a correction', () => {
  it.each([
    ['plumber', 'open', { canFix: true, canDecide: false }],
    ['plumber', 'fixed', { canFix: false, canDecide: false }],
    ['inspector', 'open', { canFix: false, canDecide: false }],
    ['inspector', 'fixed', { canFix: false, canDecide: true }],
    ['inspector', 'accepted', { canFix: false, canDecide: false }],
    ['superintendent', 'fixed', { canFix: false, canDecide: false }],
  ] as const)('%s, %s', (name, state, abilities) => {
    expect(correctionAbilities(people[name] as Actor, lot, state)).toEqual(abilities);
  });
});
