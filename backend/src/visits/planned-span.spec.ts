import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type BusySpan, earliestGap, firstFreeSeat, freePlaces, seatAll, type Span } from './planned-span.js';

const at = (clock: string) => new Date(`2027-03-03T${clock}:00Z`);
const span = (from: string, to: string): Span => ({ startAt: at(from), endAt: at(to) });
const busy = (inspectorId: string, from: string, to: string): BusySpan => ({ inspectorId, ...span(from, to) });
const window = span('07:30', '09:00');
const ann = { id: 'ann', organizationIds: ['department'] };
const ben = { id: 'ben', organizationIds: ['department'] };

describe('the earliest gap', () => {
  it.each([
    ['nothing busy', [], ['07:30', '08:00']],
    ['one at the start', [span('07:30', '08:00')], ['08:00', '08:30']],
    ['one that began before the window', [span('07:00', '07:45')], ['07:45', '08:15']],
    ['a gap too short between two', [span('07:30', '08:00'), span('08:20', '08:40')], null],
    ['a gap just long enough', [span('07:30', '08:00'), span('08:30', '09:00')], ['08:00', '08:30']],
    ['a long one that hides a short one', [span('07:30', '08:30'), span('07:40', '07:50')], ['08:30', '09:00']],
    ['one after the window', [span('09:00', '09:30')], ['07:30', '08:00']],
    ['all of it', [span('07:00', '10:00')], null],
  ] as const)('%s', (_, taken, expected) => {
    expect(earliestGap(window, taken, 30)).toEqual(expected === null ? null : span(expected[0], expected[1]));
  });

  it('is none for a visit longer than the window, and the whole window for one just as long', () => {
    expect(earliestGap(window, [], 91)).toBeNull();
    expect(earliestGap(window, [], 90)).toEqual(window);
  });
});

describe('the first free inspector', () => {
  it('is the first of the order, else the next one', () => {
    expect(firstFreeSeat(window, [ann, ben], [], 30, [])?.inspectorId).toBe('ann');
    expect(firstFreeSeat(window, [ann, ben], [busy('ann', '07:00', '09:00')], 30, [])).toEqual({
      inspectorId: 'ben',
      planned: span('07:30', '08:00'),
    });
    expect(
      firstFreeSeat(window, [ann, ben], [busy('ann', '07:00', '09:00'), busy('ben', '08:00', '08:30')], 60, []),
    ).toBeNull();
  });

  it('never is one who belongs to the lot’s builder or plumber', () => {
    const partial = { id: 'ann', organizationIds: ['department', 'plumber'] };
    expect(firstFreeSeat(window, [partial, ben], [], 30, ['builder', 'plumber'])?.inspectorId).toBe('ben');
    expect(firstFreeSeat(window, [partial], [], 30, ['builder', null])?.inspectorId).toBe('ann');
    expect(firstFreeSeat(window, [partial], [], 30, ['builder', 'plumber'])).toBeNull();
  });

  it('is found for several lots one after the other, or for none of them', () => {
    const six = Array.from({ length: 6 }, () => ['builder', 'plumber']);
    expect(seatAll(window, [ann, ben], [], 30, six)?.map(({ inspectorId }) => inspectorId)).toEqual([
      'ann',
      'ann',
      'ann',
      'ben',
      'ben',
      'ben',
    ]);
    expect(seatAll(window, [ann, ben], [], 30, [...six, ['builder', null]])).toBeNull();
  });
});

describe('free places', () => {
  it('are the smallest, never above the room', () => {
    expect(freePlaces(3, [], 2)).toEqual([1, 2]);
    expect(freePlaces(3, [1, 3], 1)).toEqual([2]);
    expect(freePlaces(3, [1, 3], 2)).toBeNull();
    expect(freePlaces(2, [1, 2, 3], 1)).toBeNull();
  });
});

describe('whatever is busy already', () => {
  const minute = fc.integer({ min: 0, max: 120 });
  const taken = fc.array(fc.tuple(minute, fc.integer({ min: 1, max: 40 })), { maxLength: 8 });
  const start = at('07:30').getTime();
  const toSpan = ([from, length]: [number, number]): Span => ({
    startAt: new Date(start + (from - 15) * 60_000),
    endAt: new Date(start + (from - 15 + length) * 60_000),
  });

  it('a gap lies inside the window, touches nothing, and no earlier minute would do', () => {
    fc.assert(
      fc.property(taken, fc.integer({ min: 1, max: 90 }), (given, minutes) => {
        const spans = given.map(toSpan);
        const free = (fromMs: number) =>
          fromMs + minutes * 60_000 <= window.endAt.getTime() &&
          spans.every((each) => each.endAt.getTime() <= fromMs || each.startAt.getTime() >= fromMs + minutes * 60_000);
        const byTrying = Array.from({ length: 91 }, (_, m) => start + m * 60_000).find(free);
        expect(earliestGap(window, spans, minutes)?.startAt.getTime()).toBe(byTrying);
      }),
    );
  });
});
