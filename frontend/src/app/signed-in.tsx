import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Navigate, useLocation } from 'react-router-dom';
import { Act } from '../components/act';
import { Plain } from '../components/plain';
import { useErrorWords } from '../lib/errors';
import { useSession } from '../lib/session-context';
import { BlankSheet } from './blank-sheet';

export interface SignedInProps {
  children: ReactNode;
  /** What others see of a page that anyone may read; without it they sign in first and come back to the page they asked for. */
  otherwise?: ReactNode;
}

/** Shows its children to somebody signed in. */
export function SignedIn({ children, otherwise }: SignedInProps): ReactNode {
  const { state } = useSession();
  const { pathname, search } = useLocation();
  if (state.kind === 'signed-in') return children;
  if (state.kind === 'unknown') return <SessionUnknown error={state.error} />;
  if (state.kind === 'starting') return <BlankSheet />;
  if (otherwise !== undefined) return otherwise;
  // Whoever just left goes to a plain sign-in; a deep link waits for whoever comes.
  const to = `${pathname}${search}`;
  return <Navigate replace to={state.hasLeft || to === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(to)}`} />;
}

/** The server was not reached: it is not known whether somebody is signed in. */
export function SessionUnknown({ error }: { error: unknown }): ReactNode {
  const { t } = useTranslation('common');
  const { tryAgain } = useSession();
  const words = useErrorWords(error);
  return (
    <main className="sheet">
      <Plain
        kind="error"
        level={1}
        title={words?.title}
        entry={words?.entry ?? undefined}
        acts={
          <Act kind="first" onClick={tryAgain}>
            {t('tryAgain')}
          </Act>
        }
      >
        {words?.safe} {words?.next}
      </Plain>
    </main>
  );
}
