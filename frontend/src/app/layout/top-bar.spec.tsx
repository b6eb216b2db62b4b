import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { odderly, personOf, tallowmere } from '../../lib/testing/people';
import { renderPage } from '../../lib/testing/render-page';
import { stubApi } from '../../lib/testing/stub-api';
import { setSingleKeys } from '../../lib/shortcuts';
import { PhoneBar } from './phone-bar';
import { PhoneTop } from './phone-top';
import { Shortcuts } from './shortcuts';
import { TopBar } from './top-bar';

const lot17 = {
  id: '7f0d3c1a-0c88-4a51-9a9b-3a5e8f0c1717',
  number: '17',
  tractName: 'Sorrel Bench',
  address: '417 Alder Way',
  permitNumber: 'P-2217',
};

function Where(): ReactNode {
  return <p>at {useLocation().pathname}</p>;
}

function waiting(count: number) {
  return {
    kind: 'correction-to-fix',
    isOnYou: true,
    waitsOn: 'you',
    lotId: lot17.id,
    lotNumber: '17',
    tractName: 'Sorrel Bench',
    visitId: null,
    count,
    by: null,
    zone: null,
    isPastTime: false,
  };
}

function open(at = '/calendar') {
  const sent = stubApi({
    'GET /api/waiting': () => ({ data: { items: [waiting(3), waiting(1)] } }),
    'GET /api/notices': () => ({ data: { items: [], nextCursor: null, unread: 3 } }),
    'GET /api/search': ({ query }) => ({ data: { items: query['q'] === '17' ? [lot17] : [] } }),
  });
  const me = personOf({
    memberships: [
      { organization: odderly, roles: ['superintendent'] },
      { organization: tallowmere, roles: ['desk'] },
    ],
  });
  const page = renderPage(
    <>
      <TopBar />
      <Shortcuts />
      <Where />
    </>,
    { me, at },
  );
  return { sent, ...page };
}

describe('the index of sheets', () => {
  it('says where one is and how much waits on the reader', async () => {
    open();
    const nav = screen.getByRole('navigation', { name: 'Sheets' });
    expect(within(nav).getByRole('link', { current: 'page' })).toHaveTextContent('Calendar');
    expect(await within(nav).findByRole('link', { name: /Corrections 4 corrections to fix/ })).toBeInTheDocument();
    expect(await screen.findByRole('link', { name: /Notices 3 unread/ })).toBeInTheDocument();
  });

  it('opens by its numbers, but not while something is typed, nor when the keys are switched off', async () => {
    open();
    await userEvent.keyboard('2');
    expect(screen.getByText('at /lots')).toBeInTheDocument();
    await userEvent.type(screen.getByRole('combobox'), '3');
    expect(screen.getByText('at /lots')).toBeInTheDocument();
    (document.activeElement as HTMLElement).blur();
    setSingleKeys(false);
    await userEvent.keyboard('3');
    expect(screen.getByText('at /lots')).toBeInTheDocument();
    setSingleKeys(true);
    await userEvent.keyboard('3');
    expect(screen.getByText('at /corrections')).toBeInTheDocument();
  });

  it('lists its keys with ?', async () => {
    open();
    await userEvent.keyboard('?');
    expect(screen.getByRole('dialog', { name: 'Keys' })).toBeInTheDocument();
  });
});

describe('find', () => {
  it('is reached by /, asks once per pause, and opens the lot by Enter', async () => {
    const { sent } = open();
    await userEvent.keyboard('/');
    await userEvent.keyboard('17');
    expect(await screen.findByRole('option', { name: /17.*Sorrel Bench/ })).toHaveAttribute('aria-selected', 'true');
    expect(sent.filter(({ path }) => path === '/api/search').map(({ query }) => query['q'])).toEqual(['17']);
    await userEvent.keyboard('{Enter}');
    expect(screen.getByText(`at /lots/${lot17.id}`)).toBeInTheDocument();
  });

  it('opens what the words as they stand find, when Enter comes before the answer', async () => {
    open();
    const box = screen.getByRole('combobox');
    await userEvent.type(box, '17{Enter}');
    expect(await screen.findByText(`at /lots/${lot17.id}`)).toBeInTheDocument();
    expect(box).toHaveValue('');
  });

  it('says so when nothing matches', async () => {
    open();
    await userEvent.type(screen.getByRole('combobox'), 'nowhere');
    await waitFor(() => expect(screen.getByText(/No lot of yours matches/)).toBeInTheDocument());
  });
});

describe('the name', () => {
  it('changes the whole frame to another organization', async () => {
    const { session } = open();
    await userEvent.click(screen.getByRole('button', { name: /Della Arkwright/ }));
    const cells = screen.getByRole('list', { name: 'Organizations' });
    expect(within(cells).getByRole('button', { pressed: true })).toHaveTextContent('Odderly Homes');
    await userEvent.click(within(cells).getByRole('button', { name: /Tallowmere/ }));
    expect(session.chooseOrganization).toHaveBeenCalledWith(tallowmere.id);
    expect(screen.getByText('at /')).toBeInTheDocument();
  });

  it('signs out; everywhere only after a question', async () => {
    const { session } = open();
    await userEvent.click(screen.getByRole('button', { name: /Della Arkwright/ }));
    await userEvent.click(screen.getByRole('button', { name: 'Sign out everywhere' }));
    expect(session.signOutEverywhere).not.toHaveBeenCalled();
    const dialog = screen.getByRole('dialog');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Sign out everywhere' }));
    expect(session.signOutEverywhere).toHaveBeenCalledTimes(1);
  });

  it('closes by Escape and gives the focus back', async () => {
    open();
    const opener = screen.getByRole('button', { name: /Della Arkwright/ });
    await userEvent.click(opener);
    expect(opener).toHaveAttribute('aria-expanded', 'true');
    await userEvent.keyboard('{Escape}');
    expect(opener).toHaveAttribute('aria-expanded', 'false');
    expect(opener).toHaveFocus();
  });
});

describe('on a phone', () => {
  it('the bar has the landing page, the next two and Notices; the rest is under the name', async () => {
    stubApi({
      'GET /api/waiting': () => ({ data: { items: [] } }),
      'GET /api/notices': () => ({ data: { items: [], nextCursor: null, unread: 0 } }),
    });
    renderPage(
      <>
        <PhoneTop />
        <PhoneBar />
      </>,
      { me: personOf(), at: '/calendar', widthPx: 390 },
    );
    const bar = screen.getByRole('navigation', { name: 'Sheets' });
    const words = within(bar)
      .getAllByRole('link')
      .map((link) => link.textContent.trim());
    expect(words).toEqual(['Calendar', 'Lots', 'Corrections', 'Notices']);
    await userEvent.click(screen.getByRole('button', { name: /Della Arkwright/ }));
    expect(screen.getByRole('link', { name: 'Rule cards' })).toHaveAttribute('href', '/rule-cards');
  });
});
