import { noticeAnswer, noticeInput, type NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';
import { describe, expect, it } from 'vitest';
import { departmentHolidays } from './federal-holidays.js';
import { computeNotice } from './notice.js';

const early = { label: 'early', start: '08:00', end: '10:00', days: [1, 2, 3, 4] };
/** The example of the calculations. Friday 2027-03-12 15:30 in Denver, half an hour past the cut-off. */
const example: NoticeInput = {
  zone: 'America/Denver',
  now: '2027-03-12T22:30:00Z',
  workingDays: [1, 2, 3, 4, 5],
  closures: ['2027-03-15', { date: '2027-03-19', from: '11:00', to: '17:00' }],
  cutoff: '15:00',
  workingDaysAhead: 1,
  horizonWorkingDays: 20,
  windows: [early],
};
const notice = (change: Partial<NoticeInput>) => computeNotice({ ...example, ...change });

describe('the published example (dates counted on a printed calendar of 2027, offsets from IANA tz)', () => {
  it('counts for Tuesday, because Monday is closed, and opens on Wednesday', () => {
    const answer = computeNotice(example);
    expect(answer).toMatchObject({
      countsForDate: '2027-03-16',
      firstDate: '2027-03-17',
      lastDate: '2027-04-13',
      cutoffAt: '2027-03-16T21:00:00.000Z',
    });
    expect(answer.windows[0]).toEqual({
      date: '2027-03-17',
      label: 'early',
      startAt: '2027-03-17T14:00:00.000Z',
      endAt: '2027-03-17T16:00:00.000Z',
    });
    expect(answer.windows).toHaveLength(16);
  });

  it('passes its own contract', () => {
    expect(noticeInput.parse(example)).toEqual(example);
    expect(noticeAnswer.parse(computeNotice(example))).toEqual(computeNotice(example));
  });
});

describe('the cut-off', () => {
  it.each([
    ['2027-03-12T21:59:59.999Z', '2027-03-12'],
    ['2027-03-12T22:00:00Z', '2027-03-12'],
    ['2027-03-12T22:00:00.001Z', '2027-03-16'],
    ['2027-03-13T16:00:00Z', '2027-03-16'],
    ['2027-03-15T16:00:00Z', '2027-03-16'],
    ['2027-03-16T05:59:59Z', '2027-03-16'],
    ['2027-03-16T21:00:00Z', '2027-03-16'],
    ['2027-03-16T21:00:01Z', '2027-03-17'],
  ])('a request at %s counts for %s', (now, date) => {
    expect(notice({ now }).countsForDate).toBe(date);
  });

  it.each([
    ['America/New_York', '19:00', '20:00'],
    ['America/Chicago', '20:00', '21:00'],
    ['America/Denver', '21:00', '22:00'],
    ['America/Los_Angeles', '22:00', '23:00'],
    ['America/Phoenix', '22:00', '22:00'],
  ])('at 15:00 in %s is %s Z in summer, %s Z in winter (IANA tz)', (zone, summer, winter) => {
    const cutoffOn = (date: string) => notice({ zone, now: `${date}T16:00:00Z`, closures: [] }).cutoffAt;
    expect(cutoffOn('2027-03-12')).toBe(`2027-03-12T${winter}:00.000Z`);
    expect(cutoffOn('2027-03-16')).toBe(`2027-03-16T${summer}:00.000Z`);
    expect(cutoffOn('2027-11-05')).toBe(`2027-11-05T${summer}:00.000Z`);
    expect(cutoffOn('2027-11-08')).toBe(`2027-11-08T${winter}:00.000Z`);
  });

  it('in the repeated hour means the first time, in the skipped hour the offset before (RFC 5545 §3.3.5)', () => {
    const night = { zone: 'America/New_York', workingDays: [1, 2, 3, 4, 5, 6, 7], closures: null };
    const back = (now: string) => notice({ ...night, cutoff: '01:30', now }).countsForDate;
    expect(back('2027-11-07T05:30:00Z')).toBe('2027-11-07');
    expect(back('2027-11-07T06:10:00Z')).toBe('2027-11-08');
    expect(notice({ ...night, cutoff: '02:30', now: '2027-03-14T07:30:00Z' })).toMatchObject({
      countsForDate: '2027-03-14',
      cutoffAt: '2027-03-14T07:30:00.000Z',
    });
  });
});

describe('days ahead and horizon', () => {
  it('0 days ahead opens the day itself, with windows already begun; a horizon of 1 is that day alone', () => {
    const answer = notice({ now: '2027-03-17T15:00:00Z', workingDaysAhead: 0, horizonWorkingDays: 1 });
    expect(answer).toMatchObject({ countsForDate: '2027-03-17', firstDate: '2027-03-17', lastDate: '2027-03-17' });
    expect(answer.windows.map(({ startAt }) => startAt)).toEqual(['2027-03-17T14:00:00.000Z']);
  });

  it('leaves out the afternoon of the half-closed Friday and no other', () => {
    const windows = [
      { label: 'am', start: '09:00', end: '11:00' },
      { label: 'pm', start: '13:00', end: '15:00' },
    ];
    const friday = notice({ windows }).windows.filter(({ date }) => date === '2027-03-19');
    expect(friday.map(({ label }) => label)).toEqual(['am']);
  });

  it('steps over the federal holidays at the turn of 2027 (5 U.S.C. 6103: 12/24 and 12/31 observed)', () => {
    const closures = departmentHolidays(2027, 2028).map(({ date }) => date);
    const answer = notice({ now: '2027-12-23T23:00:00Z', closures, horizonWorkingDays: 5 });
    expect(answer).toMatchObject({ countsForDate: '2027-12-27', firstDate: '2027-12-28', lastDate: '2028-01-04' });
  });
});
