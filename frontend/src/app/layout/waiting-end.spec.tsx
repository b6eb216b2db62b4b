import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import { screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { calendarOf, idOf, sampleNow, visitOf, zone } from '../../features/visits/testing/visits.sample';
import { personOf } from '../../lib/testing/people';
import { renderPage } from '../../lib/testing/render-page';
import { stubApi } from '../../lib/testing/stub-api';
import { WaitingEnd } from './waiting-end';

const upBy = '2026-04-15T13:00:00Z';

function waitingOf(lot: number, parts: Partial<WaitingItem>): WaitingItem {
  return {
    ...{ kind: 'no-window', isOnYou: true, waitsOn: 'Odderly Homes', lotId: idOf(lot), lotNumber: String(lot) },
    ...{ tractName: 'Sorrel Bench', visitId: null, count: 1, by: null, zone, isPastTime: false },
    ...parts,
  };
}
const notUp = (lot: number, parts: Partial<WaitingItem> = {}): WaitingItem =>
  waitingOf(lot, { kind: 'test-not-up', isOnYou: false, waitsOn: 'Dunlatch Plumbing', count: 2, by: upBy, ...parts });

async function show(items: WaitingItem[], calendar = calendarOf([])): Promise<string[]> {
  stubApi({ 'GET /api/waiting': () => ({ data: { items } }) });
  const { container } = renderPage(<WaitingEnd calendar={calendar} />, { me: personOf() });
  await vi.waitFor(() => expect(container.querySelector('.st')).not.toBeNull());
  return [container.querySelector('.st'), ...container.querySelectorAll('.xs')].map((one) => one?.textContent ?? '');
}

beforeEach(() => {
  vi.useFakeTimers({ now: new Date(sampleNow), toFake: ['Date'] });
});
afterEach(() => vi.useRealTimers());

// The words are those of the mockups: calendar of a builder, day board of the desk, calendar on a phone.
describe('the right end of the ribbon', () => {
  it('tells a builder what waits on them, lots of a kind in one line, then on whom they wait', async () => {
    const said = await show([waitingOf(18, {}), waitingOf(20, {}), waitingOf(23, {}), notUp(6), notUp(17)]);
    expect(said).toEqual(['3 wait on you', 'Lots 18, 20, 23: no window', 'Dunlatch: 6, 17, by 7:00 am']);
    expect(screen.getByRole('link', { name: /no window/ })).toHaveAttribute(
      'href',
      `/calendar?request=${[18, 20, 23].map(idOf).join(',')}`,
    );
  });

  it('says how many are not up where nothing waits on the reader', async () => {
    expect(await show([notUp(6), notUp(17)])).toEqual(['2 not up', 'Dunlatch: 6, 17, by 7:00 am']);
  });

  it('does not tell a test of next week as not up', async () => {
    const said = await show([notUp(6), notUp(17, { by: '2026-04-22T13:00:00Z' })]);
    expect(said).toEqual(['1 not up', 'Dunlatch: 6, by 7:00 am']);
  });

  it('tells a plumber which tests to put up, and by when', async () => {
    const own = { isOnYou: true, waitsOn: 'Dunlatch Plumbing' };
    const fix = waitingOf(14, { kind: 'correction-to-fix', count: 2 });
    const said = await show([notUp(6, own), notUp(17, { ...own, by: '2026-04-16T13:00:00Z' }), fix]);
    expect(said).toEqual(['4 wait on you', 'Lots 6, 17 not up, by 7:00 am', 'Lot 14: 2 corrections']);
  });

  it('tells the desk of its requests: what is needed by when, and since when the oldest waits', async () => {
    const requests = [5, 13, 60].map((lot) => waitingOf(lot, { kind: 'request-to-place', visitId: idOf(lot) }));
    const visits = [
      visitOf(5, { state: 'requested', neededBy: '2026-04-16T12:00:00Z', requestedAt: '2026-04-14T19:12:00Z' }, null),
      visitOf(13, { state: 'requested', requestedAt: '2026-04-14T15:05:00Z' }, null),
      visitOf(60, { state: 'requested', requestedAt: '2026-04-14T17:40:00Z' }, null),
    ];
    const said = await show(requests, calendarOf(visits));
    expect(said).toEqual(['3 requests wait on you', '1 needed by Thu 6:00 am', 'oldest from 9:05 am']);
  });

  it('names a few lots and counts the rest', async () => {
    const said = await show([1, 2, 3, 4, 5].map((lot) => waitingOf(lot, {})));
    expect(said[1]).toBe('Lots 1, 2, 3 +2: no window');
  });
});
