import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { noAnswer, refusal, stubApi } from '../../../lib/testing/stub-api';
import {
  allUp,
  calendarOf,
  idOf,
  lotOf,
  offerOf,
  offersOf,
  sampleNow,
  visitOf,
  windowOf,
} from '../testing/visits.sample';
import { CalendarPage } from './calendar-page';

const me = personOf();
const visits = [
  visitOf(17, { moves: ['withdraw', 'move'] }),
  visitOf(22, { state: 'ready', systemsUp: allUp }, '10:12'),
  visitOf(25, { window: windowOf('2026-04-17', 'mid') }, '09:30'),
];
const reads = {
  'GET /api/calendar': () => ({ data: calendarOf(visits) }),
  'GET /api/waiting': () => ({ data: { items: [] } }),
  [`GET /api/lots/${idOf(18)}`]: () => ({ data: lotOf(18) }),
  [`GET /api/lots/${idOf(19)}`]: () => ({ data: lotOf(19) }),
  [`GET /api/lots/${idOf(14)}`]: () => ({ data: lotOf(14, { openCorrections: 1 }) }),
  [`GET /api/visits/${idOf(17)}`]: () => ({ data: visits[0] }),
  'POST /api/visits/offers': () => ({ data: offersOf() }),
};
const twoLots = `/calendar?request=${idOf(18)},${idOf(19)}`;

beforeEach(() => {
  vi.useFakeTimers({ now: new Date(sampleNow), toFake: ['Date'] });
});
afterEach(() => {
  vi.useRealTimers();
});

describe('the calendar’s grid', () => {
  it('reads day, lane, then visits in order of time, with what is missing', async () => {
    stubApi(reads);
    renderPage(<CalendarPage />, { me, at: '/calendar' });
    const day = await screen.findByRole('row', { name: 'Wed, Apr 15' });
    const lane = within(day).getByRole('gridcell', { name: 'Tallowmere Building Department, 2 visits' });
    expect(
      within(lane)
        .getAllByRole('button')
        .map((slip) => slip.getAttribute('aria-label')),
    ).toEqual([
      'Lot 17, Sorrel Bench, water not up, 9:15 am, Noor Haverty',
      'Lot 22, Sorrel Bench, test up, 10:12 am, Noor Haverty',
    ]);
    expect(within(lane).getByText('9:00–11:00 am, requests closed')).toBeInTheDocument();
  });

  it('is walked by arrow keys, one slip in the tab order', async () => {
    stubApi(reads);
    renderPage(<CalendarPage />, { me, at: '/calendar' });
    const first = await screen.findByRole('button', { name: /^Lot 17/ });
    const second = screen.getByRole('button', { name: /^Lot 22/ });
    expect([first.tabIndex, second.tabIndex]).toEqual([0, -1]);
    first.focus();
    await userEvent.keyboard('{ArrowDown}');
    expect(second).toHaveFocus();
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('button', { name: /^Lot 25/ })).toHaveFocus();
    await userEvent.keyboard('{Enter}');
    expect(await screen.findByRole('heading', { name: 'Visit' })).toBeInTheDocument();
  });

  it('stays, with its time, when it cannot be read anew', async () => {
    let asked = 0;
    stubApi({
      ...reads,
      'GET /api/calendar': () => (asked++ === 0 ? reads['GET /api/calendar']() : noAnswer('ERR_NETWORK')),
    });
    const { queryClient } = renderPage(<CalendarPage />, { me, at: '/calendar' });
    await screen.findByRole('button', { name: /^Lot 17/ });
    await queryClient.refetchQueries({ queryKey: ['calendar'] });
    expect(await screen.findByText(/No signal: shown as it was at/)).toHaveTextContent('1:48 pm');
    expect(screen.getByRole('button', { name: /^Lot 17/ })).toBeInTheDocument();
  });

  it('says what to do before there is anything', async () => {
    stubApi({ ...reads, 'GET /api/calendar': () => ({ data: { ...calendarOf([]), lanes: [] } }) });
    renderPage(<CalendarPage />, { me, at: '/calendar' });
    expect(await screen.findByRole('link', { name: 'Add lots' })).toHaveAttribute('href', '/lots/new');
  });
});

