import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { boardOf, gil, idOf, sampleNow, visitOf, windowOf } from '../testing/visits.sample';
import { DayBoardPage } from './day-board-page';
import { RequestsPage } from './requests-page';

const desk = personOf({ memberships: [{ organization: tallowmere, roles: ['desk'] }] }, ['desk']);
const request = visitOf(
  5,
  { state: 'requested', window: windowOf('2026-04-15', 'noon'), moves: ['place', 'decline'] },
  null,
);
const reads = {
  [`GET /api/departments/${tallowmere.id}/requests`]: () => ({ data: { items: [request] } }),
  [`GET /api/departments/${tallowmere.id}/day`]: () => ({ data: boardOf({ requests: [request] }) }),
  [`GET /api/visits/${idOf(5)}`]: () => ({ data: request }),
};

beforeEach(() => {
  vi.useFakeTimers({ now: new Date(sampleNow), toFake: ['Date'] });
});
afterEach(() => {
  vi.useRealTimers();
});

describe('requests', () => {
  it('are placed in the window they want, with the inspector chosen', async () => {
    const sent = stubApi({
      ...reads,
      [`POST /api/visits/${idOf(5)}/place`]: () => ({ data: visitOf(5, { window: request.window }) }),
    });
    renderPage(<RequestsPage />, { me: desk, at: '/requests' });
    await userEvent.click(await screen.findByRole('button', { name: 'Lot 5' }));
    await userEvent.selectOptions(await screen.findByLabelText('Inspector'), gil.id);
    await userEvent.click(screen.getByRole('button', { name: /^Place lot 5, Wed, Apr 15, 11:00 am–1:00 pm/ }));
    await waitFor(() =>
      expect(sent.find(({ path }) => path.endsWith('/place'))?.body).toEqual({
        expectedVersion: 3,
        date: '2026-04-15',
        label: 'noon',
        inspectorId: gil.id,
      }),
    );
  });

  it('are declined only with a reason', async () => {
    const sent = stubApi({
      ...reads,
      [`POST /api/visits/${idOf(5)}/decline`]: () => ({ data: { ...request, state: 'declined' } }),
    });
    renderPage(<RequestsPage />, { me: desk, at: `/requests?visit=${idOf(5)}` });
    await userEvent.click(await screen.findByRole('button', { name: 'Decline' }));
    const question = screen.getByRole('dialog', { name: /Decline lot 5/ });
    await userEvent.click(within(question).getByRole('button', { name: 'Decline' }));
    expect(within(question).getByText('This is needed.')).toBeInTheDocument();
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
    await userEvent.type(within(question).getByLabelText('Why'), 'Framing is not passed yet');
    await userEvent.click(within(question).getByRole('button', { name: 'Decline' }));
    await waitFor(() =>
      expect(sent.find(({ path }) => path.endsWith('/decline'))?.body).toEqual({
        expectedVersion: 3,
        reason: 'Framing is not passed yet',
      }),
    );
  });

  it('say that they changed, and are read anew', async () => {
    let read = 0;
    stubApi({
      ...reads,
      [`GET /api/visits/${idOf(5)}`]: () => ({
        data: read++ === 0 ? request : { ...request, state: 'booked', moves: [], version: 4 },
      }),
      [`POST /api/visits/${idOf(5)}/place`]: () => refusal('stale-state', { params: { is: 'booked', version: 4 } }),
    });
    renderPage(<RequestsPage />, { me: desk, at: `/requests?visit=${idOf(5)}` });
    await userEvent.click(await screen.findByRole('button', { name: /^Place lot 5/ }));
    expect(await screen.findByText('Nothing for you to do on this visit now.')).toBeInTheDocument();
    expect(read).toBeGreaterThan(1);
  });

  it('stand empty with a way on', async () => {
    stubApi({ ...reads, [`GET /api/departments/${tallowmere.id}/requests`]: () => ({ data: { items: [] } }) });
    renderPage(<RequestsPage />, { me: desk, at: '/requests' });
    expect(await screen.findByText('No request to place')).toBeInTheDocument();
  });

  it('are no page of a builder', () => {
    stubApi({});
    renderPage(<RequestsPage />, { me: personOf(), at: '/requests' });
    expect(screen.getByRole('heading', { level: 1 })).toHaveTextContent(
      'This page is a department’s'.replace('’', "'"),
    );
  });
});

describe('the day board', () => {
  it('is that of the next working day, requests on the rule and a strip per inspector', async () => {
    const sent = stubApi(reads);
    renderPage(<DayBoardPage />, { me: desk, at: '/day' });
    const rule = await screen.findByRole('row', { name: '1 request for this day' });
    expect(within(rule).getByRole('button', { name: /Lot 5/ })).toBeInTheDocument();
    expect(sent.find(({ path }) => path.endsWith('/day'))?.query).toEqual({ date: '2026-04-15' });
    const strip = screen.getByRole('row', { name: 'Noor Haverty' });
    expect(within(strip).getAllByRole('button')).toHaveLength(2);
    expect(within(screen.getByRole('row', { name: gil.name })).getByText('Nothing planned yet.')).toBeInTheDocument();
  });

  it('is walked by arrow keys along a strip and across', async () => {
    stubApi(reads);
    renderPage(<DayBoardPage />, { me: desk, at: '/day' });
    const strip = await screen.findByRole('row', { name: 'Noor Haverty' });
    const [early, mid] = within(strip).getAllByRole('button');
    early?.focus();
    await userEvent.keyboard('{ArrowRight}');
    expect(mid).toHaveFocus();
    await userEvent.keyboard('{ArrowUp}');
    expect(screen.getByRole('button', { name: /Lot 5/ })).toHaveFocus();
  });
});
