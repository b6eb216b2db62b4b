import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import {
  signOut as signOutRoute,
  signOutEverywhere as everywhereRoute,
  updateMe,
} from '@holdwater/shared-types/accounts/auth.contract.js';
import type { Me } from '@holdwater/shared-types/accounts/person.contract.js';
import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { setAccessToken } from '../lib/access-token';
import { call } from '../lib/api';
import { isApiError } from '../lib/api-error';
import { changeLanguage } from '../lib/i18n';
import { SessionContext, type SessionState, type SessionValue } from '../lib/session-context';
import { onSessionLost, onSessionRenewed, refreshAccess } from '../lib/session-refresh';
import { chosenOf, keepChosen, keptChoice, operatorsFrame } from './chosen-organization';

export { useMe, useOrganization, useSession } from '../lib/session-context';

/** Other tabs of this browser are told when one signs out. */
const channelName = 'holdwater.session';

/** Who is signed in, in which organization, and the ways in and out. Asks for a session when it starts. */
export function SessionProvider({ children }: { children: ReactNode }): ReactNode {
  const [state, setState] = useState<SessionState>({ kind: 'starting' });
  const [choice, setChoice] = useState<string | null>(null);
  const person = usePerson(state, setState, setChoice);
  const { accept, forget, start } = person;
  const tellOthers = useOtherTabs(useCallback(() => forget(true), [forget]));
  useEffect(() => start(), [start]);
  useEffect(() => onSessionLost(() => forget(false)), [forget]);
  useEffect(() => onSessionRenewed(({ me }) => person.meetAgain(me)), [person]);
  const replaceMe = useCallback((me: Me) => setState({ kind: 'signed-in', me }), []);
  const me = state.kind === 'signed-in' ? state.me : null;

  const value = useMemo((): SessionValue => {
    const leave = async (route: typeof signOutRoute | typeof everywhereRoute): Promise<void> => {
      await call(route);
      forget(true);
      tellOthers();
    };
    return {
      state,
      me,
      ...chosenOf(me, choice),
      accept,
      replaceMe,
      signOut: () => leave(signOutRoute),
      signOutEverywhere: () => leave(everywhereRoute),
      chooseOrganization: (organizationId) => {
        const next = organizationId ?? operatorsFrame;
        if (me !== null) keepChosen(me.id, next);
        setChoice(next);
      },
      changeLocale: async (locale: Locale) => {
        await changeLanguage(locale);
        if (me !== null) replaceMe(await call(updateMe, { body: { locale } }));
      },
      tryAgain: start,
    };
  }, [state, me, choice, accept, replaceMe, forget, tellOthers, start]);
  return <SessionContext value={value}>{children}</SessionContext>;
}

interface Person {
  readonly accept: (session: Session) => void;
  readonly forget: (hasLeft: boolean) => void;
  readonly start: () => void;
  readonly meetAgain: (me: Me) => void;
}

function usePerson(
  state: SessionState,
  setState: (state: SessionState) => void,
  setChoice: (choice: string | null) => void,
): Person {
  const queryClient = useQueryClient();
  const known = useRef<string | null>(null);
  useEffect(() => {
    known.current = state.kind === 'signed-in' ? state.me.id : null;
  }, [state]);
  return useMemo(() => {
    const meet = (me: Me): void => {
      // Nothing of one person's pages may be shown to the next.
      if (known.current !== null && known.current !== me.id) queryClient.clear();
      known.current = me.id;
      setChoice(keptChoice(me.id));
      setState({ kind: 'signed-in', me });
      void changeLanguage(me.locale);
    };
    const forget = (hasLeft: boolean): void => {
      setAccessToken(null);
      queryClient.clear();
      setState({ kind: 'signed-out', hasLeft });
    };
    return {
      forget,
      accept: ({ accessToken, me }) => {
        setAccessToken(accessToken);
        meet(me);
      },
      meetAgain: (me) => (known.current === me.id ? undefined : meet(me)),
      start: () => {
        setState({ kind: 'starting' });
        refreshAccess().then(
          (session) => meet(session.me),
          (error: unknown) =>
            setState(isNoSession(error) ? { kind: 'signed-out', hasLeft: false } : { kind: 'unknown', error }),
        );
      },
    };
  }, [queryClient, setState, setChoice]);
}

function isNoSession(error: unknown): boolean {
  return isApiError(error) && error.status === 401;
}

function useOtherTabs(onEnded: () => void): () => void {
  const channel = useRef<BroadcastChannel | null>(null);
  useEffect(() => {
    if (typeof BroadcastChannel === 'undefined') return undefined;
    const opened = new BroadcastChannel(channelName);
    opened.onmessage = onEnded;
    channel.current = opened;
    return () => opened.close();
  }, [onEnded]);
  return useCallback(() => channel.current?.postMessage('signed-out'), []);
}
