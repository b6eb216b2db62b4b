import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import i18next from 'i18next';
import { Route, Routes } from 'react-router-dom';
import { afterEach, describe, expect, it } from 'vitest';
import { odderly, personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { houseModelOf, modelledUnitOf, originOf, planId } from '../testing/house-fixtures';
import { house, lotDetailOf, uuid } from '../testing/lot-fixtures';
import { HouseApplyPage } from './house-apply-page';
import { HouseModelFormPage } from './house-model-form-page';
import { HouseModelPage } from './house-model-page';
import { HouseModelsPage } from './house-models-page';

const path = `/api/house-models/${planId}`;
const tract = { id: uuid(900), name: 'Sorrel Bench', builderId: odderly.id, builderName: 'Odderly Homes', lotCount: 3 };

function page(at: string, options: Parameters<typeof renderPage>[1] = {}) {
  return renderPage(
    <Routes>
      <Route path="/lots/houses" element={<HouseModelsPage />} />
      <Route path="/lots/houses/new" element={<HouseModelFormPage />} />
      <Route path="/lots/houses/:houseModelId" element={<HouseModelPage />} />
      <Route path="/lots/houses/:houseModelId/edit" element={<HouseModelFormPage />} />
      <Route path="/lots/houses/:houseModelId/apply" element={<HouseApplyPage />} />
      <Route path="*" element={<p>elsewhere</p>} />
    </Routes>,
    { me: personOf(), at, ...options },
  );
}

afterEach(() => i18next.changeLanguage('en'));

describe('the house models', () => {
  const list = (items: object[], canWrite = true) => ({
    'GET /api/house-models': () => ({ data: { items, canWrite } }),
  });

  it('are listed with the lots that use each and those at an earlier version', async () => {
    const use = { units: 4, lots: 3, changed: 1, behind: 2 };
    const { abilities: _, versions: _v, units: _u, ...brief } = houseModelOf({ use });
    stubApi(list([brief]));
    page('/lots/houses');
    const row = (await screen.findAllByRole('row'))[1];
    expect(row?.textContent).toBe('Plan 221022312');
    expect(screen.getByRole('link', { name: 'Plan 2210' })).toHaveAttribute('href', `/lots/houses/${planId}`);
    expect(screen.getByRole('link', { name: 'Save a house model' })).toBeInTheDocument();
  });

  it('say what to do where there is none, in Spanish too', async () => {
    stubApi(list([]));
    await i18next.changeLanguage('es');
    page('/lots/houses');
    expect(await screen.findByText('Todavía no hay casas guardadas')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Guardar un modelo de casa' })).toBeInTheDocument();
  });

  it('say what failed and can be asked for again', async () => {
    let tries = 0;
    stubApi({
      'GET /api/house-models': () => {
        tries += 1;
        return tries === 1 ? refusal('busy') : { data: { items: [], canWrite: false } };
      },
    });
    page('/lots/houses');
    await userEvent.click(await screen.findByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('No house is saved yet')).toBeInTheDocument();
    expect(screen.queryByRole('link', { name: 'Save a house model' })).not.toBeInTheDocument();
  });

  it('are not for other parties', async () => {
    const sent = stubApi({});
    const memberships = [{ organization: tallowmere, roles: ['desk' as const] }];
    page('/lots/houses', { me: personOf({ memberships }) });
    expect(await screen.findByText("House models are a builder's")).toBeInTheDocument();
    expect(sent).toEqual([]);
  });
});

describe('saving a house model', () => {
  it('begins with the house of a lot, and sends it under its name', async () => {
    const sent = stubApi({
      [`GET /api/lots/${uuid(17)}`]: () => ({ data: lotDetailOf({ canEdit: true }) }),
      'POST /api/house-models': () => ({ status: 201, data: houseModelOf({ version: 1 }) }),
      [`GET ${path}`]: () => ({ data: houseModelOf({ version: 1 }) }),
    });
    page(`/lots/houses/new?lot=${uuid(17)}&unit=1`);
    await userEvent.type(await screen.findByLabelText('Name of the model'), 'Plan 2210');
    await userEvent.click(screen.getByRole('button', { name: 'Save the model' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      ...{ builderId: odderly.id, name: 'Plan 2210', geometry: house },
    });
  });

  it('asks for the name, and says at its field that it is taken', async () => {
    const sent = stubApi({
      'POST /api/house-models': () => refusal('house-model-name-taken', { fields: { name: 'taken' } }),
    });
    page('/lots/houses/new');
    const name = await screen.findByLabelText('Name of the model');
    await userEvent.click(screen.getByRole('button', { name: 'Save the model' }));
    expect(screen.getByText('This is needed.')).toBeInTheDocument();
    await waitFor(() => expect(name).toHaveFocus());
    expect(sent).toEqual([]);
    await userEvent.type(name, 'Plan 2210');
    await userEvent.click(screen.getByRole('button', { name: 'Save the model' }));
    expect(await screen.findByText('This is in use.')).toBeInTheDocument();
  });

  it('refuses what cannot be by the rules of the server, and opens the fold it lies in', async () => {
    const sent = stubApi({});
    page('/lots/houses/new');
    await userEvent.type(await screen.findByLabelText('Name of the model'), 'Plan 0');
    await userEvent.type(screen.getByLabelText('Highest fitting, optional'), '27');
    await userEvent.type(screen.getByLabelText('Lowest open vent terminal, optional'), '26');
    await userEvent.click(screen.getByText('Test plugs'));
    await userEvent.click(screen.getByRole('button', { name: 'Add a test plug' }));
    const plug = within(screen.getByRole('group', { name: 'Test plug 1' }));
    await userEvent.type(plug.getByLabelText('Name'), 'drain');
    await userEvent.type(plug.getByLabelText('Height'), '-3');
    await userEvent.type(plug.getByLabelText('Rated for'), '17');
    await userEvent.click(screen.getByText('Test plugs'));
    const fold = screen.getByText('Test plugs').closest('details');
    expect(fold).not.toHaveAttribute('open');
    await userEvent.click(screen.getByRole('button', { name: 'Save the model' }));
    expect(screen.getByText('This is above the vent terminal.')).toBeInTheDocument();
    expect(screen.getByText('Choose the size of the plug.')).toBeInTheDocument();
    await waitFor(() => expect(fold).toHaveAttribute('open'));
    expect(screen.getByText('Drain pipes').closest('details')).not.toHaveAttribute('open');
    expect(sent).toEqual([]);
  });

  it('is drawn as it is typed, in metres for who works in them', async () => {
    stubApi({});
    page('/lots/houses/new', { me: personOf({ units: 'metric' }) });
    expect(await screen.findByText('Meters above the finished first floor; below it a minus.')).toBeInTheDocument();
    const drawing = screen.getByRole('img', { name: /Section through the house/ });
    expect(drawing).toHaveTextContent('m above plug');
    const before = drawing.innerHTML;
    await userEvent.click(screen.getByRole('button', { name: 'Add a floor' }));
    const second = within(screen.getByRole('group', { name: 'Floor 2' }));
    await userEvent.type(second.getByLabelText('Name'), 'upper');
    await userEvent.type(second.getByLabelText('Height'), '3.1');
    expect(screen.getByRole('img', { name: /Section through the house/ }).innerHTML).not.toBe(before);
  });

  it('makes the next version of one, on the version it was looked at', async () => {
    const sent = stubApi({
      [`GET ${path}`]: () => ({ data: houseModelOf() }),
      [`POST ${path}/versions`]: () => ({ data: houseModelOf({ version: 3 }) }),
    });
    page(`/lots/houses/${planId}/edit`);
    const vent = await screen.findByLabelText('Lowest open vent terminal, optional');
    await userEvent.clear(vent);
    await userEvent.type(vent, '25');
    await userEvent.click(screen.getByRole('button', { name: 'Save version 3' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      ...{ expectedVersion: 2, geometry: { ...house, ventTerminalFt: 25 } },
    });
  });
});

describe('a house model', () => {
  it('shows what was changed on its lots, and offers the newest version to those at an earlier one', async () => {
    const units = [modelledUnitOf('17', { origin: originOf(['atticCutFt', 'laundry']), isByHand: true })];
    const use = { units: 1, lots: 1, changed: 1, behind: 1 };
    stubApi({ [`GET ${path}`]: () => ({ data: houseModelOf({ units, use }) }) });
    page(`/lots/houses/${planId}`);
    expect(await screen.findByText('vent cut in the attic and laundry')).toBeInTheDocument();
    expect(screen.getByText('1 house is at an earlier version.')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Offer version 2 to them' })).toHaveAttribute(
      'href',
      `/lots/houses/${planId}/apply?behind=1`,
    );
    expect(screen.getByRole('button', { name: /Remove the model/ })).toHaveTextContent('1 lot uses it');
  });

  it('is removed after one question', async () => {
    const sent = stubApi({
      [`GET ${path}`]: () => ({ data: houseModelOf() }),
      [`DELETE ${path}`]: () => ({ data: { done: true } }),
      'GET /api/house-models': () => ({ data: { items: [], canWrite: true } }),
    });
    page(`/lots/houses/${planId}`);
    await userEvent.click(await screen.findByRole('button', { name: 'Remove the model' }));
    expect(sent.some(({ method }) => method === 'DELETE')).toBe(false);
    const question = within(screen.getByRole('dialog', { name: 'Remove Plan 2210?' }));
    await userEvent.click(question.getByRole('button', { name: 'Remove the model' }));
    expect(await screen.findByText('No house is saved yet')).toBeInTheDocument();
  });
});

describe('giving a model to lots', () => {
  const units = [
    modelledUnitOf('1'),
    modelledUnitOf('2', { isByHand: true }),
    modelledUnitOf('3', { isByHand: true, canKeepChanges: true, origin: originOf(['atticCutFt']) }),
    modelledUnitOf('4', { isMeasured: true, isSame: true, origin: originOf([], 2) }),
  ];
  const served = {
    [`GET ${path}`]: () => ({ data: houseModelOf({ units: units.slice(2) }) }),
    'GET /api/tracts': () => ({ data: { items: [{ ...tract, plat: null }] } }),
    [`GET ${path}/units`]: () => ({ data: { items: units, isCut: false } }),
    [`POST ${path}/apply`]: () => ({ data: { units: 2, lots: 2, alreadySo: 0 } }),
  };

  it('asks first about houses changed by hand, by their names, and sends all in one act', async () => {
    const sent = stubApi(served);
    page(`/lots/houses/${planId}/apply`);
    expect(await screen.findByRole('checkbox', { name: /Lot 4/ })).toBeDisabled();
    await userEvent.click(screen.getByRole('button', { name: 'Choose all 3' }));
    await userEvent.click(screen.getByRole('button', { name: 'Give it to 3 houses' }));
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
    expect(screen.getByRole('heading', { name: '2 houses were changed by hand' })).toHaveFocus();
    const own = within(screen.getByRole('radiogroup', { name: 'Lot 2, House' }));
    expect(own.queryByLabelText('Keep its changes')).not.toBeInTheDocument();
    expect(own.getByLabelText('Leave as it is')).toBeChecked();
    await userEvent.click(
      within(screen.getByRole('radiogroup', { name: 'Lot 3, House' })).getByLabelText('Keep its changes'),
    );
    await userEvent.click(screen.getByRole('button', { name: 'Give it to 2 houses' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      expectedVersion: 2,
      units: [
        { lotId: uuid(1), unitNumber: 1, whenChanged: 'ask' },
        { lotId: uuid(3), unitNumber: 1, whenChanged: 'keep-changes' },
      ],
    });
  });

  it('offers the newest version to the lots at an earlier one', async () => {
    stubApi(served);
    page(`/lots/houses/${planId}/apply?behind=1`);
    expect(await screen.findByRole('checkbox', { name: /Lot 3/ })).toBeChecked();
    expect(screen.queryByRole('checkbox', { name: /Lot 1/ })).not.toBeInTheDocument();
    expect(screen.getByText(/changed on the lot: vent cut in the attic/)).toBeInTheDocument();
  });

  it('does nothing before a lot is chosen, and says so in the act', async () => {
    const sent = stubApi(served);
    page(`/lots/houses/${planId}/apply`, { widthPx: 390 });
    const give = await screen.findByRole('button', { name: /Give it to 0 houses/ });
    expect(give).toHaveTextContent('none chosen');
    await userEvent.click(give);
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('says what the server refused, and nothing is lost', async () => {
    stubApi({ ...served, [`POST ${path}/apply`]: () => refusal('houses-changed-by-hand', { params: { count: 1 } }) });
    page(`/lots/houses/${planId}/apply`);
    await userEvent.click(await screen.findByRole('checkbox', { name: /Lot 1/ }));
    await userEvent.click(screen.getByRole('button', { name: 'Give it to 1 house' }));
    expect(await screen.findByText('Some of these houses were changed by hand')).toBeInTheDocument();
    expect(screen.getByRole('checkbox', { name: /Lot 1/ })).toBeChecked();
  });

  it('is not for whoever may not set the houses of lots', async () => {
    const abilities = { canWrite: true, canApply: false };
    stubApi({ [`GET ${path}`]: () => ({ data: houseModelOf({ abilities }) }) });
    page(`/lots/houses/${planId}/apply`);
    expect(await screen.findByText("Giving a model to lots is the superintendent's")).toBeInTheDocument();
  });
});
