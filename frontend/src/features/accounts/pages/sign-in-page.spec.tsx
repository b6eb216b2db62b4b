import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { personOf, sessionOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { noAnswer, refusal, stubApi } from '../../../lib/testing/stub-api';
import { safePath, SignInPage } from './sign-in-page';

vi.mock('../components/sign-in-picture', () => ({ SignInPicture: () => null }));

async function fillIn(email: string, password: string): Promise<void> {
  await userEvent.type(screen.getByLabelText('Email'), email);
  await userEvent.type(screen.getByLabelText('Password'), password);
  await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
}

describe('signing in', () => {
  it('hands the session on', async () => {
    const session = sessionOf(personOf());
    const sent = stubApi({ 'POST /api/auth/sign-in': () => ({ data: session }) });
    const page = renderPage(<SignInPage />, { at: '/sign-in' });
    await fillIn('della@odderly.example.test', 'water over the stack');
    await waitFor(() => expect(page.session.accept).toHaveBeenCalled());
    expect(vi.mocked(page.session.accept).mock.calls[0]?.[0]).toEqual(session);
    expect(sent[0]?.body).toEqual({ email: 'della@odderly.example.test', password: 'water over the stack' });
  });

  it('says how many tries are left, and keeps what was typed', async () => {
    stubApi({ 'POST /api/auth/sign-in': () => refusal('sign-in-failed', { params: { triesLeft: 4 } }) });
    renderPage(<SignInPage />, { at: '/sign-in' });
    await fillIn('della@odderly.example.test', 'wrong');
    await waitFor(() =>
      expect(screen.getByRole('alert')).toHaveTextContent('Email or password do not match. 4 tries left.'),
    );
    expect(screen.getByLabelText('Email')).toHaveValue('della@odderly.example.test');
  });

  it('asks nothing of the server before both are there and the email can be one', async () => {
    const sent = stubApi({});
    renderPage(<SignInPage />, { at: '/sign-in' });
    await fillIn('della', 'x');
    expect(screen.getByText(/An email looks like/)).toBeInTheDocument();
    expect(screen.getByLabelText('Email')).toBeInvalid();
    await userEvent.clear(screen.getByLabelText('Password'));
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(screen.getByText('This is needed.')).toBeInTheDocument();
    expect(sent).toEqual([]);
  });

  it('tells no signal from a wrong password', async () => {
    stubApi({ 'POST /api/auth/sign-in': () => noAnswer('ERR_NETWORK') });
    renderPage(<SignInPage />, { at: '/sign-in' });
    await fillIn('della@odderly.example.test', 'right');
    await waitFor(() => expect(screen.getByRole('alert')).toHaveTextContent('No signal'));
  });

  it('shows and hides the password', async () => {
    renderPage(<SignInPage />, { at: '/sign-in' });
    expect(screen.getByLabelText('Password')).toHaveAttribute('type', 'password');
    await userEvent.click(screen.getByRole('button', { name: 'Show' }));
    expect(screen.getByLabelText('Password')).toHaveAttribute('type', 'text');
  });
});

describe('without the password', () => {
  it.each([
    ['link', '/api/auth/sign-in-link'],
    ['reset', '/api/auth/password-reset'],
  ])('a %s is mailed, and what is said tells nothing of the address', async (ask, path) => {
    const sent = stubApi({ [`POST ${path}`]: () => ({ status: 202, data: { done: true } }) });
    renderPage(<SignInPage />, { at: `/sign-in?ask=${ask}` });
    await userEvent.type(screen.getByLabelText('Email'), 'anyone@example.test');
    await userEvent.click(screen.getByRole('button', { name: 'Email the link' }));
    expect(await screen.findByText(/If anyone@example.test belongs to somebody here/)).toBeInTheDocument();
    expect(sent).toHaveLength(1);
  });
});

describe('the way back', () => {
  it.each([
    ['/lots/17?tab=test', '/lots/17?tab=test'],
    ['//elsewhere.example.test', '/'],
    ['/\\elsewhere.example.test', '/'],
    ['https://elsewhere.example.test', '/'],
    ['/sign-in?to=/lots', '/'],
    [null, '/'],
  ])('to %s leads to %s', (to, path) => expect(safePath(to)).toBe(path));
});
