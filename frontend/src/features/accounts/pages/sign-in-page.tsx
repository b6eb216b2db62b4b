import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Navigate, useSearchParams } from 'react-router-dom';
import { useSession } from '../../../app/session';
import { SessionUnknown } from '../../../app/signed-in';
import { AskMailForm } from '../components/ask-mail-form';
import { DoorSheet } from '../components/door-sheet';
import { SignInForm } from '../components/sign-in-form';

/** Only paths of this page's own: an address from a link never leads elsewhere. */
export function safePath(to: string | null): string {
  return to !== null && /^\/(?![/\\])/.test(to) && !to.startsWith('/sign-in') ? to : '/';
}

/** Sign in: the form is the title block of a sheet. */
export function SignInPage(): ReactNode {
  const { t } = useTranslation('accounts');
  const { state } = useSession();
  const [search] = useSearchParams();
  const ask = search.get('ask');
  if (state.kind === 'signed-in') return <Navigate replace to={safePath(search.get('to'))} />;
  if (state.kind === 'unknown') return <SessionUnknown error={state.error} />;
  return (
    <DoorSheet>
      <title>{`${t('signIn.title')} · Holdwater`}</title>
      {ask === 'link' || ask === 'reset' ? <AskMailForm key={ask} kind={ask} /> : <SignInForm />}
    </DoorSheet>
  );
}
