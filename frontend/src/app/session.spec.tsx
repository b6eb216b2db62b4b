import { QueryClientProvider } from '@tanstack/react-query';
import { act, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import i18next from 'i18next';
import type { ReactNode } from 'react';
import { MemoryRouter, Route, Routes, useLocation } from 'react-router-dom';
import { afterEach, describe, expect, it } from 'vitest';
import { getAccessToken, setAccessToken } from '../lib/access-token';
import { createQueryClient } from '../lib/query-client';
import { personOf, sessionOf } from '../lib/testing/people';
import { noAnswer, refusal, stubApi } from '../lib/testing/stub-api';
import { SessionProvider, useSession } from './session';
import { SignedIn } from './signed-in';

afterEach(async () => {
  setAccessToken(null);
  window.localStorage.clear();
  await i18next.changeLanguage('en');
});

function Inside(): ReactNode {
  const { me, signOut, changeLocale } = useSession();
  return (
    <>
      <p>in as {me?.name}</p>
      <button onClick={() => void signOut().catch(() => undefined)}>leave</button>
      <button onClick={() => void changeLocale('es')}>es</button>
    </>
  );
}

function Where(): ReactNode {
  const { pathname, search } = useLocation();
  return (
    <p>
      at {pathname}
      {search}
    </p>
  );
}

function open(at: string) {
  const queryClient = createQueryClient();
  render(
    <QueryClientProvider client={queryClient}>
      <SessionProvider>
        <MemoryRouter initialEntries={[at]}>
          <Routes>
            <Route path="/sign-in" element={<Where />} />
            <Route
              path="*"
              element={
                <SignedIn>
                  <Inside />
                </SignedIn>
              }
            />
          </Routes>
        </MemoryRouter>
      </SessionProvider>
    </QueryClientProvider>,
  );
  return queryClient;
}

const refreshed = { 'POST /api/auth/refresh': () => ({ data: sessionOf(personOf()) }) };

describe('at the start', () => {
  it('the refresh cookie brings the person back', async () => {
    stubApi(refreshed);
    open('/lots');
    expect(await screen.findByText('in as Della Arkwright')).toBeInTheDocument();
    expect(getAccessToken()).toBe('token-1');
  });

  it('without one the page asked for waits behind the sign-in', async () => {
    stubApi({ 'POST /api/auth/refresh': () => refusal('signed-out') });
    open('/lots/17?tab=test');
    expect(await screen.findByText('at /sign-in?to=%2Flots%2F17%3Ftab%3Dtest')).toBeInTheDocument();
  });

  it('without an answer nobody is called signed out, and it can be tried again', async () => {
    let answers = 0;
    stubApi({
      'POST /api/auth/refresh': () => (answers++ === 0 ? noAnswer('ERR_NETWORK') : { data: sessionOf(personOf()) }),
    });
    open('/lots');
    expect(await screen.findByRole('heading', { name: 'No signal' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('in as Della Arkwright')).toBeInTheDocument();
  });

  it('the page takes the language of the person', async () => {
    stubApi({ 'POST /api/auth/refresh': () => ({ data: sessionOf(personOf({ locale: 'es' })) }) });
    open('/');
    await screen.findByText('in as Della Arkwright');
    await waitFor(() => expect(document.documentElement.lang).toBe('es'));
  });
});

describe('signing out', () => {
  it('forgets the person, the token and everything read, and leaves no way back in the address', async () => {
    stubApi({ ...refreshed, 'POST /api/auth/sign-out': () => ({ data: { done: true } }) });
    const queryClient = open('/lots/17');
    await screen.findByText('in as Della Arkwright');
    queryClient.setQueryData(['lot', '17'], { secret: true });
    await userEvent.click(screen.getByText('leave'));
    expect(await screen.findByText('at /sign-in')).toBeInTheDocument();
    expect(getAccessToken()).toBeNull();
    expect(queryClient.getQueryData(['lot', '17'])).toBeUndefined();
  });

  it('does not pretend when the server was not reached: the cookie would still be good', async () => {
    stubApi({ ...refreshed, 'POST /api/auth/sign-out': () => noAnswer('ERR_NETWORK') });
    open('/lots');
    await screen.findByText('in as Della Arkwright');
    await userEvent.click(screen.getByText('leave'));
    expect(screen.getByText('in as Della Arkwright')).toBeInTheDocument();
    expect(getAccessToken()).toBe('token-1');
  });
});

it('keeps the language on the person and on this device', async () => {
  const sent = stubApi({ ...refreshed, 'PATCH /api/me': () => ({ data: personOf({ locale: 'es' }) }) });
  open('/');
  await screen.findByText('in as Della Arkwright');
  await userEvent.click(screen.getByText('es'));
  await waitFor(() => expect(sent.find(({ method }) => method === 'PATCH')?.body).toEqual({ locale: 'es' }));
  expect(window.localStorage.getItem('holdwater.language')).toBe('es');
});

it('shows nothing of one person to the next who signed in in another tab', async () => {
  stubApi(refreshed);
  const queryClient = open('/');
  await screen.findByText('in as Della Arkwright');
  queryClient.setQueryData(['lots'], ['lot 17']);
  const other = personOf({ id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c11', name: 'Ruben Achterberg' });
  stubApi({ 'POST /api/auth/refresh': () => ({ data: sessionOf(other, 'token-2') }) });
  const { refreshAccess } = await import('../lib/session-refresh');
  await act(async () => {
    await refreshAccess();
  });
  expect(await screen.findByText('in as Ruben Achterberg')).toBeInTheDocument();
  expect(queryClient.getQueryData(['lots'])).toBeUndefined();
});
