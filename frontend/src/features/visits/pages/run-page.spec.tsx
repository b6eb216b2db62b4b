import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { noAnswer, stubApi } from '../../../lib/testing/stub-api';
import { allUp, idOf, runOf, stopOf, visitOf } from '../testing/visits.sample';
import { RunPage } from './run-page';

const inspector = personOf({ memberships: [{ organization: tallowmere, roles: ['inspector'] }] }, ['inspector']);
const done = visitOf(9, { state: 'closed', outcome: { kind: 'pass', reason: null } }, '08:12');
const ready: Partial<VisitSummary> = {
  state: 'ready',
  systemsUp: allUp,
  upSince: '2026-04-14T23:08:00Z',
  moves: ['begin'],
};

function reads(next: VisitSummary) {
  return { 'GET /api/runs': () => ({ data: runOf([stopOf(done), stopOf(next, 2)]) }) };
}
const begin = `POST /api/visits/${idOf(22)}/begin`;

beforeEach(() => {
  // 9:38 am in Denver: the window 9:00–11:00 is open.
  vi.useFakeTimers({ now: new Date('2026-04-15T15:38:00Z'), toFake: ['Date'] });
});
afterEach(() => {
  vi.useRealTimers();
});

describe('the run', () => {
  it('hangs the stops on its road and puts the next at the thumb: what must stand, the gate, the way', async () => {
    stubApi(reads(visitOf(22, ready, '09:42')));
    renderPage(<RunPage />, { me: inspector, at: '/run', widthPx: 390 });
    const next = await screen.findByRole('region', { name: 'Lot 22' });
    expect(next).toHaveTextContent('24.0 ft, attic cut');
    expect(next).toHaveTextContent('at least 100 psi');
    expect(next).toHaveTextContent('4417');
    expect(within(next).getByRole('link', { name: 'Directions' })).toHaveAttribute(
      'href',
      'geo:39.1,-106.2?q=39.1,-106.2',
    );
    expect(screen.getByText(/1 of 2 done/)).toBeInTheDocument();
  });

  it('begins the visit; a lost answer is asked for again as the same statement', async () => {
    let tries = 0;
    const sent = stubApi({
      ...reads(visitOf(22, ready, '09:42')),
      [begin]: () => (tries++ === 0 ? noAnswer('ERR_NETWORK') : { data: visitOf(22, { state: 'underway' }, '09:42') }),
    });
    renderPage(<RunPage />, { me: inspector, at: '/run' });
    await userEvent.click(await screen.findByRole('button', { name: 'I am here' }));
    expect(await screen.findByRole('alert')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'I am here' }));
    await waitFor(() => expect(sent.filter(({ path }) => path.endsWith('/begin'))).toHaveLength(2));
    const [first, second] = sent.filter(({ path }) => path.endsWith('/begin'));
    expect(second?.body).toEqual(first?.body);
    expect(second?.headers['Idempotency-Key']).toBe(first?.headers['Idempotency-Key']);
  });

  it('asks first when the window has not opened', async () => {
    vi.setSystemTime(new Date('2026-04-15T14:30:00Z'));
    const sent = stubApi({
      ...reads(visitOf(22, ready, '09:42')),
      [begin]: () => ({ data: visitOf(22, { state: 'underway' }) }),
    });
    renderPage(<RunPage />, { me: inspector, at: '/run' });
    await userEvent.click(await screen.findByRole('button', { name: 'I am here' }));
    const question = screen.getByRole('dialog', { name: /The window opens 9:00 am/ });
    expect(question).toHaveTextContent('up since Tue, Apr 14, 5:08 pm');
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
    await userEvent.click(within(question).getByRole('button', { name: 'Start now' }));
    await waitFor(() => expect(sent.filter(({ method }) => method === 'POST')).toHaveLength(1));
  });

  it('says in the act why a visit cannot begin yet', async () => {
    vi.setSystemTime(new Date('2026-04-15T14:30:00Z'));
    stubApi(reads(visitOf(22, {}, '09:42')));
    renderPage(<RunPage />, { me: inspector, at: '/run' });
    const act = await screen.findByRole('button', { name: /I am here/ });
    expect(act).toHaveTextContent('test not up; window opens 9:00 am');
    expect(act).toHaveAttribute('aria-disabled', 'true');
  });

  it('goes on with the visit underway', async () => {
    stubApi(reads(visitOf(22, { state: 'underway', moves: ['close'] }, '09:42')));
    renderPage(<RunPage />, { me: inspector, at: '/run' });
    expect(await screen.findByRole('link', { name: 'Go on with the outcome' })).toHaveAttribute(
      'href',
      `/visits/${idOf(22)}/outcome`,
    );
  });

  it('says that there are no stops', async () => {
    stubApi({ 'GET /api/runs': () => ({ data: runOf([]) }) });
    renderPage(<RunPage />, { me: inspector, at: '/run' });
    expect(await screen.findByText('No stops today')).toBeInTheDocument();
  });
});
