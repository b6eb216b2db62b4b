import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi, type SentRequest } from '../../../lib/testing/stub-api';
import { lotOf } from '../../holds/testing/tested-lot';
import { CorrectionsPage } from './corrections-page';

const me = personOf({}, ['plumber']);
const id = (end: string): string => `3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9e${end}`;

function correctionOf(parts: Partial<Correction>): Correction {
  return {
    id: id('01'),
    lotId: id('52'),
    lotNumber: '52',
    tractName: 'Millpond',
    unitNumber: 1,
    stageCode: 'rough-in',
    visitId: id('0a'),
    number: 1,
    subject: 'dwv',
    pointCode: null,
    text: 'Drip at the shower tee',
    place: { x: 0.7, y: 0.5 },
    floor: 'second',
    room: 'Bath wall',
    severity: 'fix-before-cover',
    section: '7-204',
    state: 'open',
    version: 2,
    openedAt: '2026-04-10T15:00:00Z',
    openedBy: 'Noor Haverty',
    fixedAt: null,
    fixedBy: null,
    fixNote: null,
    reopenedWhy: null,
    acceptedAt: null,
    acceptedBy: null,
    abilities: { canFix: true, canDecide: false },
    ...parts,
  };
}
const others = correctionOf({
  id: id('02'),
  number: 7,
  text: 'No nail plate',
  abilities: { canFix: false, canDecide: false },
});
const lot = { ...lotOf(), id: id('52') };
const list = (...items: Correction[]) => ({
  'GET /api/corrections': () => ({ data: { items, nextCursor: null } }),
  [`GET /api/lots/${id('52')}`]: () => ({ data: lot }),
});
const writes = (sent: readonly SentRequest[]): SentRequest[] => sent.filter(({ method }) => method === 'POST');

describe('corrections', () => {
  it('show those the reader can act on first, and no act on the others', async () => {
    const sent = stubApi(list(others, correctionOf({})));
    renderPage(<CorrectionsPage />, { me, at: '/corrections' });
    const rows = await screen.findAllByRole('listitem');
    expect(rows[0]).toHaveTextContent('Drip at the shower tee');
    expect(rows[0]).toHaveTextContent('Bath wall, Second floor');
    expect(within(rows[0] as HTMLElement).getByRole('button', { name: /fixed/ })).toBeInTheDocument();
    expect(within(rows[1] as HTMLElement).queryByRole('button')).not.toBeInTheDocument();
    expect(sent[0]?.query).toMatchObject({ state: 'open' });
  });

  it('tell their days in the zone of the department of the lot, asked once for all of its corrections', async () => {
    // 10:30 pm of Apr 10 in Denver (UTC-6 in April) is 1:30 pm of Apr 11 in Tokyo (UTC+9): IANA time zone database.
    const late = { openedAt: '2026-04-11T04:30:00Z' };
    const sent = stubApi({
      ...list(correctionOf(late), correctionOf({ ...late, id: id('02'), number: 2, text: 'No nail plate' })),
      [`GET /api/lots/${id('52')}`]: () => ({ data: { ...lot, zone: 'Asia/Tokyo' } }),
    });
    renderPage(<CorrectionsPage />, { me, at: '/corrections' });
    await waitFor(() => expect(screen.getAllByRole('listitem')[0]).toHaveTextContent('Sat, Apr 11'));
    expect(sent.filter(({ path }) => path === `/api/lots/${id('52')}`)).toHaveLength(1);
    cleanup();
    stubApi({
      ...list(correctionOf(late)),
      [`GET /api/lots/${id('52')}`]: () => ({ data: { ...lot, zone: 'America/Denver' } }),
    });
    renderPage(<CorrectionsPage />, { me, at: '/corrections' });
    await waitFor(() => expect(screen.getAllByRole('listitem')[0]).toHaveTextContent('Fri, Apr 10'));
  });

  it('are fixed with what was done; without words nothing is sent', async () => {
    const sent = stubApi({
      ...list(correctionOf({})),
      [`POST /api/corrections/${id('01')}/fixed`]: () => ({ data: correctionOf({ state: 'fixed' }) }),
    });
    renderPage(<CorrectionsPage />, { me, at: '/corrections' });
    await userEvent.click(await screen.findByRole('button', { name: 'Correction 1: fixed' }));
    await userEvent.click(screen.getByRole('button', { name: 'Say it is fixed' }));
    expect(screen.getByText('This is needed.')).toBeInTheDocument();
    expect(writes(sent)).toEqual([]);
    await userEvent.type(screen.getByLabelText('What was done'), 'New tee');
    await userEvent.click(screen.getByRole('button', { name: 'Say it is fixed' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toMatchObject({ expectedVersion: 2, note: 'New tee' }));
  });

  it('are accepted, or reopened with the reason; a conflict reads them again', async () => {
    const fixed = correctionOf({ state: 'fixed', abilities: { canFix: false, canDecide: true } });
    const sent = stubApi({
      ...list(fixed),
      [`POST /api/corrections/${id('01')}/accept`]: () => refusal('stale-state'),
      [`POST /api/corrections/${id('01')}/reopen`]: () => ({ data: correctionOf({}) }),
    });
    renderPage(<CorrectionsPage />, { me, at: '/corrections?state=fixed' });
    await userEvent.click(await screen.findByRole('button', { name: 'Accept correction 1' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('It has changed while you looked');
    await waitFor(() => expect(sent.filter(({ path }) => path === '/api/corrections').length).toBeGreaterThan(1));
    await userEvent.click(screen.getByRole('button', { name: 'Reopen correction 1' }));
    await userEvent.type(screen.getByLabelText('Why it is not fixed'), 'Still wet');
    await userEvent.click(screen.getByRole('button', { name: 'Reopen' }));
    await waitFor(() => expect(writes(sent).at(-1)?.body).toMatchObject({ expectedVersion: 2, why: 'Still wet' }));
  });

  it('say so when there are none', async () => {
    stubApi(list());
    renderPage(<CorrectionsPage />, { me, at: '/corrections?state=accepted' });
    expect(await screen.findByRole('heading', { name: 'No correction was accepted yet' })).toBeInTheDocument();
  });
});
