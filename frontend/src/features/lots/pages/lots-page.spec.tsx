import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { odderly, personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi, type StubAnswer } from '../../../lib/testing/stub-api';
import { lotOf, uuid, waitingOf } from '../testing/lot-fixtures';
import { LotsPage } from './lots-page';

const me = personOf();
const square = (x: number): [number, number][] => [
  [x, 0],
  [x + 60, 0],
  [x + 60, 100],
  [x, 100],
];
const tract = {
  ...{ id: uuid(900), name: 'Sorrel Bench, phase 2', builderId: odderly.id, builderName: odderly.name, lotCount: 3 },
  plat: {
    ...{ widthFt: 200, heightFt: 120, northDegrees: 0, roads: [] },
    parcels: ['17', '18', '19'].map((lotNumber, index) => ({ lotNumber, points: square(index * 60) })),
  },
};
const lots = [
  lotOf('17', {}, 'clear'),
  lotOf('18', {}, 'under-test'),
  lotOf('19', { openCorrections: 1 }, 'corrections-open'),
];

function answers(parts: { plat?: null; lots?: object[]; waiting?: () => StubAnswer } = {}) {
  return {
    'GET /api/tracts': () => ({ data: { items: [parts.plat === null ? { ...tract, plat: null } : tract] } }),
    'GET /api/lots': () => ({ data: { items: parts.lots ?? lots, nextCursor: null } }),
    'GET /api/waiting': parts.waiting ?? (() => ({ data: { items: [waitingOf('18')] } })),
  };
}

const rowsShown = (): string[] =>
  within(screen.getByRole('table', { name: 'Lots' }))
    .getAllByRole('rowheader')
    .map((cell) => cell.textContent?.replace(/\D/g, '') ?? '');

describe('the lots page', () => {
  it('shows what waits on the reader first and leaves out what is clear until asked', async () => {
    stubApi(answers());
    renderPage(<LotsPage />, { me });
    await screen.findByRole('button', { name: /waits on you 1/ });
    expect(rowsShown()).toEqual(['18', '19']);
    await userEvent.click(screen.getByRole('button', { name: 'Show all 3' }));
    expect(rowsShown()).toEqual(['18', '19', '17']);
  });

  it('has one selection for plat and table', async () => {
    stubApi(answers());
    renderPage(<LotsPage />, { me });
    await userEvent.click(await screen.findByRole('option', { name: 'Lot 19, corrections open' }));
    expect(screen.getByRole('button', { name: /Lot 19/, pressed: true })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: /Lot 18/, pressed: false }));
    const plat = screen.getByRole('listbox', { name: /Plat of Sorrel Bench/ });
    expect(within(plat).getByRole('option', { selected: true })).toHaveAccessibleName('Lot 18, under test');
    expect(screen.getByRole('link', { name: 'Open lot 18' })).toHaveAttribute('href', `/lots/${uuid(18)}`);
  });

  it('requests for the lots picked, at the stage shown', async () => {
    stubApi(answers());
    renderPage(<LotsPage />, { me });
    await userEvent.click(await screen.findByRole('checkbox', { name: 'Pick lot 18 for a request' }));
    const act = screen.getByRole('link', { name: 'Request a window for 1 lot' });
    const to = new URL(act.getAttribute('href') ?? '', 'http://page.test');
    expect([to.pathname, to.searchParams.get('request'), to.searchParams.get('stage')]).toEqual([
      '/calendar',
      uuid(18),
      'rough-in',
    ]);
  });

  it('draws a tract without a plat as its lots in order', async () => {
    stubApi(answers({ plat: null }));
    renderPage(<LotsPage />, { me });
    const strip = await screen.findByRole('group', { name: 'Lots in order' });
    expect(within(strip).getAllByRole('button')).toHaveLength(3);
    expect(screen.queryByRole('listbox', { name: /Plat of/ })).not.toBeInTheDocument();
  });

  it('shows the table first on a phone and the plat behind a choice', async () => {
    stubApi(answers());
    renderPage(<LotsPage />, { me, widthPx: 390 });
    await screen.findByRole('list', { name: 'Lots' });
    expect(screen.queryByRole('listbox', { name: /Plat of/ })).not.toBeInTheDocument();
    await userEvent.click(screen.getByRole('radio', { name: 'Plat' }));
    expect(screen.getByRole('listbox', { name: /Plat of/ })).toBeInTheDocument();
  });

  it('says what to do where there are no lots, to a builder and to a plumber', async () => {
    stubApi(answers({ lots: [] }));
    const { unmount } = renderPage(<LotsPage />, { me });
    await screen.findByRole('heading', { name: 'No lots yet' });
    expect(screen.getAllByRole('link', { name: 'Import' }).length).toBeGreaterThan(0);
    unmount();
    renderPage(<LotsPage />, { me: personOf({}, ['owner']) });
    await screen.findByRole('heading', { name: 'No lots yet' });
    expect(screen.queryByRole('link', { name: 'Import' })).not.toBeInTheDocument();
  });

  it('keeps the states when only what waits cannot be read', async () => {
    stubApi(answers({ waiting: () => refusal('internal') }));
    renderPage(<LotsPage />, { me });
    expect(await screen.findByText(/What waits on whom could not be read/)).toBeInTheDocument();
    expect(rowsShown()).toEqual(['19', '18']);
  });
});
