import { describe, expect, it } from 'vitest';
import { noticeAnswer, noticeInput } from './notice.contract.js';

const window = { label: 'early', start: '08:00', end: '10:00', days: [1, 2, 3, 4] };
const good = {
  zone: 'America/Denver',
  now: '2027-03-12T22:30:00Z',
  workingDays: [1, 2, 3, 4, 5],
  closures: ['2027-03-15', { date: '2027-03-19', from: '11:00', to: '17:00' }],
  cutoff: '15:00',
  workingDaysAhead: 1,
  horizonWorkingDays: 20,
  windows: [window],
};

/** The fields that a body is refused for; empty when it is taken. */
function refusedFields(change: Record<string, unknown>): string[] {
  const parsed = noticeInput.safeParse({ ...good, ...change });
  return parsed.success ? [] : [...new Set(parsed.error.issues.map((issue) => issue.path.join('.')))];
}

describe('what the notice takes (the preamble and section 5 of the calculations)', () => {
  it('takes the published example, and an offset for Z', () => {
    expect(refusedFields({})).toEqual([]);
    expect(refusedFields({ now: '2027-03-12T15:30:00-07:00' })).toEqual([]);
  });

  it('takes null for absent, empty lists, equal ends and the limits themselves', () => {
    expect(refusedFields({ closures: null, windows: null })).toEqual([]);
    expect(refusedFields({ closures: undefined, windows: undefined })).toEqual([]);
    expect(refusedFields({ windows: [{ ...window, end: '08:00', days: null }] })).toEqual([]);
    expect(refusedFields({ closures: [{ date: '2027-03-19', from: '11:00', to: '11:00' }] })).toEqual([]);
    expect(refusedFields({ workingDaysAhead: 260, horizonWorkingDays: 260 })).toEqual([]);
    expect(refusedFields({ windows: Array.from({ length: 20 }, () => window) })).toEqual([]);
  });

  it.each([
    ['zone', { zone: 'America/Nowhere' }],
    ['now', { now: '2027-02-30T12:00:00Z' }],
    ['now', { now: '2027-03-12T22:30:00' }],
    ['workingDays', { workingDays: undefined }],
    ['workingDays', { workingDays: null }],
    ['workingDays', { workingDays: [] }],
    ['workingDays.0', { workingDays: [0] }],
    ['workingDays.1', { workingDays: [1, 8] }],
    ['closures.0', { closures: ['2027-02-29'] }],
    ['closures.0', { closures: [{ date: '2027-03-19', from: '11:00' }] }],
    ['closures.1.to', { closures: ['2027-03-15', { date: '2027-03-19', from: '11:00', to: '10:59' }] }],
    ['cutoff', { cutoff: '24:00' }],
    ['cutoff', { cutoff: '3 pm' }],
    ['workingDaysAhead', { workingDaysAhead: 261 }],
    ['workingDaysAhead', { workingDaysAhead: -1 }],
    ['workingDaysAhead', { workingDaysAhead: 0.5 }],
    ['workingDaysAhead', { workingDaysAhead: Number.NaN }],
    ['horizonWorkingDays', { horizonWorkingDays: 261 }],
    ['horizonWorkingDays', { horizonWorkingDays: 0 }],
    ['horizonWorkingDays', { horizonWorkingDays: Number.POSITIVE_INFINITY }],
    ['windows', { windows: Array.from({ length: 21 }, () => window) }],
    ['windows.0.end', { windows: [{ ...window, end: '07:59' }] }],
    ['windows.0.days.0', { windows: [{ ...window, days: [9] }] }],
    ['windows.0', { windows: [{ ...window, room: 3 }] }],
    ['', { horizon: 20 }],
  ])('refuses at "%s": %j', (field, change) => {
    expect(refusedFields(change)).toEqual([field]);
  });
});

describe('what the notice answers', () => {
  it('has dates and instants in Z', () => {
    const at = '2027-03-17T14:00:00.000Z';
    const days = { countsForDate: '2027-03-16', firstDate: '2027-03-17', lastDate: '2027-04-13', cutoffAt: at };
    const windows = [{ date: '2027-03-17', label: 'early', startAt: at, endAt: at }];
    expect(noticeAnswer.safeParse({ ...days, windows }).success).toBe(true);
    expect(noticeAnswer.safeParse({ ...days, windows: [{ date: '2027-03-17' }] }).success).toBe(false);
  });
});
