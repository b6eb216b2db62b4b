import { acceptInvitation, newPassword, type readInvitation } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Cell, Cells } from '../../../components/cells';
import { Field } from '../../../components/field';
import { useLocale } from '../../../lib/i18n';
import { useContractForm } from '../../../lib/use-contract-form';
import { useInvitationAccept } from '../api/use-link';
import { PasswordField } from './password-field';
import { RefusedLine } from './refused-line';

type Invitation = RouteAnswer<typeof readInvitation>;

/** A new person must choose both; the contract leaves them open for those who have an account. */
const newPerson = acceptInvitation.body.required({ name: true }).extend({ password: newPassword });
const knownPerson = acceptInvitation.body.required({ password: true });

/** Joins with a name and a password of one's choice, or with the password one has. */
export function InvitationForm({ token, invitation }: { token: string; invitation: Invitation }): ReactNode {
  const { t } = useTranslation('accounts');
  const locale = useLocale();
  const navigate = useNavigate();
  const { hasPassword } = invitation;
  const form = useContractForm(hasPassword ? knownPerson : newPerson, { name: invitation.name, password: '' });
  const joining = useInvitationAccept();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const { name, password } = form.values;
    const body = hasPassword ? { token, password } : { token, password, name, locale };
    if (!form.check(body)) return;
    joining.mutate(body, { onError: form.takeError, onSuccess: () => void navigate('/', { replace: true }) });
  };
  return (
    <form onSubmit={submit} noValidate>
      <InvitedTo invitation={invitation} />
      <div className="door-fields">
        {hasPassword ? null : (
          <Field
            label={t('link.yourName')}
            labelPlace="inside"
            autoComplete="name"
            maxLength={120}
            value={form.values.name}
            error={form.faultOf('name')}
            onChange={(event) => form.set('name', event.target.value)}
          />
        )}
        <PasswordField
          label={hasPassword ? t('link.ownPassword') : t('link.choosePassword')}
          autoComplete={hasPassword ? 'current-password' : 'new-password'}
          value={form.values.password}
          error={form.faultOf('password')}
          hint={hasPassword ? t('link.ownPasswordHint') : t('link.passwordHint')}
          onChange={(password) => form.set('password', password)}
        />
      </div>
      <RefusedLine error={joining.error} />
      <div className="door-acts">
        <Act kind="first" type="submit" size="lg" wide busy={joining.isPending}>
          {t('link.joinAct')}
        </Act>
      </div>
    </form>
  );
}

function InvitedTo({ invitation }: { invitation: Invitation }): ReactNode {
  const { t } = useTranslation(['accounts', 'common']);
  const { organization, roles, email } = invitation;
  const asWhat =
    organization === null ? t('common.roles.operator') : roles.map((role) => t(`common.roles.${role}`)).join(', ');
  return (
    <>
      <div className="door-part">
        <h1 className="h2">
          {organization === null
            ? t('link.operatorTitle')
            : t('link.invitationTitle', { organization: organization.name })}
        </h1>
      </div>
      <Cells columns={2}>
        <Cell label={t('link.invitedAs')}>{asWhat}</Cell>
        <Cell label={t('link.for')}>{email}</Cell>
      </Cells>
    </>
  );
}