describe('a request', () => {
  it('names what it books and sends it for all lots', async () => {
    const sent = stubApi({
      ...reads,
      'POST /api/visits': () => ({ status: 201, data: { visits: [visitOf(18), visitOf(19)] } }),
    });
    renderPage(<CalendarPage />, { me, at: twoLots });
    await waitFor(() => expect(document.body).toHaveTextContent('Thu, Apr 16 closes today at 3:00 pm'));
    await userEvent.click(screen.getByRole('radio', { name: /Thu, Apr 16, 1:30–3:30 pm/ }));
    await userEvent.click(screen.getByRole('button', { name: 'Book 2 visits, Thu 1:30–3:30 pm' }));
    await waitFor(() => expect(sent.find(({ path }) => path === '/api/visits')).toBeDefined());
    const request = sent.find(({ path }) => path === '/api/visits');
    expect(request?.body).toEqual({
      lots: [{ lotId: idOf(18) }, { lotId: idOf(19) }],
      stageCode: 'rough-in',
      date: '2026-04-16',
      label: 'late',
    });
    expect(request?.headers['Idempotency-Key']).toBeTruthy();
    await waitFor(() => expect(screen.queryByRole('heading', { name: 'Request a window' })).not.toBeInTheDocument());
  });

  it('of a lot of two units goes out for the units chosen, at first all that have not passed', async () => {
    const units = [
      { number: 1, label: 'Unit A', geometry: null },
      { number: 2, label: 'Unit B', geometry: null },
      { number: 3, label: 'Unit C', geometry: null },
    ];
    const [stage] = lotOf(18).stages.map((one) => ({
      ...one,
      units: [
        { unitNumber: 1, state: 'put-back-due' as const },
        { unitNumber: 2, state: 'not-tested' as const },
        { unitNumber: 3, state: 'not-tested' as const },
      ],
    }));
    const sent = stubApi({
      ...reads,
      [`GET /api/lots/${idOf(18)}`]: () => ({ data: lotOf(18, { units, stages: stage === undefined ? [] : [stage] }) }),
      'POST /api/visits': () => ({ status: 201, data: { visits: [visitOf(18)] } }),
    });
    renderPage(<CalendarPage />, { me, at: `/calendar?request=${idOf(18)}` });
    const group = await screen.findByRole('group', { name: 'Lot 18, units of this visit' });
    expect(within(group).getByRole('button', { name: /Unit A, passed/ })).toHaveAttribute('aria-disabled', 'true');
    const unitB = within(group).getByRole('button', { name: 'Unit B' });
    const unitC = within(group).getByRole('button', { name: 'Unit C' });
    expect([unitB, unitC].map((chip) => chip.getAttribute('aria-pressed'))).toEqual(['true', 'true']);
    const asked = (): unknown[] => sent.filter(({ path }) => path === '/api/visits/offers').map(({ body }) => body);
    await waitFor(() =>
      expect(asked()).toEqual([{ lots: [{ lotId: idOf(18), unitNumbers: [2, 3] }], stageCode: 'rough-in' }]),
    );
    await userEvent.click(unitB);
    await userEvent.click(unitC);
    expect(screen.getByText(/choose a unit of it/)).toBeInTheDocument();
    expect(screen.getByRole('button', { name: /a lot stands in the way/ })).toBeInTheDocument();
    await userEvent.click(unitC);
    await userEvent.click(await screen.findByRole('button', { name: /^Book 1 visit, Thu/ }));
    await waitFor(() => expect(sent.find(({ path }) => path === '/api/visits')).toBeDefined());
    expect(sent.find(({ path }) => path === '/api/visits')?.body).toMatchObject({
      lots: [{ lotId: idOf(18), unitNumbers: [3] }],
    });
  });

  it('keeps the lots and offers the next best at once when the window has just filled', async () => {
    const best = offerOf('2026-04-17', 'mid');
    let tries = 0;
    const sent = stubApi({
      ...reads,
      'POST /api/visits': () =>
        tries++ === 0
          ? refusal('window-full', { params: { offers: [best] } })
          : { status: 201, data: { visits: [visitOf(18)] } },
    });
    renderPage(<CalendarPage />, { me, at: twoLots });
    await userEvent.click(await screen.findByRole('button', { name: /^Book 2 visits, Thu/ }));
    const taken = await screen.findByRole('alert');
    expect(taken).toHaveTextContent('That window has just filled');
    expect(screen.getByRole('button', { name: 'Take out Lot 18' })).toBeInTheDocument();
    expect(screen.getByRole('button', { name: /Book 2 visits/ })).toHaveAttribute('aria-disabled', 'true');
    await userEvent.click(within(taken).getByRole('button', { name: 'Book this' }));
    await waitFor(() => expect(sent.filter(({ path }) => path === '/api/visits')).toHaveLength(2));
    const bodies = sent.filter(({ path }) => path === '/api/visits');
    expect(bodies[1]?.body).toMatchObject({ date: '2026-04-17', label: 'mid' });
    expect(bodies[1]?.headers['Idempotency-Key']).not.toBe(bodies[0]?.headers['Idempotency-Key']);
  });

  it('sends nothing for a lot with a correction open, and says so', async () => {
    const sent = stubApi(reads);
    renderPage(<CalendarPage />, { me, at: `/calendar?request=${idOf(14)}` });
    expect(await screen.findByText(/1 open: fix first/)).toBeInTheDocument();
    const act = screen.getByRole('button', { name: /a lot stands in the way/ });
    await userEvent.click(act);
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
  });

  it('tells the windows refused with their reason', async () => {
    stubApi(reads);
    renderPage(<CalendarPage />, { me, at: twoLots });
    await userEvent.click(await screen.findByText('Why not the others?'));
    expect(screen.getByText('Requests are closed')).toBeInTheDocument();
    expect(screen.getByText('Not enough room for the lots chosen')).toBeInTheDocument();
  });

  it('only wishes where the desk places', async () => {
    stubApi({ ...reads, 'POST /api/visits/offers': () => ({ data: offersOf({ booking: 'desk' }) }) });
    renderPage(<CalendarPage />, { me, at: twoLots });
    expect(await screen.findByRole('button', { name: 'Request 2 visits, Thu 9:00–11:00 am' })).toBeInTheDocument();
  });
});

