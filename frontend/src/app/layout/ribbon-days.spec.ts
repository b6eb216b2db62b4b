import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { describe, expect, it } from 'vitest';
import { ribbonDays, ribbonHours, visitMark, type Calendar } from './ribbon-days';

const zone = 'America/Denver';
const department = 'd';

// Wed, Apr 15, 2026: nine to eleven in the morning, Mountain daylight time, six hours behind.
const nine = '2026-04-15T15:00:00Z';
const eleven = '2026-04-15T17:00:00Z';

function visit(parts: Partial<VisitSummary>): VisitSummary {
  const window = { date: '2026-04-15', label: '9–11', startAt: nine, endAt: eleven };
  const base: Partial<VisitSummary> = {
    departmentId: department,
    zone,
    state: 'booked',
    window,
    plannedStartAt: null,
    systemsUp: [],
    outcome: null,
    upBy: null,
  };
  return { ...base, ...parts } as VisitSummary;
}

function calendar(parts: {
  visits?: VisitSummary[];
  closed?: { from: string | null; to: string | null; why: string }[];
}): Calendar {
  const window = {
    date: '2026-04-15',
    label: '9–11',
    startAt: nine,
    endAt: eleven,
    room: 4,
    roomLeft: 1,
    up: 2,
    isTakeable: true,
    cutoffAt: null,
  };
  const day = { date: '2026-04-15', isWorkingDay: true, closed: parts.closed ?? [], windows: [window] };
  const lane = { departmentId: department, name: 'Tallowmere', zone, isOwn: true, ruleCardVersion: 6, days: [day] };
  return { now: nine, zone, today: '2026-04-15', lanes: [lane], visits: parts.visits ?? [] };
}

const show = (given: Calendar | undefined, today = '2026-04-15') =>
  ribbonDays({
    dates: ['2026-04-15'],
    calendar: given,
    span: { from: '2026-04-13', to: '2026-04-17' },
    today,
    labelOf: (d) => d,
  })[0];

describe('a day of the ribbon', () => {
  it('has windows as shelves at the department’s own hours, filled as far as they are booked and up', () => {
    // 3 of 4 are booked, 2 of those 3 are up.
    expect(show(calendar({}))?.shelves).toEqual([
      { from: 9, to: 11, label: '9–11', row: 0, isShut: false, booked: 0.75, up: 2 / 3 },
    ]);
  });

  it('has visits at their planned time, else at their window’s', () => {
    const marks = show(
      calendar({ visits: [visit({}), visit({ plannedStartAt: '2026-04-15T15:15:00Z', state: 'ready' })] }),
    )?.marks;
    expect(marks).toEqual([
      { at: 9, mark: 'booked', row: 0 },
      { at: 9.25, mark: 'ready', row: 0 },
    ]);
  });

  it('leaves out what is withdrawn, declined or freed', () => {
    const visits = (['withdrawn', 'declined', 'freed', 'booked'] as const).map((state) => visit({ state }));
    expect(show(calendar({ visits }))).toMatchObject({ visits: 1 });
  });

  it('is closed as a whole only when no department works', () => {
    expect(show(calendar({ closed: [{ from: null, to: null, why: 'staff day' }] }))?.isClosed).toBe(true);
    const part = show(calendar({ closed: [{ from: eleven, to: '2026-04-15T18:00:00Z', why: 'staff' }] }));
    expect(part).toMatchObject({ isClosed: false, closures: [{ from: 11, to: 12, row: 0 }] });
  });

  it('counts what is not up once the deadline is near, and never for a day that is over', () => {
    const soon = visit({ upBy: new Date(Date.now() + 3_600_000).toISOString() });
    const later = visit({ upBy: new Date(Date.now() + 100 * 3_600_000).toISOString() });
    expect(show(calendar({ visits: [soon, later] }))?.notUp).toBe(1);
    expect(show(calendar({ visits: [soon] }), '2026-04-16')?.notUp).toBe(0);
  });

  it('stands empty, bracketed and named before anything is known', () => {
    expect(show(undefined)).toMatchObject({
      shelves: [],
      marks: [],
      isClosed: false,
      isBracketed: true,
      isToday: true,
    });
  });
});

describe('a visit', () => {
  it('stands as its state, its outcome, or half full', () => {
    expect(visitMark(visit({ state: 'closed', outcome: { kind: 'fail', reason: null } }))).toBe('fail');
    const system = { unitNumber: 1, system: 'dwv', isUp: true } as const;
    expect(visitMark(visit({ systemsUp: [system] }))).toBe('part-up');
    expect(visitMark(visit({ state: 'underway', systemsUp: [system] }))).toBe('underway');
  });
});

it('draws seven to five unless a window lies outside', () => {
  expect(ribbonHours(undefined)).toEqual({ from: 7, to: 17 });
  const early = calendar({});
  const first = early.lanes[0]?.days[0]?.windows[0];
  if (first !== undefined) first.startAt = '2026-04-15T12:30:00Z';
  expect(ribbonHours(early)).toEqual({ from: 6, to: 17 });
});
