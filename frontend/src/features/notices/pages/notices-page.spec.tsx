import { noticeKinds } from '@holdwater/shared-types/notices/notice.contract.js';
import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { stubApi } from '../../../lib/testing/stub-api';
import { NoticesPage } from './notices-page';

const lotId = '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0052';
const params = {
  actorName: 'Ruben Achterberg',
  lotNumber: '52',
  tractName: 'Millpond',
  zone: 'America/Denver',
  stageName: { en: 'Rough-in' },
  startAt: '2026-04-15T15:00:00Z',
  endAt: '2026-04-15T17:00:00Z',
  from: { startAt: '2026-04-14T15:00:00Z', endAt: '2026-04-14T17:00:00Z' },
  reason: 'weather',
  kind: 'fail',
  number: 2,
  excerpt: '<b>Riser</b> stays',
  version: 7,
  effectiveFrom: '2026-05-01',
  lotCount: 1,
};
const noticeOf = (kind: string, index: number, readAt: string | null = '2026-04-15T16:00:00Z') => ({
  id: `3d1a9f0e-51a7-4c55-8a1a-7b8a3f0ea0${String(index).padStart(2, '0')}`,
  kind,
  params,
  lotId,
  visitId: null,
  at: '2026-04-15T15:30:00Z',
  readAt,
});
const answer = (items: object[]) => () => ({ data: { items, nextCursor: null, unread: 1 } });

describe('notices', () => {
  it('have words for every kind, with a way to the lot', async () => {
    stubApi({ 'GET /api/notices': answer(noticeKinds.map((kind, index) => noticeOf(kind, index))) });
    renderPage(<NoticesPage />, { me: personOf() });
    const rows = await screen.findAllByRole('listitem');
    expect(rows).toHaveLength(noticeKinds.length);
    for (const row of rows) {
      expect(row).toHaveTextContent('Lot 52, Millpond');
      expect(row.textContent).not.toMatch(/\{\{|undefined|titles\.|lines\./);
    }
    expect(screen.getByRole('link', { name: 'Visit moved to Wed, Apr 15, 9:00–11:00 am' })).toHaveAttribute(
      'href',
      `/lots/${lotId}`,
    );
    expect(document.body).toHaveTextContent('It was Tue, Apr 14, 9:00–11:00 am');
    expect(screen.getByText('<b>Riser</b> stays')).toBeInTheDocument();
  });

  it('are read when the page is opened, and stay marked as new while it is', async () => {
    let readAt: string | null = null;
    const sent = stubApi({
      'GET /api/notices': () => answer([noticeOf('test-up', 1, readAt), noticeOf('comment', 2)])(),
      'POST /api/notices/read': () => {
        readAt = '2026-04-15T16:00:00Z';
        return { data: { done: true } };
      },
    });
    renderPage(<NoticesPage />, { me: personOf() });
    await screen.findAllByRole('listitem');
    await waitFor(() => expect(sent.filter(({ method }) => method === 'POST')).toHaveLength(1));
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({ ids: [noticeOf('test-up', 1).id] });
    // read again by the server's word, and not sent a second time
    await waitFor(() => expect(sent.filter(({ method }) => method === 'GET').length).toBeGreaterThan(1));
    expect(screen.getAllByText('new')).toHaveLength(1);
    expect(sent.filter(({ method }) => method === 'POST')).toHaveLength(1);
  });

  it('say so when there are none', async () => {
    stubApi({ 'GET /api/notices': answer([]) });
    renderPage(<NoticesPage />, { me: personOf() });
    expect(await screen.findByRole('heading', { name: 'No notices yet' })).toBeInTheDocument();
  });
});
