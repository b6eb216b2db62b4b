import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { nextMoves, type VisitMove, visitMoves, type VisitState } from '@holdwater/shared-types/visits/visit.states.js';
import { describe, expect, it } from 'vitest';
import type { Actor } from '../common/access/actor.js';
import {
  canReadRun,
  canWorkRequests,
  isTimely,
  mayMove,
  movesFor,
  requestingSideOf,
  type VisitFacts,
} from './visits.policy.js';

const lot = { builderId: 'builder', plumberId: 'plumber', departmentId: 'department', mayPlumberRequest: false };
const openLot = { ...lot, mayPlumberRequest: true };
const kinds = { builder: 'builder', plumber: 'plumber', department: 'department', stranger: 'department' } as const;

function actor(personId: string, ...places: Array<[keyof typeof kinds, MemberRole]>): Actor {
  const memberships = places.map(([organizationId, role]) => ({
    organizationId,
    kind: kinds[organizationId],
    roles: [role],
  }));
  return { personId, sessionId: 's', name: personId, isOperator: false, memberships };
}

const della = actor('della', ['builder', 'superintendent']);
const ruben = actor('ruben', ['plumber', 'plumber']);
const helper = actor('helper', ['plumber', 'helper']);
const noor = actor('noor', ['department', 'inspector']);
const gil = actor('gil', ['department', 'inspector']);
const desk = actor('desk', ['department', 'desk']);
const owner = actor('owner', ['builder', 'owner']);
const stranger = actor('stranger', ['stranger', 'desk'], ['stranger', 'inspector']);
const partial = actor('partial', ['department', 'inspector'], ['plumber', 'helper']);
const small = actor('small', ['department', 'desk'], ['department', 'inspector']);

const windowStartAt = new Date('2027-03-03T14:30:00Z');
const before = new Date('2027-03-03T14:29:59Z');
const after = windowStartAt;
const visit = (overrides: Partial<VisitFacts> = {}): VisitFacts => ({
  state: 'booked',
  requestedBy: 'della',
  inspectorId: 'noor',
  begunBy: null,
  begunAt: null,
  windowStartAt,
  ...overrides,
});
const made = (who: Actor, facts = visit(), parties = lot) =>
  visitMoves.filter((move) => mayMove(who, move, facts, parties));

// the table "Who may" of the definitions, written out again
describe('who makes a move', () => {
  it.each<[string, Actor, VisitMove[]]>([
    ['the superintendent', della, ['withdraw', 'move']],
    ['the plumber', ruben, ['say-test-up', 'no-longer-up']],
    ['a helper', helper, []],
    ['a bare owner', owner, []],
    ['the desk', desk, ['place', 'decline', 'withdraw', 'move', 'free-closure', 'not-reached']],
    ['the visit’s inspector', noor, ['find-not-up', 'begin', 'undo-begin', 'close']],
    ['another inspector, knowingly', gil, ['begin']],
    ['an inspector who belongs to the plumber', partial, []],
    ['somebody of another department', stranger, []],
  ])('%s', (_, who, moves) => {
    expect(made(who)).toEqual(moves);
  });

  it('the plumber withdraws and moves where the lot allows it, or what they asked for themselves', () => {
    expect(made(ruben, visit(), openLot)).toEqual(['withdraw', 'move', 'say-test-up', 'no-longer-up']);
    expect(made(ruben, visit({ requestedBy: 'ruben' }))).toContain('withdraw');
    expect(made(helper, visit({ requestedBy: 'helper' }), openLot)).toEqual([]);
  });

  it('the desk withdraws and moves whoever asked, but not a desk of another department', () => {
    for (const requestedBy of ['della', 'ruben', 'desk']) {
      expect(made(desk, visit({ requestedBy }))).toEqual(expect.arrayContaining(['withdraw', 'move']));
      expect(made(stranger, visit({ requestedBy }))).toEqual([]);
    }
  });

  it('nobody is the deadline', () => {
    for (const who of [della, ruben, desk, noor, small]) expect(made(who)).not.toContain('free-not-up');
  });

  it('one person may be desk and inspector', () => {
    expect(made(small, visit({ inspectorId: 'small' }))).toEqual([
      'place',
      'decline',
      'withdraw',
      'move',
      'find-not-up',
      'begin',
      'undo-begin',
      'close',
      'free-closure',
      'not-reached',
    ]);
  });
});

describe('the moves shown', () => {
  const shown = (who: Actor, state: VisitState, now = before, facts: Partial<VisitFacts> = {}) =>
    movesFor(who, visit({ state, ...facts }), lot, now);

  it('are of the state and in time', () => {
    expect(shown(desk, 'requested')).toEqual(['place', 'decline', 'withdraw', 'move']);
    expect(shown(desk, 'booked')).toEqual(['withdraw', 'move', 'free-closure', 'not-reached']);
    expect(shown(desk, 'ready')).toEqual(['withdraw', 'move', 'free-closure', 'not-reached']);
    expect(shown(desk, 'underway')).toEqual(['not-reached']);
    expect(shown(della, 'underway')).toEqual([]);
    for (const state of ['closed', 'declined', 'withdrawn', 'freed'] as const) expect(shown(small, state)).toEqual([]);
  });

  it('a start before the window only with the test up', () => {
    expect(shown(noor, 'booked', before)).toEqual([]);
    expect(shown(noor, 'booked', after)).toEqual(['begin']);
    expect(shown(noor, 'ready', before)).toEqual(['find-not-up', 'begin']);
  });

  it('a start is taken back within a minute, by whoever made it', () => {
    const begunAt = new Date('2027-03-03T14:40:00Z');
    const begun = { begunAt, begunBy: 'noor' };
    expect(shown(noor, 'underway', new Date(begunAt.getTime() + 60_000), begun)).toEqual(['undo-begin', 'close']);
    expect(shown(noor, 'underway', new Date(begunAt.getTime() + 60_001), begun)).toEqual(['close']);
    expect(isTimely('undo-begin', visit({ state: 'underway', ...begun }), gil, begunAt)).toBe(false);
  });

  it('no test to say up where the stage asks for none', () => {
    expect(movesFor(ruben, visit(), lot, before, true)).toEqual(['say-test-up']);
    expect(movesFor(ruben, visit(), lot, before, false)).toEqual([]);
  });

  it('are never more than the table has', () => {
    for (const state of ['requested', 'booked', 'ready', 'underway'] as const) {
      for (const who of [della, ruben, desk, noor, small]) {
        for (const move of shown(who, state, after)) expect(nextMoves(state)).toContain(move);
      }
    }
  });
});

describe('asking and reading', () => {
  it('is asked for by a side, for a caller by the desk alone', () => {
    expect([della, ruben, desk, helper, owner, noor].map((who) => requestingSideOf(who, lot, false))).toEqual([
      'builder',
      'plumber',
      'desk',
      null,
      null,
      null,
    ]);
    expect([della, ruben, desk].map((who) => requestingSideOf(who, lot, true))).toEqual([null, null, 'desk']);
  });

  it('a run is the inspector’s own, the desk’s any; requests are the desk’s', () => {
    expect(canReadRun(noor, 'department', 'noor')).toBe(true);
    expect(canReadRun(noor, 'department', 'gil')).toBe(false);
    expect(canReadRun(desk, 'department', 'gil')).toBe(true);
    expect(canReadRun(stranger, 'department', 'stranger')).toBe(false);
    expect(canReadRun(della, 'department', 'della')).toBe(false);
    expect([desk, noor, stranger, della].map((who) => canWorkRequests(who, 'department'))).toEqual([
      true,
      false,
      false,
      false,
    ]);
  });
});
