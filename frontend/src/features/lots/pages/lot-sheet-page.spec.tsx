import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotAbilities, LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { correctionOf, holdOf, lotDetailOf, readingOf, uuid, visitOf } from '../testing/lot-fixtures';
import { LotSheetPage } from './lot-sheet-page';

interface Shown {
  abilities?: Partial<LotAbilities>;
  lot?: Partial<LotDetail>;
  holds?: Hold[];
  visits?: VisitSummary[];
  corrections?: Correction[];
  check?: object;
  more?: Parameters<typeof stubApi>[0];
  at?: string;
  widthPx?: number;
}

function show({
  abilities = {},
  lot,
  holds = [],
  visits = [],
  corrections = [],
  check,
  more,
  at = '',
  widthPx,
}: Shown) {
  const path = `/api/lots/${uuid(17)}`;
  const sent = stubApi({
    [`GET ${path}`]: () => ({ data: lotDetailOf(abilities, lot) }),
    [`GET ${path}/holds`]: () => ({ data: { items: holds } }),
    [`GET ${path}/visits`]: () => ({ data: { items: visits } }),
    'GET /api/corrections': () => ({ data: { items: corrections, nextCursor: null } }),
    [`GET ${path}/ledger`]: () => ({ data: { items: [], nextCursor: null, total: 0 } }),
    [`GET ${path}/ledger/check`]: () => ({ data: check ?? { isWhole: true, entries: 41, firstBroken: null } }),
    [`GET ${path}/comments`]: () => ({ data: { items: [], nextCursor: null } }),
    ...more,
  });
  renderPage(
    <Routes>
      <Route path="/lots/:lotId" element={<LotSheetPage />} />
    </Routes>,
    { me: personOf(), at: `/lots/${uuid(17)}${at}`, widthPx },
  );
  return sent;
}

