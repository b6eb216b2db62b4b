import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { odderly, personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { stubApi } from '../../../lib/testing/stub-api';
import { DeliveriesPage } from './deliveries-page';
import { LedgerPage } from './ledger-page';
import { OrganizationsPage } from './organizations-page';

const me = personOf({ isOperator: true, memberships: [] });
const delivery = {
  id: '9e0e4c0c-0b86-4b3b-8a63-6f1f5a0c9d01',
  channel: 'email',
  to: 'ruben@dunlatch.example.test',
  kind: 'visit-booked',
  state: 'given-up',
  attempts: 9,
  lastError: '550 no such mailbox',
  nextAttemptAt: null,
  createdAt: '2026-04-14T15:00:00Z',
};

describe('deliveries', () => {
  it('that were given up say what was answered, and can be sent again', async () => {
    const sent = stubApi({
      'GET /api/operations/deliveries': ({ query }) => ({
        data: { items: query['state'] === 'given-up' ? [delivery] : [], nextCursor: null, waiting: 0, givenUp: 1 },
      }),
      [`POST /api/operations/deliveries/${delivery.id}/retry`]: () => ({ data: { done: true } }),
    });
    renderPage(<DeliveriesPage />, { me });
    expect(await screen.findByRole('heading', { name: 'Nothing waits' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('radio', { name: 'Given up' }));
    expect(await screen.findByText('550 no such mailbox')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: /Try again to send to ruben@/ }));
    await waitFor(() => expect(sent.some(({ method }) => method === 'POST')).toBe(true));
  });
});

describe('the ledger', () => {
  it('is whole, or names the first entry that does not fit', async () => {
    let broken: { scope: string; firstBroken: number }[] = [];
    let anchors: object = { days: 9, lastDay: '2026-04-14', firstBroken: null };
    stubApi({ 'GET /api/operations/ledger': () => ({ data: { chains: 2, entries: 40, broken, anchors } }) });
    renderPage(<LedgerPage />, { me });
    expect(await screen.findByRole('heading', { name: 'No entry altered' })).toBeInTheDocument();
    broken = [{ scope: 'lot 17', firstBroken: 12 }];
    await userEvent.click(screen.getByRole('button', { name: 'Check now' }));
    expect(await screen.findByRole('heading', { name: '1 chain does not fit' })).toBeInTheDocument();
    expect(screen.getByRole('row', { name: /lot 17/ })).toHaveTextContent('12');
    broken = [];
    anchors = { days: 9, lastDay: '2026-04-14', firstBroken: '2026-04-12' };
    await userEvent.click(screen.getByRole('button', { name: 'Check now' }));
    expect(await screen.findByRole('heading', { name: 'A daily anchor does not fit' })).toBeInTheDocument();
  });
});

describe('organizations', () => {
  it('are added with a first owner; without a telephone none is sent', async () => {
    const sent = stubApi({
      'GET /api/organizations': () => ({ data: { items: [], nextCursor: null } }),
      'POST /api/organizations': () => ({ status: 201, data: odderly }),
    });
    renderPage(<OrganizationsPage />, { me });
    expect(await screen.findByRole('heading', { name: 'No organizations yet' })).toBeInTheDocument();
    await userEvent.type(screen.getByLabelText('Name'), 'Odderly Homes');
    await userEvent.type(screen.getByLabelText(/First owner's name/), 'Della Arkwright');
    await userEvent.type(screen.getByLabelText(/First owner's email/), 'della@odderly.example.test');
    await userEvent.click(screen.getByRole('button', { name: 'Add and invite the owner' }));
    await waitFor(() =>
      expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
        name: 'Odderly Homes',
        kind: 'builder',
        ownerName: 'Della Arkwright',
        ownerEmail: 'della@odderly.example.test',
      }),
    );
  });
});
