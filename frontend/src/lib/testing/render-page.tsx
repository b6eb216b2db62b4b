import type { Me } from '@holdwater/shared-types/accounts/person.contract.js';
import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import { render, type RenderResult } from '@testing-library/react';
import type { ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { vi } from 'vitest';
import { chosenOf } from '../../app/chosen-organization';
import { createQueryClient } from '../query-client';
import { SessionContext, type SessionValue } from '../session-context';
import { setScreenWidth } from './screen-width';

export interface RenderedPage extends RenderResult {
  readonly queryClient: QueryClient;
  readonly session: SessionValue;
}

export interface PageOptions {
  /** Null: nobody is signed in. */
  readonly me?: Me | null;
  /** The address, with `?date=` and the like. */
  readonly at?: string;
  readonly session?: Partial<SessionValue>;
  /** Width of the screen, px; a desk's unless told otherwise. */
  readonly widthPx?: number;
}

/** Shows part of the page as it stands in the app: with queries that are never asked twice, a session and an address. */
export function renderPage(
  shown: ReactNode,
  { me = null, at = '/', session: given = {}, widthPx = 1440 }: PageOptions = {},
): RenderedPage {
  setScreenWidth(widthPx);
  const queryClient = createQueryClient();
  queryClient.setDefaultOptions({
    queries: { retry: false, networkMode: 'always' },
    mutations: { networkMode: 'always' },
  });
  const session: SessionValue = { ...sessionValue(me), ...given };
  const result = render(
    <QueryClientProvider client={queryClient}>
      <SessionContext value={session}>
        <MemoryRouter initialEntries={[at]}>{shown}</MemoryRouter>
      </SessionContext>
    </QueryClientProvider>,
  );
  return { ...result, queryClient, session };
}

function sessionValue(me: Me | null): SessionValue {
  return {
    state: me === null ? { kind: 'signed-out', hasLeft: false } : { kind: 'signed-in', me },
    me,
    ...chosenOf(me, null),
    accept: vi.fn(),
    replaceMe: vi.fn(),
    signOut: vi.fn(() => Promise.resolve()),
    signOutEverywhere: vi.fn(() => Promise.resolve()),
    chooseOrganization: vi.fn(),
    changeLocale: vi.fn(() => Promise.resolve()),
    tryAgain: vi.fn(),
  };
}
