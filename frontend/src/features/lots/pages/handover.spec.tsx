import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { odderly, personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { ReplaceParty } from '../components/replace-party';
import { holdOf, lotDetailOf, readingOf, uuid } from '../testing/lot-fixtures';
import { ConsentsPage } from './consents-page';
import { PastLotPage } from './past-lot-page';
import { PastLotsPage } from './past-lots-page';

const dunlatch = { id: uuid(60), name: 'Dunlatch Plumbing', kind: 'plumber' as const, phone: '555-0115' };
const corrin = { id: uuid(61), name: 'Corrin Pipe', kind: 'plumber' as const, phone: '555-0116' };

describe('replacing the plumber of a lot', () => {
  const page = (lot = lotDetailOf({ canAttach: true })) =>
    renderPage(<ReplaceParty lot={lot} kind="plumber" former={dunlatch} />, { me: personOf() });

  it('asks one question first, which says who is told, and then asks the one chosen', async () => {
    const sent = stubApi({
      'GET /api/organizations': () => ({ data: { items: [corrin], nextCursor: null } }),
      [`POST /api/lots/${uuid(17)}/handovers`]: () => ({ data: lotDetailOf({ canAttach: true }) }),
    });
    page();
    await userEvent.click(await screen.findByRole('button', { name: 'Replace the plumber…' }));
    const question = screen.getByRole('dialog', { name: 'Who takes over from Dunlatch Plumbing?' });
    expect(question).toHaveTextContent('both plumbers and the department are told');
    await userEvent.click(within(question).getByRole('button', { name: 'Ask' }));
    expect(within(question).getByRole('alert')).toHaveTextContent('Choose who is asked first.');
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
    await userEvent.click(within(question).getByLabelText('Plumber, optional'));
    await userEvent.click(await within(question).findByRole('button', { name: /Corrin Pipe/ }));
    await userEvent.click(within(question).getByRole('button', { name: 'Ask Corrin Pipe to take over' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({ kind: 'plumber', organizationId: corrin.id });
  });

  it('shows who was asked until they answer, and nothing to those who may not', async () => {
    stubApi({});
    const { unmount } = page(lotDetailOf({}, { handovers: [{ kind: 'plumber', organization: corrin }] }));
    expect(await screen.findByText('Corrin Pipe')).toBeInTheDocument();
    expect(screen.getByText('asked to take over, not agreed yet')).toBeInTheDocument();
    unmount();
    page(lotDetailOf({}));
    expect(screen.queryByRole('button')).not.toBeInTheDocument();
  });
});

describe('an asking that nobody answered', () => {
  it('is taken back by whoever may ask', async () => {
    const sent = stubApi({
      [`DELETE /api/lots/${uuid(17)}/handovers/plumber`]: () => ({ data: lotDetailOf({ canAttach: true }) }),
    });
    const lot = lotDetailOf({ canAttach: true }, { handovers: [{ kind: 'plumber', organization: corrin }] });
    renderPage(<ReplaceParty lot={lot} kind="plumber" former={dunlatch} />, { me: personOf() });
    await userEvent.click(await screen.findByRole('button', { name: 'Ask Corrin Pipe no longer' }));
    await waitFor(() => expect(sent.some(({ method }) => method === 'DELETE')).toBe(true));
  });
});

describe('a lot to be taken over', () => {
  const [water, dwv] = [uuid(301), uuid(302)];
  const test = { unitNumber: 1, stageName: { en: 'Rough-in' }, ordinal: 1, lastPsi: null, lastLevelIn: null };
  const asked = {
    ...{ lotId: uuid(17), lotNumber: '17', tractName: null, address: '418 Sedge Loop', builderName: odderly.name },
    ...{ kind: 'plumber', organization: corrin, askedAt: '2026-04-14T15:00:00Z' },
    handover: {
      replacesName: dunlatch.name,
      tests: [
        { ...test, holdId: water, system: 'water', isLevel: false, lastPsi: 112 },
        { ...test, holdId: dwv, system: 'dwv', isLevel: true, lastLevelIn: 2 },
      ],
    },
  };
  const path = `POST /api/lots/${uuid(17)}/handovers/answer`;
  const plumber = personOf({ memberships: [{ organization: corrin, roles: ['plumber'] }] });

  it('takes over the tests that are read anew and leaves the rest to end', async () => {
    const sent = stubApi({
      'GET /api/consents': () => ({ data: { items: [asked] } }),
      [path]: () => ({ data: { done: true } }),
    });
    renderPage(<ConsentsPage />, { me: plumber });
    const field = await screen.findByLabelText(/Rough-in, Water, test 1/);
    expect(field).toHaveAccessibleDescription('last read 112 psi');
    await userEvent.type(field, 'high');
    expect(screen.getByText('A number.')).toBeInTheDocument();
    await userEvent.clear(field);
    await userEvent.type(field, '111');
    await userEvent.click(screen.getByRole('button', { name: 'Take over lot 17' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toMatchObject({
      ...{ organizationId: corrin.id, isJoining: true },
      takeOver: [{ holdId: water, reading: { pressurePsi: 111, gaugeValve: 'open' } }],
    });
  });

  it('says why it cannot be taken over now', async () => {
    stubApi({ 'GET /api/consents': () => ({ data: { items: [asked] } }), [path]: () => refusal('party-has-visit') });
    renderPage(<ConsentsPage />, { me: plumber });
    await userEvent.click(await screen.findByRole('button', { name: 'Take over lot 17' }));
    expect(await screen.findByText('An inspector is at the lot right now')).toBeInTheDocument();
  });

  it('is refused after a question, and read over by plumbers only', async () => {
    const sent = stubApi({
      'GET /api/consents': () => ({ data: { items: [asked] } }),
      [path]: () => ({ data: { done: true } }),
    });
    renderPage(<ConsentsPage />, { me: personOf({ memberships: [{ organization: corrin, roles: ['owner'] }] }) });
    await userEvent.click(await screen.findByRole('button', { name: 'Refuse lot 17' }));
    expect(screen.queryByLabelText(/Water, test 1/)).not.toBeInTheDocument();
    const question = screen.getByRole('dialog', { name: 'Refuse lot 17?' });
    expect(question).toHaveTextContent('Odderly Homes is told');
    await userEvent.click(within(question).getByRole('button', { name: 'Refuse lot 17' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      ...{ organizationId: corrin.id, isJoining: false, takeOver: [] },
    });
  });
});

describe('lots handed over', () => {
  const past = {
    ...{ lotId: uuid(17), lotNumber: '17', tractName: 'Sorrel Bench', address: '418 Sedge Loop', kind: 'plumber' },
    ...{ organizationName: dunlatch.name, replacedByName: corrin.name },
    ...{ until: '2026-04-14T15:00:00Z', zone: 'America/Denver' },
  };

  it('are listed with who came', async () => {
    stubApi({ 'GET /api/past-lots': () => ({ data: { items: [past] } }) });
    renderPage(<PastLotsPage />, { me: personOf() });
    expect(await screen.findByRole('link', { name: /17 Sorrel Bench/ })).toHaveAttribute(
      'href',
      `/past-lots/${uuid(17)}`,
    );
    expect(screen.getByText('Corrin Pipe')).toBeInTheDocument();
  });

  it('show tests and changes until then, and no act that writes', async () => {
    const hold = holdOf({
      state: 'ended',
      endReason: 'handed-over',
      endedAt: past.until,
      readings: [readingOf('2026-04-13T23:00:00Z')],
    });
    const entry = {
      ...{
        sequence: 9,
        at: past.until,
        kind: 'party-replaced',
        actorName: 'Tova Merrow',
        actorRole: 'plumber',
        hash: '0',
      },
      payload: { kind: 'plumber', organizationName: corrin.name, formerName: dunlatch.name, takenOver: 0 },
    };
    stubApi({
      [`GET /api/past-lots/${uuid(17)}`]: () => ({ data: { ...past, holds: [hold] } }),
      [`GET /api/past-lots/${uuid(17)}/ledger`]: () => ({ data: { items: [entry], nextCursor: null, total: 1 } }),
    });
    renderPage(
      <Routes>
        <Route path="/past-lots/:lotId" element={<PastLotPage />} />
      </Routes>,
      { me: personOf({ memberships: [{ organization: dunlatch, roles: ['plumber'] }] }), at: `/past-lots/${uuid(17)}` },
    );
    expect(
      await screen.findByText('Corrin Pipe took over from Dunlatch Plumbing: Plumbing contractor'),
    ).toBeInTheDocument();
    expect(screen.getByText('112')).toBeInTheDocument();
    expect(screen.queryByRole('button')).not.toBeInTheDocument();
  });

  it('of other people are named as lots that are not there', async () => {
    stubApi({
      [`GET /api/past-lots/${uuid(17)}`]: () => refusal('not-found', { params: { what: 'lot' } }),
    });
    renderPage(
      <Routes>
        <Route path="/past-lots/:lotId" element={<PastLotPage />} />
      </Routes>,
      { me: personOf({ memberships: [{ organization: tallowmere, roles: ['desk'] }] }), at: `/past-lots/${uuid(17)}` },
    );
    expect(await screen.findByText('No such lot for you')).toBeInTheDocument();
  });
});
