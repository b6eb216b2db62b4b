import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { odderly, personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { PeoplePage } from './people-page';

const me = personOf({}, ['owner', 'superintendent']);
const other = {
  personId: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c12',
  name: 'Wes Pomfret',
  email: 'wes@odderly.example.test',
  phone: null,
  roles: ['superintendent'],
  isDisabled: false,
};
const self = { ...other, personId: me.id, name: me.name, email: me.email, roles: ['superintendent', 'owner'] };
const path = `/api/organizations/${odderly.id}`;

function people(canManage: boolean, invitations: object[] = []) {
  return { data: { organization: odderly, people: [self, other], invitations, abilities: { canManage } } };
}

describe('the people of an organization', () => {
  it('are read by any member, and managed by nobody the server does not let', async () => {
    stubApi({ [`GET ${path}/people`]: () => people(false) });
    renderPage(<PeoplePage />, { me });
    expect(await screen.findByRole('row', { name: /Wes Pomfret/ })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Change the roles/ })).not.toBeInTheDocument();
    expect(screen.getByText(/An owner of Odderly Homes invites people/)).toBeInTheDocument();
  });

  it('change roles in their row, one at least', async () => {
    const sent = stubApi({
      [`GET ${path}/people`]: () => people(true),
      [`PATCH ${path}/people/${other.personId}`]: () => ({ data: { ...other, roles: ['superintendent', 'owner'] } }),
    });
    renderPage(<PeoplePage />, { me });
    await userEvent.click(await screen.findByRole('button', { name: 'Change the roles of Wes Pomfret' }));
    const row = screen.getByRole('row', { name: /Wes Pomfret/ });
    await userEvent.click(within(row).getByRole('checkbox', { name: 'Superintendent' }));
    await userEvent.click(within(row).getByRole('button', { name: /Save the roles/ }));
    expect(sent.filter(({ method }) => method === 'PATCH')).toEqual([]);
    await userEvent.click(within(row).getByRole('checkbox', { name: 'Owner' }));
    await userEvent.click(within(row).getByRole('checkbox', { name: 'Superintendent' }));
    await userEvent.click(within(row).getByRole('button', { name: 'Save the roles' }));
    await waitFor(() =>
      expect(sent.find(({ method }) => method === 'PATCH')?.body).toEqual({ roles: ['superintendent', 'owner'] }),
    );
  });

  it('are disabled only after a question, and the refusal stands in it', async () => {
    stubApi({
      [`GET ${path}/people`]: () => people(true),
      [`PATCH ${path}/people/${other.personId}`]: () => refusal('last-owner'),
    });
    renderPage(<PeoplePage />, { me });
    await userEvent.click(await screen.findByRole('button', { name: 'Disable' }));
    const dialog = screen.getByRole('dialog', { name: /Disable Wes Pomfret/ });
    await userEvent.click(within(dialog).getByRole('button', { name: 'Disable' }));
    expect(await within(dialog).findByRole('alert')).toHaveTextContent('Somebody must stay owner');
  });

  it('are invited by email, with what is wrong beside its field', async () => {
    const sent = stubApi({
      [`GET ${path}/people`]: () => people(true),
      [`POST ${path}/invitations`]: () => refusal('already-member', { fields: { email: 'taken' } }),
    });
    renderPage(<PeoplePage />, { me });
    const panel = await screen.findByRole('region', { name: 'Invite a person' });
    await userEvent.click(within(panel).getByRole('button', { name: 'Send the invitation' }));
    expect(within(panel).getAllByText('This is needed.').length).toBeGreaterThan(0);
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
    await userEvent.type(within(panel).getByLabelText('Name'), 'Ada Quill');
    await userEvent.type(within(panel).getByLabelText('Email'), 'ada@odderly.example.test');
    await userEvent.click(within(panel).getByRole('checkbox', { name: 'Superintendent' }));
    await userEvent.click(within(panel).getByRole('button', { name: 'Send the invitation' }));
    expect(await within(panel).findByText('This is in use.')).toBeInTheDocument();
    expect(within(panel).getByLabelText('Name')).toHaveValue('Ada Quill');
  });

  it('say why they cannot be shown, and are read again on request', async () => {
    let asked = 0;
    stubApi({
      [`GET ${path}/people`]: () => (asked++ === 0 ? refusal('internal', { entry: '7f3-20c' }) : people(true)),
    });
    renderPage(<PeoplePage />, { me });
    expect(await screen.findByText('7f3-20c')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('row', { name: /Wes Pomfret/ })).toBeInTheDocument();
  });
});