describe('one visit', () => {
  it('is withdrawn only after a question that names who is told', async () => {
    const sent = stubApi({
      ...reads,
      [`POST /api/visits/${idOf(17)}/withdraw`]: () => ({ data: { ...visitOf(17), state: 'withdrawn' } }),
    });
    renderPage(<CalendarPage />, { me, at: `/calendar?visit=${idOf(17)}` });
    await userEvent.click(await screen.findByRole('button', { name: 'Withdraw' }));
    const question = screen.getByRole('dialog', { name: /Withdraw lot 17, Wed, Apr 15, 9:00–11:00 am/ });
    expect(question).toHaveTextContent('Dunlatch Plumbing');
    await userEvent.selectOptions(within(question).getByLabelText('Reason'), 'plans-changed');
    await userEvent.click(within(question).getByRole('button', { name: 'Withdraw' }));
    await waitFor(() =>
      expect(sent.find(({ path }) => path.endsWith('/withdraw'))?.body).toEqual({
        expectedVersion: 3,
        reason: 'plans-changed',
      }),
    );
  });

  it('shows no act the server does not let the reader do', async () => {
    stubApi({ ...reads, [`GET /api/visits/${idOf(17)}`]: () => ({ data: visitOf(17) }) });
    renderPage(<CalendarPage />, { me, at: `/calendar?visit=${idOf(17)}` });
    expect(await screen.findByText('Nothing for you to do on this visit now.')).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Withdraw' })).not.toBeInTheDocument();
  });

  it('moves to another window that is on offer', async () => {
    const sent = stubApi({ ...reads, [`POST /api/visits/${idOf(17)}/move`]: () => ({ data: visitOf(17) }) });
    renderPage(<CalendarPage />, { me, at: `/calendar?visit=${idOf(17)}` });
    await userEvent.click(await screen.findByRole('button', { name: 'Move to another window' }));
    await userEvent.click(await screen.findByRole('radio', { name: /Fri, Apr 17/ }));
    await userEvent.click(screen.getByRole('button', { name: /^Move lot 17 to Fri, Apr 17/ }));
    await waitFor(() =>
      expect(sent.find(({ path }) => path.endsWith('/move'))?.body).toEqual({
        expectedVersion: 3,
        date: '2026-04-17',
        label: 'mid',
      }),
    );
  });
});

describe('on a phone', () => {
  it('dimensions the time left to the next cut-off, on the day it closes', async () => {
    const known = calendarOf(visits);
    const cutoffAt = '2026-04-14T21:00:00Z';
    const lanes = known.lanes.map((lane) => ({
      ...lane,
      days: lane.days.map((day) => ({
        ...day,
        windows: day.windows.map((window) => ({
          ...window,
          cutoffAt: day.date === '2026-04-16' ? cutoffAt : '2026-04-15T21:00:00Z',
        })),
      })),
    }));
    stubApi({ ...reads, 'GET /api/calendar': () => ({ data: { ...known, lanes } }) });
    renderPage(<CalendarPage />, { me, at: '/calendar', widthPx: 390 });
    const day = await screen.findByRole('region', { name: /^Thu, Apr 16/ });
    expect(day).toHaveTextContent('closes today 3:00 pm');
    expect(within(day).getByText('1 h 12 min left to request')).toBeInTheDocument();
    expect(screen.getAllByText(/left to request/)).toHaveLength(1);
  });

  it('is an agenda from today on, the request at the thumb', async () => {
    stubApi(reads);
    renderPage(<CalendarPage />, { me, at: '/calendar', widthPx: 390 });
    const day = await screen.findByRole('region', { name: 'Wed, Apr 15, tomorrow' });
    expect(within(day).getByText('1 not up')).toBeInTheDocument();
    expect(day).toHaveTextContent('Waits on Dunlatch Plumbing: tests up by 7:00 am');
    expect(screen.queryByRole('region', { name: /Mon, Apr 13/ })).not.toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Request a window' }));
    expect(await screen.findByRole('heading', { level: 1, name: 'Request a window' })).toBeInTheDocument();
  });
});
