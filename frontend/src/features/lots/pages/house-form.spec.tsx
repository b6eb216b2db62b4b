import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { odderly, personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { stubApi } from '../../../lib/testing/stub-api';
import { houseModelOf, originOf, planId } from '../testing/house-fixtures';
import { house, lotDetailOf, uuid } from '../testing/lot-fixtures';
import { LotFormPage } from './lot-form-page';

const lotPath = `GET /api/lots/${uuid(17)}`;
const apply = `POST /api/house-models/${planId}/apply`;
const models = {
  'GET /api/house-models': () => ({ data: { items: [houseModelOf()], canWrite: true } }),
};

function houseForm(widthPx = 1440) {
  return renderPage(
    <Routes>
      <Route path="/lots/:lotId/edit" element={<LotFormPage />} />
      <Route path="*" element={<p>elsewhere</p>} />
    </Routes>,
    { me: personOf(), at: `/lots/${uuid(17)}/edit?part=house`, widthPx },
  );
}

const lotWith = (unit: object, abilities: object) => () => ({
  data: lotDetailOf(abilities, { units: [{ number: 1, label: 'House', geometry: house, ...unit }] }),
});

describe('the house of a lot', () => {
  it('says to the builder which model it is from, what was changed, and that a newer version is there', async () => {
    const unit = { model: originOf(['ventTerminalFt']) };
    stubApi({ ...models, [lotPath]: lotWith(unit, { canEdit: true, canEditGeometry: true }) });
    houseForm();
    const link = await screen.findByRole('link', { name: 'From house model Plan 2210, version 1' });
    expect(link).toHaveAttribute('href', `/lots/houses/${planId}`);
    expect(link.closest('p')).toHaveTextContent('Changed on this lot: vent terminal. Version 2 is there.');
    expect(screen.getByRole('link', { name: 'Save as a house model' })).toHaveAttribute(
      'href',
      `/lots/houses/new?lot=${uuid(17)}&unit=1`,
    );
  });

  it('says the same to the plumber, who is not led to the model and never asks for it', async () => {
    const unit = { model: originOf([]) };
    const sent = stubApi({ [lotPath]: lotWith(unit, { canEditGeometry: true }) });
    houseForm(390);
    expect(await screen.findByText(/From house model Plan 2210, version 1. Nothing is changed/)).toBeInTheDocument();
    expect(screen.queryByRole('link', { name: /Plan 2210/ })).not.toBeInTheDocument();
    expect(sent.map(({ path }) => path)).toEqual([`/api/lots/${uuid(17)}`]);
  });

  it('is short at first: plugs, pipes and what few houses need are folded', async () => {
    stubApi({ [lotPath]: lotWith({}, { canEditGeometry: true }) });
    houseForm();
    await screen.findByLabelText('Lowest open vent terminal, optional');
    for (const title of ['Test plugs', 'Drain pipes', 'Water lines', 'More measures'])
      expect(screen.getByText(title).closest('details')).not.toHaveAttribute('open');
  });

  it('is taken from a model at once where nobody measured it', async () => {
    const sent = stubApi({
      ...models,
      [lotPath]: lotWith({ geometry: null, model: null }, { canEdit: true, canEditGeometry: true }),
      [apply]: () => ({ data: { units: 1, lots: 1, alreadySo: 0 } }),
    });
    houseForm();
    await userEvent.selectOptions(await screen.findByLabelText('Take the house from a model'), 'Plan 2210');
    await userEvent.click(screen.getByRole('button', { name: 'Use this model' }));
    expect(await screen.findByText('elsewhere')).toBeInTheDocument();
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      ...{ expectedVersion: 2, units: [{ lotId: uuid(17), unitNumber: 1, whenChanged: 'ask' }] },
    });
  });

  it('is replaced by a model only after a question where it was measured by hand', async () => {
    const sent = stubApi({
      ...models,
      [lotPath]: lotWith({ model: null }, { canEdit: true, canEditGeometry: true }),
      [apply]: () => ({ data: { units: 1, lots: 1, alreadySo: 0 } }),
    });
    houseForm();
    await userEvent.selectOptions(await screen.findByLabelText('Take the house from a model'), 'Plan 2210');
    await userEvent.click(screen.getByRole('button', { name: 'Use this model' }));
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
    const question = within(screen.getByRole('dialog', { name: 'Replace this house by Plan 2210?' }));
    await userEvent.click(question.getByRole('button', { name: 'Replace it' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toMatchObject({
      units: [{ whenChanged: 'replace' }],
    });
  });

  it('asks for the models of the builder of the lot', async () => {
    const sent = stubApi({ ...models, [lotPath]: lotWith({}, { canEdit: true, canEditGeometry: true }) });
    houseForm();
    await screen.findByLabelText('Take the house from a model');
    expect(sent.find(({ path }) => path === '/api/house-models')?.query).toMatchObject({ builderId: odderly.id });
  });
});
