import type { NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { localDateOf } from './local-instant.js';
import { computeNotice } from './notice.js';

const clock = fc
  .integer({ min: 0, max: 1439 })
  .map((minutes) => `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`);
/** Two clock times, the earlier first; outside the skipped hour, in which an end may come before its start. */
const clockSpan = fc.tuple(clock, clock).map(([a, b]) => (a <= b ? { from: a, to: b } : { from: b, to: a }));
const weekdays = fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1 });
/** February to April and October to December 2027: both changes of clocks. */
const dayMs = 86_400_000;
const dateFrom = (start: string) =>
  fc.integer({ min: 0, max: 60 }).map((days) => new Date(Date.parse(start) + days * dayMs).toISOString().slice(0, 10));
const date = fc.oneof(dateFrom('2027-02-15'), dateFrom('2027-10-15'));
const closure = fc.oneof(
  date,
  fc.tuple(date, clockSpan).map(([on, { from, to }]) => ({ date: on, from, to })),
);
const window = fc.record({ label: fc.constantFrom('a', 'b'), span: clockSpan, days: fc.option(weekdays) });
const windowRule = window.map(({ label, span, days }) => ({ label, start: span.from, end: span.to, days }));
const now = fc.tuple(date, fc.integer({ min: 0, max: dayMs - 1 })).map(([on, ms]) => Date.parse(on) + ms);

const input: fc.Arbitrary<NoticeInput> = fc.record({
  zone: fc.constantFrom(
    'America/New_York',
    'America/Chicago',
    'America/Denver',
    'America/Los_Angeles',
    'America/Phoenix',
  ),
  now: now.map((ms) => new Date(ms).toISOString()),
  workingDays: weekdays,
  closures: fc.array(closure, { maxLength: 30 }),
  cutoff: clock,
  workingDaysAhead: fc.integer({ min: 0, max: 5 }),
  horizonWorkingDays: fc.integer({ min: 1, max: 15 }),
  windows: fc.array(windowRule, { maxLength: 4 }),
});

/** Day of the week of a plain date by the platform's own calendar, ISO numbers. */
const weekdayOf = (on: string) => new Date(`${on}T12:00:00Z`).getUTCDay() || 7;
/** What a wall clock shows, by ICU's formatter, which is not the arithmetic under test. */
const wallClock = (instant: string, timeZone: string) =>
  new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'short' }).format(new Date(instant));

describe('any notice', () => {
  it('counts for the earliest working day whose cut-off has not passed', () => {
    fc.assert(
      fc.property(input, (given) => {
        const answer = computeNotice(given);
        const today = localDateOf(new Date(given.now), given.zone);
        expect(Date.parse(answer.cutoffAt)).toBeGreaterThanOrEqual(Date.parse(given.now));
        expect(answer.countsForDate >= today).toBe(true);
        expect(
          given.workingDaysAhead === 0
            ? answer.firstDate === answer.countsForDate
            : answer.firstDate > answer.countsForDate,
        ).toBe(true);
        const atCutoff = computeNotice({ ...given, now: answer.cutoffAt });
        expect(atCutoff).toEqual(answer);
        const after = new Date(Date.parse(answer.cutoffAt) + 1).toISOString();
        expect(computeNotice({ ...given, now: after }).countsForDate > answer.countsForDate).toBe(true);
      }),
    );
  });

  it('never lists a window on a day off, on a closure, outside its days or outside the open days', () => {
    fc.assert(
      fc.property(input, (given) => {
        const { windows, firstDate, lastDate } = computeNotice(given);
        for (const { date: on, label, startAt, endAt } of windows) {
          expect(on >= firstDate && on <= lastDate).toBe(true);
          expect(given.workingDays).toContain(weekdayOf(on));
          expect(given.closures).not.toContain(on);
          const isDay = (days?: number[] | null) => !days?.length || days.includes(weekdayOf(on));
          expect(given.windows?.some((rule) => rule.label === label && isDay(rule.days))).toBe(true);
          for (const closed of given.closures ?? []) {
            if (typeof closed === 'string' || closed.date !== on || closed.from === closed.to) continue;
            const startsAfter = wallClock(startAt, given.zone) >= `${on} ${closed.to}`;
            const endsBefore = wallClock(endAt, given.zone) <= `${on} ${closed.from}`;
            expect(startsAfter || endsBefore || isInSkippedHour(on)).toBe(true);
          }
        }
      }),
    );
  });

  it('lists by date, and opens exactly the working days of the horizon', () => {
    fc.assert(
      fc.property(input, (given) => {
        const everyDay = computeNotice({
          ...given,
          windows: [{ label: 'noon', start: '12:00', end: '12:00' }],
          closures: dayClosures(given),
        });
        expect(everyDay.windows).toHaveLength(given.horizonWorkingDays);
        expect(everyDay.windows[0]?.date).toBe(everyDay.firstDate);
        expect(everyDay.windows.at(-1)?.date).toBe(everyDay.lastDate);
        const dates = computeNotice(given).windows.map(({ date: on }) => on);
        expect(dates).toEqual([...dates].sort());
      }),
    );
  });

  it('never moves back as time goes on', () => {
    fc.assert(
      fc.property(input, fc.integer({ min: 0, max: 20 * dayMs }), (given, laterMs) => {
        const before = computeNotice(given);
        const after = computeNotice({ ...given, now: new Date(Date.parse(given.now) + laterMs).toISOString() });
        for (const key of ['countsForDate', 'firstDate', 'lastDate', 'cutoffAt'] as const)
          expect(after[key] >= before[key]).toBe(true);
      }),
    );
  });
});

describe('the widest notice', () => {
  it('answers 20 windows a day over 260 days with the wall clock right on each (ICU formatter)', () => {
    const windows = Array.from({ length: 20 }, (_, index) => ({ label: `w${index}`, start: '08:15', end: '16:45' }));
    const workingDays = [1, 2, 3, 4, 5, 6, 7];
    const zone = 'America/Chicago';
    const given = {
      zone,
      now: '2027-01-04T15:00:00Z',
      workingDays,
      cutoff: '15:00',
      workingDaysAhead: 260,
      horizonWorkingDays: 260,
      windows,
    };
    const answer = computeNotice(given);
    expect(answer.windows).toHaveLength(5200);
    for (const { date: on, startAt, endAt } of answer.windows.filter((_, index) => index % 20 === 0)) {
      expect(wallClock(startAt, zone)).toBe(`${on} 08:15`);
      expect(wallClock(endAt, zone)).toBe(`${on} 16:45`);
    }
  });
});

const dayClosures = (given: NoticeInput) => (given.closures ?? []).filter((closed) => typeof closed === 'string');
/** On this day times of the skipped hour read an hour later than they were given. */
const isInSkippedHour = (on: string) => on === '2027-03-14';