describe('the lot sheet', () => {
  it('shows a struck reading struck, with its number and why', async () => {
    const readings = [
      readingOf('2026-04-15T01:00:00Z', { pressurePsi: 113 }),
      readingOf('2026-04-15T00:05:00Z', { pressurePsi: 131, isStruck: true, struckWhy: 'misread' }),
    ];
    show({ holds: [holdOf({ readings })], at: '?system=water' });
    const struck = (await screen.findByText('struck: misread')).closest('tr');
    expect(
      within(struck ?? document.body)
        .getByText('131')
        .closest('del'),
    ).not.toBeNull();
  });

  it('strikes an own reading after one question, with the reason; a stranger’s is not offered', async () => {
    const own = readingOf('2026-04-15T01:00:00Z', { byName: personOf().name, byRole: 'superintendent' });
    const theirs = readingOf('2026-04-15T00:05:00Z', { pressurePsi: 131 });
    const sent = show({
      holds: [holdOf({ readings: [own, theirs] })],
      abilities: { canAddReading: true },
      at: '?system=water',
      more: { [`POST /api/readings/${own.id}/strike`]: () => ({ data: holdOf() }) },
    });
    await userEvent.click(await screen.findByRole('button', { name: /^Strike 112 psi of/ }));
    expect(screen.getAllByRole('button', { name: /^Strike/ })).toHaveLength(2);
    const dialog = screen.getByRole('dialog');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Strike the reading' }));
    expect(within(dialog).getByText('This is needed.')).toBeInTheDocument();
    await userEvent.type(within(dialog).getByLabelText('Why it is struck'), 'misread');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Strike the reading' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    const strikes = sent.filter(({ method }) => method === 'POST');
    expect(strikes.map(({ body }) => body)).toEqual([{ why: 'misread' }]);
  });

  it('names the second test the re-test and keeps the first below it', async () => {
    const first = holdOf({ id: uuid(301), state: 'ended', endedAt: '2026-04-12T15:00:00Z', endReason: 'lost' });
    show({ holds: [first, holdOf({ ordinal: 2 })], at: '?system=water' });
    expect(await screen.findByRole('heading', { name: 'Water, test 2 (re-test)' })).toBeInTheDocument();
    expect(
      screen.getAllByText((_, part) => part?.tagName === 'SUMMARY' && part.textContent === 'Water, test 1'),
    ).toHaveLength(1);
  });

  it('says over the lowest-rated part alone, when the last open reading is', async () => {
    show({
      holds: [holdOf({ readings: [readingOf('2026-04-15T01:00:00Z', { pressurePsi: 130 })] })],
      at: '?system=water',
    });
    expect(await screen.findByRole('alert')).toHaveTextContent('let it down to 126 psi now');
    expect(screen.queryByText(/Never tighten/)).not.toBeInTheDocument();
  });

  it('does not take a reading with the valve shut for the pipe', async () => {
    const readings = [readingOf('2026-04-15T01:00:00Z', { pressurePsi: 130, gaugeValve: 'shut' })];
    show({ holds: [holdOf({ readings })], at: '?system=water' });
    expect(await screen.findByText(/tells of the gauge only/)).toBeInTheDocument();
    expect(screen.queryByRole('alert')).not.toBeInTheDocument();
  });

  it('asks for a window by what the server lets this reader do', async () => {
    show({ abilities: { canRequest: true } });
    const act = await screen.findByRole('link', { name: 'Request a window' });
    expect(act).toHaveAttribute('href', `/calendar?request=${uuid(17)}&stage=rough-in`);
  });

  it('does not ask while a correction is open, and says so in the act', async () => {
    show({ abilities: { canRequest: true }, lot: { openCorrections: 1 } });
    expect(await screen.findByRole('button', { name: /Request a window.*1 open: fix first/ })).toHaveAttribute(
      'aria-disabled',
    );
  });

  it('shows of a visit the moves the server sends, and no others', async () => {
    show({ visits: [visitOf({ moves: ['move'] })] });
    expect(await screen.findByRole('button', { name: 'Move to another window' })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Withdraw/ })).not.toBeInTheDocument();
  });

  it('tells an altered entry as an alarm', async () => {
    show({ check: { isWhole: false, entries: 41, firstBroken: 12 } });
    expect(await screen.findByText('Entry 12 was altered')).toHaveAttribute('role', 'alert');
  });

  it('lists corrections, the open ones first, and the way to act only for those who may', async () => {
    show({
      corrections: [
        correctionOf({ state: 'accepted' }),
        correctionOf({ id: uuid(701), number: 2, text: 'No nail plate' }),
      ],
    });
    const part = await screen.findByRole('region', { name: 'Corrections' });
    const items = await within(part).findAllByRole('listitem');
    expect(items[0]).toHaveTextContent('No nail plate');
    expect(within(part).queryByRole('link', { name: 'Fix or answer' })).not.toBeInTheDocument();
  });

  it('gives the thread a column of its own from 1680 px on, beside the rest', async () => {
    show({ widthPx: 1680 });
    const column = (await screen.findByRole('region', { name: 'Thread' })).closest('.lot-thread');
    expect(column?.parentElement).toHaveClass('lot-sheet', 'with-thread');
    cleanup();
    show({ widthPx: 1679 });
    const part = (await screen.findByRole('region', { name: 'Thread' })).closest('.lot-thread');
    expect(part?.parentElement).toHaveClass('lot-trio');
  });

  it('leads on a phone to the thread instead of showing it', async () => {
    show({ widthPx: 390 });
    expect(await screen.findByRole('link', { name: 'Talk on this lot' })).toHaveAttribute(
      'href',
      `/lots/${uuid(17)}/thread`,
    );
    expect(screen.getAllByRole('heading', { level: 1 })).toHaveLength(1);
  });

  it('tells a lot that is not the reader’s as unknown', async () => {
    stubApi({ [`GET /api/lots/${uuid(17)}`]: () => refusal('not-found') });
    renderPage(
      <Routes>
        <Route path="/lots/:lotId" element={<LotSheetPage />} />
      </Routes>,
      { me: personOf(), at: `/lots/${uuid(17)}` },
    );
    expect(await screen.findByRole('heading', { name: 'No such page or entry for you', level: 1 })).toBeInTheDocument();
  });
});
