import { describe, expect, it } from 'vitest';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { Actor } from '../common/access/actor.js';
import {
  canEndHold,
  canSayTestUp,
  canStartHold,
  canStrikeReading,
  downMoveOf,
  isVisitOfAnother,
  type StruckFacts,
} from './holds.policy.js';

type ReadingRole = StruckFacts['byRole'];

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

function whoMay(may: (actor: Actor) => boolean): string[] {
  return Object.keys(people).filter((name) => may(people[name] as Actor));
}

describe('who may do what to a test', () => {
  it('lets the plumber alone start, end and say it is up', () => {
    expect(whoMay((each) => canStartHold(each, lot))).toEqual(['plumber']);
    expect(whoMay((each) => canEndHold(each, lot))).toEqual(['plumber']);
    expect(whoMay((each) => canSayTestUp(each, lot))).toEqual(['plumber']);
  });

  describe('lets a reading be struck', () => {
    const struck = (byRole: ReadingRole, byPerson = 'other', plumberId = 'plumber') =>
      whoMay((each) => canStrikeReading(each, lot, { byPerson, byRole, plumberId }));

    it.each(['plumber', 'helper', 'superintendent', 'inspector'] as const)(
      'of a %s by whoever made it, while they may read',
      (role) => {
        expect(struck(role, 'me')).toEqual(['superintendent', 'plumber', 'helper', 'inspector']);
      },
    );

    it('of the crew by the crew, and of another organization by nobody', () => {
      for (const role of ['plumber', 'helper'] as const) expect(struck(role)).toEqual(['plumber', 'helper']);
      for (const role of ['superintendent', 'inspector'] as const) expect(struck(role)).toEqual([]);
    });

    it('of a crew that left the lot by nobody of the new one', () => {
      expect(struck('plumber', 'other', 'former plumber')).toEqual([]);
    });
  });

  it('lets the plumber say it is down, and the inspector of the visit find it so', () => {
    const own = { inspectorId: 'me' };
    const moves = Object.entries(people).map(([name, each]) => [name, downMoveOf(each, lot, own)]);
    expect(moves.filter(([, move]) => move !== null)).toEqual([
      ['plumber', 'no-longer-up'],
      ['inspector', 'find-not-up'],
    ]);
    expect(downMoveOf(people.inspector as Actor, lot, { inspectorId: 'other' })).toBeNull();
    expect(isVisitOfAnother(people.inspector as Actor, lot, { inspectorId: 'other' })).toBe(true);
    expect(isVisitOfAnother(people.desk as Actor, lot, { inspectorId: 'other' })).toBe(false);
  });

  it('finds nothing by an inspector who belongs to the builder', () => {
    const both = actor(['department', 'inspector'], ['builder', 'owner']);
    expect(downMoveOf(both, lot, { inspectorId: 'me' })).toBeNull();
  });
});
