import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useLocation, useParams } from 'react-router-dom';
import { NotFoundPage } from '../../../app/not-found-page';
import { DoorSheet } from '../components/door-sheet';
import { InvitationLink } from '../components/invitation-link';
import { LinkTrouble } from '../components/link-trouble';
import { ResetLink } from '../components/reset-link';
import { SignInLink } from '../components/sign-in-link';

const kinds = { 'sign-in': SignInLink, reset: ResetLink, invitation: InvitationLink } as const;

function isKind(kind: string): kind is keyof typeof kinds {
  return Object.hasOwn(kinds, kind);
}

/** The token of a mailed link. It stands behind the `#`, which browsers never send, so no log can hold it. */
export function tokenOf(hash: string): string | null {
  const token = new URLSearchParams(hash.replace(/^#/, '')).get('token');
  return token !== null && token.length >= 20 ? token : null;
}

/** Where a mailed link leads: signing in, a new password, or joining an organization. */
export function LinkPage(): ReactNode {
  const { t } = useTranslation('accounts');
  const { kind = '' } = useParams();
  const { hash } = useLocation();
  if (!isKind(kind)) return <NotFoundPage />;
  const token = tokenOf(hash);
  const Link = kinds[kind];
  return (
    <DoorSheet>
      <title>Holdwater</title>
      {token === null ? (
        <LinkTrouble title={t('link.incomplete')} askKind={kind}>
          {t('link.incompleteText')}
        </LinkTrouble>
      ) : (
        <Link key={token} token={token} />
      )}
    </DoorSheet>
  );
}
