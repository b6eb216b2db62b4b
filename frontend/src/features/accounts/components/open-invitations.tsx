import type { Invitation } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { useErrorWords } from '../../../lib/errors';
import { useTimeWords } from '../../../lib/time';
import { useWithdrawInvitation } from '../api/withdraw-invitation';
import './open-invitations.css';

/** Invitations nobody has answered yet. */
export function OpenInvitations(props: { organizationId: string; invitations: readonly Invitation[] }): ReactNode {
  const { t } = useTranslation('accounts');
  if (props.invitations.length === 0) return <p className="mid">{t('people.noInvitations')}</p>;
  return (
    <ul className="invitations">
      {props.invitations.map((invitation) => (
        <InvitationRow key={invitation.id} organizationId={props.organizationId} invitation={invitation} />
      ))}
    </ul>
  );
}

function InvitationRow({ organizationId, invitation }: { organizationId: string; invitation: Invitation }): ReactNode {
  const { t } = useTranslation(['accounts', 'common']);
  const words = useTimeWords();
  const withdrawing = useWithdrawInvitation(organizationId);
  const failed = useErrorWords(withdrawing.error);
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;
  const withdraw = (): void =>
    withdrawing.mutate(invitation.id, {
      onSuccess: () => sayDone({ mark: 'withdrawn', title: t('people.withdrawn', { name: invitation.name }) }),
    });
  return (
    <li className="spread">
      <div className="grow">
        <div className="b">{invitation.name}</div>
        <div className="s mid">{invitation.email}</div>
        <div className="s mid">
          {invitation.roles.map((role) => t(`common.roles.${role}`)).join(', ')},{' '}
          {t('people.until', { day: words.day(invitation.expiresAt, zone) })}
        </div>
        {failed === null ? null : (
          <p className="field-error" role="alert">
            {failed.title}. {failed.next}
          </p>
        )}
      </div>
      <Act
        size="sm"
        busy={withdrawing.isPending}
        aria-label={t('people.withdrawOf', { name: invitation.name })}
        onClick={withdraw}
      >
        {t('people.withdraw')}
      </Act>
    </li>
  );
}
