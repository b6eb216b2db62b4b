import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { odderly, personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { lotDetailOf, uuid } from '../testing/lot-fixtures';
import { ConsentsPage } from './consents-page';
import { LotFormPage } from './lot-form-page';
import { LotImportPage } from './lot-import-page';

const noTracts = { 'GET /api/tracts': () => ({ data: { items: [] } }) };

function form(at: string) {
  return renderPage(
    <Routes>
      <Route path="/lots/new" element={<LotFormPage />} />
      <Route path="/lots/:lotId/edit" element={<LotFormPage />} />
      <Route path="*" element={<p>elsewhere</p>} />
    </Routes>,
    { me: personOf(), at },
  );
}

describe('a new lot', () => {
  it('is not sent before the contract takes it, and the focus goes to the first fault', async () => {
    const sent = stubApi(noTracts);
    form('/lots/new');
    await userEvent.type(await screen.findByLabelText('Telephone on site, optional'), 'call me');
    await userEvent.click(screen.getByRole('button', { name: 'Add the lot' }));
    expect(screen.getAllByText('This is needed.')).toHaveLength(2);
    expect(screen.getByText(/Digits, spaces/)).toBeInTheDocument();
    await waitFor(() => expect(screen.getByLabelText('Lot number')).toHaveFocus());
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('is sent with the department that is to be asked, and what is taken is said at its field', async () => {
    const sent = stubApi({
      ...noTracts,
      'GET /api/organizations': () => ({ data: { items: [tallowmere], nextCursor: null } }),
      'POST /api/lots': () => refusal('lot-number-taken', { fields: { number: 'taken' } }),
    });
    form('/lots/new');
    await userEvent.type(await screen.findByLabelText('Lot number'), '17');
    await userEvent.type(screen.getByLabelText('Address'), '418 Sedge Loop');
    await userEvent.click(screen.getByLabelText('Department, optional'));
    await userEvent.click(await screen.findByRole('button', { name: /Tallowmere/ }));
    await userEvent.click(screen.getByRole('button', { name: 'Add lot 17' }));
    expect(await screen.findByText('This is in use.')).toBeInTheDocument();
    expect(screen.getByLabelText('Address')).toHaveValue('418 Sedge Loop');
    expect(sent.find(({ method }) => method === 'POST')?.body).toMatchObject({
      ...{ builderId: odderly.id, number: '17', departmentId: tallowmere.id, plumberId: null, latitude: null },
      permit: { number: null, status: 'not-applied', holder: null },
    });
  });
});

describe('a lot that stands', () => {
  it('sends the permit alone for those who may set no more', async () => {
    const sent = stubApi({
      [`GET /api/lots/${uuid(17)}`]: () => ({ data: lotDetailOf({ canSetPermit: true }) }),
      [`PATCH /api/lots/${uuid(17)}`]: () => ({ data: lotDetailOf({ canSetPermit: true }) }),
    });
    form(`/lots/${uuid(17)}/edit`);
    await userEvent.selectOptions(await screen.findByLabelText('Permit is'), 'expired');
    expect(screen.queryByLabelText('Lot number')).not.toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Save lot 17' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'PATCH')).toBeDefined());
    expect(sent.find(({ method }) => method === 'PATCH')?.body).toEqual({
      permit: { number: '26-04137-P', status: 'expired', holder: null },
    });
  });

  it('says of a measure that is none what is wrong, and draws on', async () => {
    const sent = stubApi({ [`GET /api/lots/${uuid(17)}`]: () => ({ data: lotDetailOf({ canEditGeometry: true }) }) });
    form(`/lots/${uuid(17)}/edit`);
    const vent = await screen.findByLabelText('Lowest open vent terminal, optional');
    await userEvent.clear(vent);
    await userEvent.type(vent, 'high');
    await userEvent.click(screen.getByRole('button', { name: 'Save the house' }));
    expect(screen.getByText('A number.')).toBeInTheDocument();
    expect(screen.getByRole('img', { name: /Section through the house/ })).toBeInTheDocument();
    expect(sent.some(({ method }) => method === 'PUT')).toBe(false);
  });
});

describe('a list of lots', () => {
  const path = 'POST /api/lots/import';
  const page = () => renderPage(<LotImportPage />, { me: personOf() });

  it('is tried first, and told line by line what is wrong', async () => {
    const faults = [
      { line: 3, column: 'permit_status', code: 'not-one-of-the-choices', value: 'isued', suggestion: 'issued' },
      { line: 1, column: 'adress', code: 'unknown-column', value: 'adress', suggestion: 'address' },
    ];
    const sent = stubApi({ ...noTracts, [path]: () => ({ data: { isImported: false, lots: 2, faults } }) });
    page();
    await userEvent.type(await screen.findByLabelText('Or paste the list'), 'number,adress');
    await userEvent.click(screen.getByRole('button', { name: 'Try it' }));
    const rows = within(await screen.findByRole('table'))
      .getAllByRole('row')
      .slice(1);
    expect(rows.map((row) => row.textContent)).toEqual([
      '1adressNo such column. Did you mean address?adress',
      '3permit_statusChoose one of those offered. Did you mean issued?isued',
    ]);
    expect(sent.find(({ method }) => method === 'POST')?.body).toMatchObject({ isTrial: true });
    expect(screen.queryByRole('button', { name: /^Add 2 lots/ })).not.toBeInTheDocument();
  });

  it('is added only as it was tried', async () => {
    stubApi({ ...noTracts, [path]: () => ({ data: { isImported: false, lots: 2, faults: [] } }) });
    page();
    const text = await screen.findByLabelText('Or paste the list');
    await userEvent.type(text, 'number,address');
    await userEvent.click(screen.getByRole('button', { name: 'Try it' }));
    await screen.findByRole('button', { name: 'Add 2 lots' });
    await userEvent.type(text, ',units');
    expect(screen.queryByRole('button', { name: 'Add 2 lots' })).not.toBeInTheDocument();
  });
});

describe('lots that ask in', () => {
  const dunlatch = { id: uuid(60), name: 'Dunlatch Plumbing', kind: 'plumber', phone: '555-0115' };
  const asked = (number: string) => ({
    ...{ lotId: uuid(Number(number)), lotNumber: number, tractName: null, address: '418 Sedge Loop' },
    ...{ builderName: 'Odderly Homes', kind: 'plumber', organization: dunlatch, askedAt: '2026-04-14T15:00:00Z' },
    handover: null,
  });

  it('are joined several at once, without those taken out', async () => {
    const sent = stubApi({
      'GET /api/consents': () => ({ data: { items: [asked('17'), asked('18')] } }),
      'POST /api/consents': () => ({ data: { done: true } }),
    });
    renderPage(<ConsentsPage />, { me: personOf() });
    await userEvent.click(await screen.findByRole('checkbox', { name: '18' }));
    await userEvent.click(screen.getByRole('button', { name: 'Join 1 lot' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'POST')).toBeDefined());
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      organizationId: dunlatch.id,
      lotIds: [uuid(17)],
      isJoining: true,
    });
  });

  it('are refused only after a question that says who is told', async () => {
    const sent = stubApi({ 'GET /api/consents': () => ({ data: { items: [asked('17')] } }) });
    renderPage(<ConsentsPage />, { me: personOf() });
    await userEvent.click(await screen.findByRole('button', { name: 'Refuse 1 lot' }));
    expect(screen.getByRole('dialog', { name: 'Refuse 1 lot?' })).toHaveTextContent('Odderly Homes is told');
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
  });
});
