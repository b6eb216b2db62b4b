import { commentLimit } from '@holdwater/shared-types/threads/thread.contract.js';
import { fireEvent, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi, type SentRequest } from '../../../lib/testing/stub-api';
import { answersFor, lotId, lotOf, noAbilities } from '../../holds/testing/tested-lot';
import { ThreadPanel } from './thread-panel';

const me = personOf();
const script = '<script>alert("x")</script> & <img src=x onerror=alert(1)>';
const comment = {
  id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9f01',
  lotId,
  text: script,
  on: { kind: 'hold', id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9f02', label: 'water 2' },
  authorId: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c77',
  authorName: 'Noor Haverty',
  authorRole: 'inspector',
  at: '2026-04-14T23:02:00Z',
  receivedAt: '2026-04-14T23:02:01Z',
};
const entry = {
  sequence: 38,
  at: '2026-04-14T23:08:00Z',
  kind: 'test-up',
  actorName: 'Ruben Achterberg',
  actorRole: 'plumber',
  payload: {},
  hash: 'h',
};

function show(handlers: Parameters<typeof stubApi>[0] = {}, lot = lotOf()): SentRequest[] {
  const sent = stubApi({
    ...answersFor({ lot }),
    [`GET /api/lots/${lotId}/comments`]: () => ({ data: { items: [comment], nextCursor: null } }),
    [`GET /api/lots/${lotId}/ledger`]: () => ({ data: { items: [entry], nextCursor: null, total: 38 } }),
    ...handlers,
  });
  renderPage(<ThreadPanel lotId={lotId} />, { me });
  return sent;
}
const writes = (sent: readonly SentRequest[]): SentRequest[] => sent.filter(({ method }) => method === 'POST');

describe('the thread', () => {
  it('shows words as text whatever stands in them, and what changed with its number', async () => {
    show();
    expect(await screen.findByText(script)).toBeInTheDocument();
    expect(document.querySelector('script, img')).toBeNull();
    expect(screen.getByText('on Water, test 2')).toBeInTheDocument();
    expect(screen.getByText('Test up')).toBeInTheDocument();
    expect(screen.getByText('38')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('radio', { name: 'Words' }));
    expect(screen.queryByText('Test up')).not.toBeInTheDocument();
  });

  it('sends once and empties the box; refused, it keeps the words and says why', async () => {
    let times = 0;
    const sent = show({
      [`POST /api/lots/${lotId}/comments`]: () =>
        times++ === 0 ? refusal('busy') : { data: { ...comment, on: null } },
    });
    const box = await screen.findByLabelText('All three parties read it');
    await userEvent.type(box, 'Riser stays.');
    await userEvent.click(screen.getByRole('button', { name: 'Send' }));
    await waitFor(() => expect(box).toHaveAccessibleDescription(/./));
    expect(box).toHaveValue('Riser stays.');
    await userEvent.click(screen.getByRole('button', { name: 'Send' }));
    await waitFor(() => expect(box).toHaveValue(''));
    const [first, second] = writes(sent);
    expect(first?.body).toMatchObject({ text: 'Riser stays.' });
    // It is not known whether the first arrived: the second is the same entry.
    expect(second?.body).toEqual(first?.body);
    expect(second?.headers['Idempotency-Key']).toBe(first?.headers['Idempotency-Key']);
  });

  it('says how many signs are too many before anything is sent', async () => {
    const sent = show();
    const box = await screen.findByLabelText('All three parties read it');
    fireEvent.change(box, { target: { value: 'a'.repeat(commentLimit + 12) } });
    expect(box).toHaveAccessibleDescription(/12 signs too many/);
    await userEvent.click(screen.getByRole('button', { name: /Send.*12 signs too many/ }));
    expect(writes(sent)).toEqual([]);
  });

  it('cannot be written to by those the server does not let', async () => {
    show({}, lotOf({ abilities: { ...noAbilities, canComment: false } }));
    expect(await screen.findByText(script)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Send' })).not.toBeInTheDocument();
  });
});
