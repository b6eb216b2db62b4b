import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { odderly, personOf, sessionOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { LinkPage, tokenOf } from './link-page';

vi.mock('../components/sign-in-picture', () => ({ SignInPicture: () => null }));

const token = 'a-token-of-twenty-or-more-characters';

function open(kind: string, hash = `#token=${token}`) {
  return renderPage(
    <Routes>
      <Route path="/link/:kind" element={<LinkPage />} />
      <Route path="/" element={<p>the first page</p>} />
    </Routes>,
    { at: `/link/${kind}${hash}` },
  );
}

const invitation = {
  email: 'noor@tallowmere.example.test',
  name: 'Noor Hadley',
  organization: odderly,
  roles: ['superintendent'],
  hasPassword: false,
};

describe('a mailed link', () => {
  it('is not used by being opened, only by a press', async () => {
    const sent = stubApi({ 'POST /api/auth/sign-in-link/use': () => ({ data: sessionOf(personOf()) }) });
    const page = open('sign-in');
    const press = screen.getByRole('button', { name: 'Sign me in' });
    expect(sent).toEqual([]);
    await userEvent.click(press);
    expect(await screen.findByText('the first page')).toBeInTheDocument();
    expect(sent[0]?.body).toEqual({ token });
    expect(page.session.accept).toHaveBeenCalled();
  });

  it('that is used up or cut leads to a new one', async () => {
    stubApi({ 'POST /api/auth/sign-in-link/use': () => refusal('link-expired') });
    open('sign-in');
    await userEvent.click(screen.getByRole('button', { name: 'Sign me in' }));
    expect(await screen.findByRole('link', { name: 'Ask for a new link' })).toHaveAttribute(
      'href',
      '/sign-in?ask=link',
    );
  });

  it('without its token says that it is not whole', () => {
    open('reset', '');
    expect(screen.getByText('This link is not whole')).toBeInTheDocument();
    expect(tokenOf('#token=short')).toBeNull();
    expect(tokenOf(`#token=${token}`)).toBe(token);
  });

  it('of an unknown kind is nobody’s page', () => {
    open('anything');
    expect(screen.getByRole('heading', { level: 1 })).toHaveTextContent('Nothing here for you');
  });
});

describe('a new password', () => {
  it('is refused here when it is short, and by the server when it is well known', async () => {
    const sent = stubApi({ 'POST /api/auth/password-reset/use': () => refusal('password-common') });
    open('reset');
    const field = screen.getByLabelText('New password');
    await userEvent.type(field, 'short');
    await userEvent.click(screen.getByRole('button', { name: /Set the password/ }));
    expect(screen.getByText('8 characters or more.')).toBeInTheDocument();
    expect(sent).toEqual([]);
    await userEvent.type(field, 'er than it was');
    await userEvent.click(screen.getByRole('button', { name: /Set the password/ }));
    await waitFor(() => expect(screen.getByRole('alert')).toHaveTextContent('That password is too well known'));
  });
});

describe('an invitation', () => {
  it('of a new person asks for a name and a password', async () => {
    const sent = stubApi({
      'POST /api/auth/invitation': () => ({ data: invitation }),
      'POST /api/auth/invitation/accept': () => ({ data: sessionOf(personOf()) }),
    });
    open('invitation');
    expect(await screen.findByRole('heading', { name: 'Join Odderly Homes' })).toBeInTheDocument();
    expect(screen.getByLabelText('Your name')).toHaveValue('Noor Hadley');
    await userEvent.type(screen.getByLabelText('Choose a password'), 'three words together');
    await userEvent.click(screen.getByRole('button', { name: 'Join and sign in' }));
    expect(await screen.findByText('the first page')).toBeInTheDocument();
    expect(sent.at(-1)?.body).toEqual({ token, name: 'Noor Hadley', password: 'three words together', locale: 'en' });
  });

  it('of somebody with an account asks for its password alone', async () => {
    const sent = stubApi({
      'POST /api/auth/invitation': () => ({ data: { ...invitation, hasPassword: true } }),
      'POST /api/auth/invitation/accept': () => refusal('sign-in-failed', { params: { triesLeft: 1 } }),
    });
    open('invitation');
    await userEvent.type(await screen.findByLabelText('Your Holdwater password'), 'guess');
    expect(screen.queryByLabelText('Your name')).not.toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Join and sign in' }));
    await waitFor(() => expect(screen.getByRole('alert')).toHaveTextContent('1 try left.'));
    expect(sent.at(-1)?.body).toEqual({ token, password: 'guess' });
  });
});
