import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi, type SentRequest } from '../../../lib/testing/stub-api';
import { answersFor, dwvHold, holdOf, visitId, visitOf } from '../../holds/testing/tested-lot';
import { OutcomePage } from './outcome-page';

const noor = personOf({ id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c77', name: 'Noor Haverty' }, ['inspector']);
const gil = personOf({ id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c78', name: 'Gil Strand' }, ['inspector']);
const underway = visitOf({ state: 'underway', version: 5, moves: ['close', 'undo-begin'] });
const ready = visitOf({ state: 'ready', version: 4, upSince: '2026-04-14T23:08:00Z', moves: ['begin'] });
const opensAt = new Date(underway.window.startAt);

/** `minutes` after the window opened; timers keep running, so that nothing waits for ever. */
function at(minutes: number): void {
  vi.useFakeTimers({ toFake: ['Date'], now: opensAt.getTime() + minutes * 60_000 });
}
afterEach(() => {
  vi.useRealTimers();
  window.localStorage.clear();
});

function show(visit = underway, handlers: Parameters<typeof stubApi>[0] = {}, me = noor): SentRequest[] {
  const sent = stubApi({
    ...answersFor({ holds: [dwvHold, holdOf()] }),
    [`GET /api/visits/${visitId}`]: () => ({ data: visit }),
    'GET /api/corrections': () => ({ data: { items: [], nextCursor: null } }),
    ...handlers,
  });
  const page = (
    <Routes>
      <Route path="/visits/:visitId/outcome" element={<OutcomePage />} />
    </Routes>
  );
  renderPage(page, { me, at: `/visits/${visitId}/outcome`, widthPx: 390 });
  return sent;
}
const writes = (sent: readonly SentRequest[]): SentRequest[] => sent.filter(({ method }) => method === 'POST');
const answer = async (system: string, word: string): Promise<void> => {
  const group = await screen.findByRole('radiogroup', { name: system });
  await userEvent.click(within(group).getByRole('radio', { name: word }));
};

describe('the start', () => {
  it('before the window tells since when the test is up, and asks', async () => {
    at(-10);
    const sent = show(ready, { [`POST /api/visits/${visitId}/begin`]: () => ({ data: underway }) });
    await userEvent.click(await screen.findByRole('button', { name: 'Start' }));
    expect(document.body).toHaveTextContent('test up since Tue, Apr 14, 5:08 pm');
    await waitFor(() => expect(writes(sent)[0]?.body).toMatchObject({ expectedVersion: 4 }));
    expect(writes(sent)[0]?.body).not.toHaveProperty('isTakingOver');
  });

  it('is not offered while the server does not let it', async () => {
    at(-10);
    show(visitOf({ state: 'booked', moves: [] }));
    expect(await screen.findByText(/only when the test is up/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Start' })).not.toBeInTheDocument();
  });

  it("of another inspector's visit is taken over knowingly", async () => {
    at(5);
    const sent = show(ready, { [`POST /api/visits/${visitId}/begin`]: () => ({ data: underway }) }, gil);
    await userEvent.click(await screen.findByRole('button', { name: 'Take over and start' }));
    expect(writes(sent)).toEqual([]);
    const dialog = screen.getByRole('dialog', { name: /Take over from Noor Haverty/ });
    await userEvent.click(within(dialog).getByRole('button', { name: 'Take over and start' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toMatchObject({ isTakingOver: true }));
  });

  it('can be taken back while the server lets it', async () => {
    at(5);
    const sent = show(underway, { [`POST /api/visits/${visitId}/undo-begin`]: () => ({ data: ready }) });
    await userEvent.click(await screen.findByRole('button', { name: 'Take the start back' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toEqual({ expectedVersion: 5 }));
  });
});

describe('what was seen', () => {
  it('shows what the plumber read only after the inspector has typed', async () => {
    at(5);
    show();
    const field = await screen.findByLabelText('Gauge reads');
    expect(field).toHaveValue('');
    expect(screen.queryByText(/Ruben Achterberg read/)).not.toBeInTheDocument();
    await userEvent.type(field, '56');
    expect(screen.getByText(/Ruben Achterberg read/)).toHaveTextContent('Ruben Achterberg read 57 psi');
  });

  it('passes after one question that says who is told', async () => {
    at(5);
    const sent = show(underway, { [`POST /api/visits/${visitId}/outcome`]: () => refusal('stale-state') });
    await answer('DWV', 'pass');
    expect(screen.getByRole('button', { name: /Record.*Water not answered/ })).toHaveAttribute('aria-disabled', 'true');
    await userEvent.type(screen.getByLabelText('Gauge reads'), '56');
    await userEvent.click(screen.getByRole('radio', { name: 'jumped' }));
    expect(screen.getByText(/the gauge leaks, not the house/)).toBeInTheDocument();
    await answer('Water', 'pass');
    await userEvent.click(screen.getByRole('checkbox', { name: 'Looked at: Slope' }));
    await userEvent.click(screen.getByRole('button', { name: 'Record pass' }));
    expect(writes(sent)).toEqual([]);
    const dialog = screen.getByRole('dialog');
    expect(dialog).toHaveTextContent('Odderly Homes, Dunlatch Plumbing and your desk are told at once');
    expect(dialog).toHaveTextContent('Prints 1 of 2 lines');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Record pass' }));
    await waitFor(() => expect(writes(sent)).toHaveLength(1));
    expect(writes(sent)[0]?.body).toMatchObject({
      expectedVersion: 5,
      result: {
        kind: 'seen',
        systems: [
          { unitNumber: 1, system: 'dwv', answer: 'pass' },
          { unitNumber: 1, system: 'water', answer: 'pass', needle: 'jumped', pressurePsi: 56 },
        ],
        lookedAt: ['slope'],
        corrections: [],
      },
    });
    // refused: it is said, and nothing typed is lost
    expect(await within(dialog).findByRole('alert')).toHaveTextContent('It has changed while you looked');
    expect(screen.getByLabelText('Gauge reads')).toHaveValue('56');
  });

  it('a fail needs a correction with its place; the frequent one brings words and section', async () => {
    at(5);
    const sent = show(underway, { [`POST /api/visits/${visitId}/outcome`]: () => refusal('stale-state') });
    await answer('DWV', 'fail');
    await answer('Water', 'pass');
    expect(screen.getByText('Fail needs one correction.')).toBeInTheDocument();
    const subject = screen.getByRole('region', { name: 'DWV' });
    await userEvent.click(within(subject).getByRole('button', { name: 'Open a correction' }));
    expect(screen.getByRole('heading', { level: 1, name: 'Correction 1' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'drip at a joint' }));
    await userEvent.click(screen.getByRole('button', { name: 'Add correction' }));
    expect(screen.getByRole('alert')).toHaveTextContent('Touch the place on the house');
    await userEvent.click(screen.getByRole('checkbox', { name: 'the whole system' }));
    await userEvent.click(screen.getByRole('button', { name: 'Add correction' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Record fail' }));
    const dialog = screen.getByRole('dialog');
    expect(dialog).toHaveTextContent('Corrections open: DWV 1.');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Record fail' }));
    await waitFor(() =>
      expect(writes(sent)[0]?.body).toMatchObject({
        result: {
          corrections: [
            {
              unitNumber: 1,
              subject: 'dwv',
              text: 'Drip at a joint',
              section: '7-204',
              place: 'whole-system',
              severity: 'fix-before-cover',
            },
          ],
        },
      }),
    );
  });

  it('a touch on the house is kept as a place, with the floor it lies on', async () => {
    at(5);
    show();
    const subject = await screen.findByRole('region', { name: 'DWV' });
    await userEvent.click(within(subject).getByRole('button', { name: 'Open a correction' }));
    screen.getByRole('button', { name: /Touch the place/ }).focus();
    await userEvent.keyboard('{ArrowUp}{Enter}');
    expect(screen.getByLabelText(/Floor/)).toHaveDisplayValue(/floor/);
    expect(screen.queryByText('Touch the place on the house, or choose the whole system.')).not.toBeInTheDocument();
  });
});

describe('what was typed and not recorded', () => {
  const keptKeys = (): string[] =>
    Object.keys({ ...window.localStorage }).filter((key) => key.includes('outcome-draft'));
  /** As a reload or a new tab does: nothing of the page lives on but what the device keeps. */
  const reload = (visit = underway, handlers = {}, me = noor): SentRequest[] => {
    cleanup();
    return show(visit, handlers, me);
  };

  it('stands there again after a reload: answers, notes, readings, points looked at, corrections', async () => {
    at(5);
    show();
    await answer('DWV', 'fail');
    await userEvent.type(screen.getByLabelText('Gauge reads'), '56');
    await userEvent.click(screen.getByRole('radio', { name: 'stayed' }));
    await userEvent.click(screen.getByRole('checkbox', { name: 'Looked at: Slope' }));
    await userEvent.type(screen.getByLabelText(/Note to all three parties/), 'Wet slab');
    const subject = screen.getByRole('region', { name: 'DWV' });
    await userEvent.click(within(subject).getByRole('button', { name: 'Open a correction' }));
    await userEvent.click(screen.getByRole('button', { name: 'drip at a joint' }));
    await userEvent.click(screen.getByRole('checkbox', { name: 'the whole system' }));
    await userEvent.click(screen.getByRole('button', { name: 'Add correction' }));
    reload();
    expect(await screen.findByText(/You typed this on this device until/)).toHaveTextContent('Wed, Apr 15, 9:05 am');
    expect(screen.getByLabelText('Gauge reads')).toHaveValue('56');
    expect(screen.getByRole('radio', { name: 'stayed' })).toBeChecked();
    expect(screen.getByRole('checkbox', { name: 'Looked at: Slope' })).toBeChecked();
    expect(screen.getByLabelText(/Note to all three parties/)).toHaveValue('Wet slab');
    const group = screen.getByRole('radiogroup', { name: 'DWV' });
    expect(within(group).getByRole('radio', { name: 'fail' })).toBeChecked();
    expect(screen.getByRole('region', { name: 'DWV' })).toHaveTextContent('Drip at a joint');
  });

  it('stands there again in the middle of a correction', async () => {
    at(5);
    show();
    const subject = await screen.findByRole('region', { name: 'DWV' });
    await userEvent.click(within(subject).getByRole('button', { name: 'Open a correction' }));
    await userEvent.type(screen.getByLabelText(/Room/), 'laundry');
    reload();
    expect(await screen.findByLabelText(/Room/)).toHaveValue('laundry');
    await userEvent.click(screen.getByRole('button', { name: /Back/ }));
    expect(await screen.findByRole('region', { name: 'DWV' })).toBeInTheDocument();
    expect(keptKeys()).toEqual([]);
  });

  it('is never shown to somebody else on the same device', async () => {
    at(5);
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '56');
    reload(underway, {}, gil);
    expect(await screen.findByLabelText('Gauge reads')).toHaveValue('');
    expect(screen.queryByText(/You typed this/)).not.toBeInTheDocument();
    reload();
    expect(await screen.findByLabelText('Gauge reads')).toHaveValue('56');
  });

  it('is let go once it is recorded, and kept when the record did not go through', async () => {
    at(5);
    let times = 0;
    const closed = { ...underway, state: 'closed' as const, moves: [] };
    const outcome = {
      ...{ id: visitId, visitId, kind: 'no-access', reason: 'locked', note: null, byName: noor.name },
      ...{ at: underway.window.startAt, receivedAt: underway.window.startAt, systems: [], work: [] },
    };
    show(underway, {
      [`POST /api/visits/${visitId}/outcome`]: () =>
        times++ === 0 ? refusal('busy') : { status: 201, data: { visit: closed, outcome, corrections: [] } },
    });
    await userEvent.click(await screen.findByRole('radio', { name: 'no access' }));
    await userEvent.click(screen.getByRole('radio', { name: 'locked' }));
    await userEvent.click(screen.getByRole('button', { name: 'Record no access' }));
    const dialog = screen.getByRole('dialog');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Record no access' }));
    await within(dialog).findByRole('alert');
    expect(keptKeys()).toHaveLength(1);
    await userEvent.click(within(dialog).getByRole('button', { name: 'Record no access' }));
    await waitFor(() => expect(keptKeys()).toEqual([]));
  });

  it('is let go when the visit has ended otherwise', async () => {
    at(5);
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '56');
    expect(keptKeys()).toHaveLength(1);
    reload(visitOf({ state: 'freed', moves: [] }));
    await screen.findByRole('link', { name: /lot/i });
    expect(keptKeys()).toEqual([]);
  });
});

describe('not ready and no access', () => {
  it('cannot be chosen before the window opens', async () => {
    at(-10);
    show();
    expect(await screen.findByRole('radio', { name: 'not ready' })).toBeDisabled();
    expect(document.body).toHaveTextContent('Not ready and no access: from 9:00 am on');
  });

  it('take the place of the subjects, with one reason', async () => {
    at(5);
    const sent = show(underway, { [`POST /api/visits/${visitId}/outcome`]: () => refusal('stale-state') });
    await userEvent.click(await screen.findByRole('radio', { name: 'no access' }));
    expect(screen.queryByRole('region', { name: 'Water' })).not.toBeInTheDocument();
    expect(screen.getByRole('button', { name: /Record.*reason missing/ })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('radio', { name: 'locked' }));
    await userEvent.click(screen.getByRole('button', { name: 'Record no access' }));
    const dialog = screen.getByRole('dialog');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Record no access' }));
    await waitFor(() =>
      expect(writes(sent)[0]?.body).toMatchObject({ result: { kind: 'no-access', reason: 'locked' } }),
    );
  });
});
