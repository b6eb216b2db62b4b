import { describe, expect, it } from 'vitest';
import { whyNotByTime } from './why-not.js';

const now = new Date('2027-03-02T16:30:00Z');
const openDays = { firstDate: '2027-03-03', lastDate: '2027-03-18' };
const window = (date: string, startAt: string, isClosed = false) => ({ date, startAt, isClosed });

describe('why a window cannot be asked for', () => {
  it.each([
    ['takeable', window('2027-03-03', '2027-03-03T14:30:00Z'), null],
    ['takeable on the last day', window('2027-03-18', '2027-03-18T20:30:00Z'), null],
    ['begun this minute', window('2027-03-02', '2027-03-02T16:30:00Z'), 'past'],
    ['yesterday', window('2027-03-01', '2027-03-01T14:30:00Z'), 'past'],
    ['later today', window('2027-03-02', '2027-03-02T16:30:01Z'), 'cut-off-passed'],
    ['the day after the horizon', window('2027-03-22', '2027-03-22T13:30:00Z'), 'beyond-horizon'],
    ['closed, which is told first', window('2027-03-01', '2027-03-01T14:30:00Z', true), 'closed'],
  ] as const)('%s', (_, given, why) => {
    expect(whyNotByTime(given, openDays, now)).toBe(why);
  });

  it('binds the desk by no cut-off and no horizon, but by the past and by closures', () => {
    expect(whyNotByTime(window('2027-03-02', '2027-03-02T20:30:00Z'), null, now)).toBeNull();
    expect(whyNotByTime(window('2027-09-22', '2027-09-22T13:30:00Z'), null, now)).toBeNull();
    expect(whyNotByTime(window('2027-03-02', '2027-03-02T16:00:00Z'), null, now)).toBe('past');
    expect(whyNotByTime(window('2027-03-03', '2027-03-03T14:30:00Z', true), null, now)).toBe('closed');
  });
});
