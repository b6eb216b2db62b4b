import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Lines } from '../../../components/lines';
import { isApiError } from '../../../lib/api-error';
import { useErrorWords } from '../../../lib/errors';
import { invitationQuery } from '../api/invitation';
import { InvitationForm } from './invitation-form';
import { LinkTrouble } from './link-trouble';
import { RefusedLine } from './refused-line';

/** A mailed invitation: what it invites to, then name and password. */
export function InvitationLink({ token }: { token: string }): ReactNode {
  const { t } = useTranslation('common');
  const invitation = useQuery(invitationQuery(token));
  const words = useErrorWords(invitation.error);
  if (invitation.isPending) {
    return (
      <div className="door-part">
        <Lines rows={3} />
      </div>
    );
  }
  if (invitation.isSuccess) return <InvitationForm token={token} invitation={invitation.data} />;
  if (isApiError(invitation.error, 'link-expired')) {
    return (
      <LinkTrouble title={words?.title} askKind="invitation">
        {words?.safe} {words?.next}
      </LinkTrouble>
    );
  }
  return (
    <>
      <RefusedLine error={invitation.error} />
      <div className="door-acts">
        <Act kind="first" onClick={() => void invitation.refetch()}>
          {t('tryAgain')}
        </Act>
      </div>
    </>
  );
}
