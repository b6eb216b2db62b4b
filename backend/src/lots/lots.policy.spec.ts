import type { MemberRole, OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';
import { describe, expect, it } from 'vitest';
import type { Actor } from '../common/access/actor.js';
import {
  actingRole,
  canAddLots,
  canAddReading,
  canAttachParty,
  canReadLot,
  canSeeAccess,
  isImpartialInspectorOf,
  lotAbilities,
  type LotParties,
  readingRole,
} from './lots.policy.js';

const lot: LotParties = {
  builderId: 'builder',
  plumberId: 'plumber',
  departmentId: 'department',
  mayPlumberRequest: true,
};
const strangers: LotParties = { builderId: 'b2', plumberId: 'p2', departmentId: 'd2', mayPlumberRequest: true };

type Place = [organizationId: string, ...roles: MemberRole[]];
const kinds: Record<string, OrganizationKind> = { builder: 'builder', plumber: 'plumber', department: 'department' };
const actorOf = (...places: Place[]): Actor => ({
  personId: 'person',
  sessionId: 'session',
  name: 'Person',
  isOperator: false,
  memberships: places.map(([organizationId, ...roles]) => ({
    organizationId,
    kind: kinds[organizationId] ?? 'builder',
    roles,
  })),
});

const people = {
  superintendent: actorOf(['builder', 'superintendent']),
  builderOwner: actorOf(['builder', 'owner']),
  plumber: actorOf(['plumber', 'plumber']),
  helper: actorOf(['plumber', 'helper']),
  plumberOwner: actorOf(['plumber', 'owner']),
  inspector: actorOf(['department', 'inspector']),
  desk: actorOf(['department', 'desk']),
  departmentOwner: actorOf(['department', 'owner']),
};

const acts = [
  'canEdit',
  'canEditGeometry',
  'canSetPermit',
  'canAttach',
  'canRequest',
  'canTest',
  'canAddReading',
  'canSayTestUp',
  'canFix',
  'canDecide',
  'canComment',
] as const satisfies ReadonlyArray<keyof LotAbilities>;

/** The table "Who may" of definitions, row by row. */
const may: Record<keyof typeof people, ReadonlyArray<keyof LotAbilities>> = {
  superintendent: [
    'canEdit',
    'canEditGeometry',
    'canSetPermit',
    'canAttach',
    'canRequest',
    'canAddReading',
    'canComment',
  ],
  builderOwner: ['canAttach'],
  plumber: ['canEditGeometry', 'canRequest', 'canTest', 'canAddReading', 'canSayTestUp', 'canFix', 'canComment'],
  helper: ['canAddReading', 'canComment'],
  plumberOwner: [],
  inspector: ['canAddReading', 'canDecide', 'canComment'],
  desk: ['canSetPermit', 'canRequest', 'canComment'],
  departmentOwner: [],
};

describe('lots policy', () => {
  it.each(Object.entries(people))('gives the %s what definitions give, and nothing more', (name, actor) => {
    const abilities = lotAbilities(actor, lot);
    expect(acts.filter((act) => abilities[act])).toEqual(may[name as keyof typeof people]);
    expect(canReadLot(actor, lot)).toBe(true);
  });

  it.each(Object.entries(people))('gives the %s nothing on a lot of others', (_, actor) => {
    const abilities = lotAbilities(actor, strangers);
    expect(acts.filter((act) => abilities[act])).toEqual([]);
    expect(canReadLot(actor, strangers)).toBe(false);
    expect(canSeeAccess(actor, strangers, true)).toBe(false);
    expect(actingRole(actor, strangers)).toBeNull();
  });

  it('does not take an unset party for a membership', () => {
    const alone = { builderId: 'builder', plumberId: null, departmentId: null, mayPlumberRequest: true };
    for (const actor of [people.plumber, people.desk, people.inspector]) {
      expect(canReadLot(actor, alone)).toBe(false);
      expect(acts.filter((act) => lotAbilities(actor, alone)[act])).toEqual([]);
    }
  });

  it('lets the plumber request only where the lot allows it', () => {
    expect(lotAbilities(people.plumber, { ...lot, mayPlumberRequest: false }).canRequest).toBe(false);
  });

  it('lets nobody of the builder or the plumber decide, whatever else they are', () => {
    const alsoBuilder = actorOf(['department', 'inspector'], ['builder', 'owner']);
    const alsoPlumber = actorOf(['department', 'inspector', 'desk'], ['plumber', 'helper']);
    for (const actor of [alsoBuilder, alsoPlumber]) {
      expect(isImpartialInspectorOf(actor, lot)).toBe(false);
      expect(lotAbilities(actor, lot).canDecide).toBe(false);
    }
    expect(isImpartialInspectorOf(people.inspector, lot)).toBe(true);
  });

  it('shows gate code and hazards to builder and plumber, and to an inspector on the day only', () => {
    for (const name of ['superintendent', 'builderOwner', 'plumber', 'helper'] as const)
      expect(canSeeAccess(people[name], lot, false)).toBe(true);
    expect(canSeeAccess(people.inspector, lot, false)).toBe(false);
    expect(canSeeAccess(people.inspector, lot, true)).toBe(true);
    expect(canSeeAccess(people.desk, lot, true)).toBe(false);
  });

  it('names the role of a reading, and refuses one to the desk and to owners', () => {
    expect(
      [people.superintendent, people.plumber, people.helper, people.inspector].map((actor) => readingRole(actor, lot)),
    ).toEqual(['superintendent', 'plumber', 'helper', 'inspector']);
    for (const actor of [people.desk, people.builderOwner, people.plumberOwner])
      expect(canAddReading(actor, lot)).toBe(false);
  });

  it('lets superintendents add lots to their own builder, and attach parties as its owner may too', () => {
    expect(canAddLots(people.superintendent, 'builder')).toBe(true);
    expect(canAddLots(people.builderOwner, 'builder')).toBe(false);
    expect(canAddLots(people.superintendent, 'b2')).toBe(false);
    expect(canAttachParty(people.plumberOwner, lot)).toBe(false);
  });
});
