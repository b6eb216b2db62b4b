import { describe, expect, it } from 'vitest';
import { agendaOf } from './agenda-model';
import { calendarDays, hoursOn, shortNames, shownDates, shownHours, windowSays } from './calendar-model';
import { calendarOf, idOf, visitOf, windowOf, zone } from './testing/visits.sample';

describe('the calendar', () => {
  it('shows Monday to Friday, and a Saturday only where somebody comes', () => {
    expect(shownDates('2026-04-15', 1, calendarOf([]))).toHaveLength(5);
    const saturday = visitOf(3, { window: windowOf('2026-04-18', 'mid') });
    expect(shownDates('2026-04-15', 1, calendarOf([saturday]))).toContain('2026-04-18');
  });

  it('draws an instant of another zone at the same height', () => {
    // 8:00 in Los Angeles is 9:00 in Denver (IANA: both keep daylight time in April).
    expect(hoursOn('2026-04-15', '2026-04-15T15:00:00Z', 'America/Denver')).toBe(9);
    expect(hoursOn('2026-04-15', '2026-04-16T06:30:00Z', 'America/Denver')).toBe(24.5);
  });

  it('keeps visits that went away off the days, and every hour that is used on them', () => {
    const late = visitOf(4, { window: windowOf('2026-04-15', 'late') }, '17:50');
    const calendar = calendarOf([visitOf(1, { state: 'withdrawn' }), late]);
    const days = calendarDays(calendar, ['2026-04-15'], null);
    expect(days[0]?.cells[0]?.visits.map(({ id }) => id)).toEqual([idOf(4)]);
    expect(shownHours(days, zone)).toEqual({ from: 7, to: 19 });
  });

  it('says of a window that it is over, full, closed or how much room it has', () => {
    const now = Date.parse('2026-04-15T15:30:00Z');
    const window = {
      ...windowOf('2026-04-16', 'mid'),
      room: 6,
      roomLeft: 4,
      up: null,
      isTakeable: true,
      cutoffAt: null,
    };
    expect(windowSays({ ...window, ...windowOf('2026-04-15', 'mid') }, now)).toBe('over');
    expect(windowSays({ ...window, roomLeft: 0, isTakeable: false }, now)).toBe('full');
    expect(windowSays({ ...window, isTakeable: false }, now)).toBe('shut');
    expect(windowSays(window, now)).toBe('room');
  });

  it('names departments without the words all of them end in', () => {
    expect(shortNames(['Tallowmere Building Department', 'Vennick Building Department'])).toEqual([
      'Tallowmere',
      'Vennick',
    ]);
    expect(shortNames(['Tallowmere Building Department'])).toEqual(['Tallowmere Building Department']);
    expect(shortNames(['Department', 'Vennick Department'])).toEqual(['Department', 'Vennick Department']);
  });
});

describe('the agenda of a day', () => {
  it('keeps windows that can be taken or hold a visit, in order, and gives a stray visit a bracket of its own', () => {
    const stray = visitOf(8, { window: { ...windowOf('2026-04-16', 'early'), label: 'gone' } });
    const calendar = calendarOf([visitOf(2, { window: windowOf('2026-04-16', 'late') }), stray]);
    const [day] = calendarDays(calendar, ['2026-04-16'], null);
    if (day === undefined) throw new Error('no day');
    const { windows } = agendaOf(day, new Date('2026-04-14T20:00:00Z'));
    expect(windows.map(({ says, visits }) => [says, visits.length])).toEqual([
      ['over', 1],
      ['room', 0],
      ['room', 0],
      ['room', 1],
    ]);
  });
});
