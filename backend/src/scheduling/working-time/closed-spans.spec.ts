import { describe, expect, it } from 'vitest';
import { closedSpansOf, isClosedDuring } from './closed-spans.js';

const zone = 'America/Denver';

describe('what is closed on a date', () => {
  it('answers spans and whole days as instants; the day clocks go forward has 23 hours (IANA tz)', () => {
    const closures = ['2027-03-14', { date: '2027-03-14', from: '11:00', to: '17:00' }, '2027-03-16'];
    expect(closedSpansOf({ zone, closures }, '2027-03-14')).toEqual([
      { from: null, to: null, startAt: '2027-03-14T07:00:00.000Z', endAt: '2027-03-15T06:00:00.000Z' },
      { from: '11:00', to: '17:00', startAt: '2027-03-14T17:00:00.000Z', endAt: '2027-03-14T23:00:00.000Z' },
    ]);
    expect(closedSpansOf({ zone, closures }, '2027-03-15')).toEqual([]);
    expect(closedSpansOf({ zone }, '2027-03-15')).toEqual([]);
  });

  it('an empty span closes nothing', () => {
    const closures = [{ date: '2027-03-15', from: '11:00', to: '11:00' }];
    expect(closedSpansOf({ zone, closures }, '2027-03-15')).toEqual([]);
  });
});

describe('a window beside a closed span from 11:00 to 17:00 (half-open, as the calculations define)', () => {
  const closed = [{ from: '11:00', to: '17:00' }];

  it.each([
    ['09:00', '11:00', false],
    ['09:00', '11:01', true],
    ['12:00', '13:00', true],
    ['16:59', '18:00', true],
    ['17:00', '18:00', false],
    ['08:00', '18:00', true],
    ['11:00', '11:00', true],
    ['17:00', '17:00', false],
  ])('%s to %s is closed: %s', (start, end, isClosed) => {
    expect(isClosedDuring({ start, end }, closed)).toBe(isClosed);
  });
});
