import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { useCoversDates } from '../../lib/shown-date';
import { personOf } from '../../lib/testing/people';
import { renderPage } from '../../lib/testing/render-page';
import { stubApi } from '../../lib/testing/stub-api';
import { Ribbon } from './ribbon';

function Where(): ReactNode {
  const { pathname, search } = useLocation();
  return (
    <p>
      at {pathname}
      {search}
    </p>
  );
}

function Covers({ from, to }: { from: string; to: string }): ReactNode {
  useCoversDates(from, to);
  return null;
}

function open(at: string, page: ReactNode = null) {
  const sent = stubApi({
    'GET /api/calendar': () => ({
      data: { now: '2026-04-14T19:48:00Z', zone: 'America/Denver', today: '2026-04-14', lanes: [], visits: [] },
    }),
    'GET /api/waiting': () => ({ data: { items: [] } }),
  });
  renderPage(
    <>
      <Ribbon />
      {page}
      <Where />
    </>,
    { me: personOf(), at },
  );
  const weeks = screen.getByRole('navigation', { name: 'Two weeks' });
  return { sent, day: (name: RegExp) => within(weeks).getByRole('button', { name }) };
}

describe('the ribbon', () => {
  it('shows the two working weeks of the date in the address, and reads those', async () => {
    const { sent, day } = open('/calendar?date=2026-04-15');
    expect(day(/^Mon, Apr 13/)).toBeInTheDocument();
    expect(day(/^Fri, Apr 24/)).toBeInTheDocument();
    expect(await screen.findByText('Nothing waits on you')).toBeInTheDocument();
    const asked = sent.find(({ path }) => path === '/api/calendar');
    expect(asked?.query).toMatchObject({ from: '2026-04-13', to: '2026-04-24' });
  });

  it('hands a day to the page below when that is about dates, and brackets what it covers', async () => {
    const { day } = open('/run?date=2026-04-15', <Covers from="2026-04-15" to="2026-04-15" />);
    expect(day(/^Wed, Apr 15/)).toHaveAttribute('aria-pressed', 'true');
    expect(day(/^Thu, Apr 16/)).toHaveAttribute('aria-pressed', 'false');
    await userEvent.click(day(/^Thu, Apr 16/));
    expect(screen.getByText('at /run?date=2026-04-16')).toBeInTheDocument();
  });

  it('goes to the calendar from any other page', async () => {
    const { day } = open('/lots?date=2026-04-15');
    await userEvent.click(day(/^Mon, Apr 20/));
    expect(screen.getByText('at /calendar?date=2026-04-20')).toBeInTheDocument();
  });

  it('moves by weeks without changing the page', async () => {
    const { day } = open('/lots?date=2026-04-15');
    await userEvent.click(screen.getByRole('button', { name: 'One week later' }));
    expect(day(/^Fri, May 1/)).toBeInTheDocument();
    expect(screen.getByText('at /lots?date=2026-04-15')).toBeInTheDocument();
  });
});
