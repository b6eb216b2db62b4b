import { describe, expect, it } from 'vitest';
import { asFilter, filterCounts, filtered, lotRows, stateCounts, usualStage } from './lots-model';
import { lotOf, waitingOf } from './testing/lot-fixtures';

// The order and the first filter: interface guide, section 3, "waits on you: first filter of lists", "sorted you first".
const lots = [
  lotOf('9', {}, 'clear'),
  lotOf('14', { openCorrections: 2 }, 'corrections-open'),
  lotOf('10', {}, 'not-tested'),
  lotOf('2', {}, 'under-test'),
  lotOf('18', {}, 'under-test'),
];
const waiting = [
  waitingOf('18'),
  waitingOf('14', { kind: 'correction-to-fix', isOnYou: false, waitsOn: 'Dunlatch Plumbing', count: 2 }),
  waitingOf('14', { kind: 'no-window', isOnYou: false }),
];

describe('the rows of the lots', () => {
  const rows = lotRows(lots, 'rough-in', waiting);

  it('stand you first, then others, then by what presses, then by number as a number', () => {
    expect(rows.map(({ lot }) => lot.number)).toEqual(['18', '14', '2', '10', '9']);
  });

  it('tell the most pressing thing of each lot only', () => {
    expect(rows[1]?.waiting?.kind).toBe('correction-to-fix');
  });

  it('show the state of the stage asked for', () => {
    expect(lotRows(lots, 'groundwork', []).every(({ state }) => state === 'clear')).toBe(true);
    expect(usualStage(lots)).toBe('rough-in');
  });

  it('leave out of the open ones what is clear or not begun, unless it waits', () => {
    expect(filtered(rows, 'open').map(({ lot }) => lot.number)).toEqual(['18', '14', '2']);
    expect(filtered(rows, 'all')).toHaveLength(5);
  });

  it('offer each filter with what it would show, none that shows nothing', () => {
    const counts = filterCounts(rows);
    expect(counts[0]).toEqual({ filter: 'you', count: 1 });
    expect(counts[1]).toEqual({ filter: 'on:Dunlatch Plumbing', count: 1 });
    counts.forEach(({ filter, count }) => expect(filtered(rows, filter)).toHaveLength(count));
    expect(counts.map(({ filter }) => filter)).not.toContain('awaiting-visit');
  });

  it('count every state for the legend', () => {
    expect(stateCounts(rows).reduce((sum, { count }) => sum + count, 0)).toBe(5);
  });

  it('take an address nobody made for the usual filter', () => {
    expect(asFilter('nonsense')).toBe('open');
    expect(asFilter('on:Ruben')).toBe('on:Ruben');
  });
});
