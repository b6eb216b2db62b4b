import { invitePerson } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { isApiError } from '../../../lib/api-error';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useInvitePerson } from '../api/invite-person';
import { RoleChecks } from './role-checks';

const empty: { name: string; email: string; roles: MemberRole[] } = { name: '', email: '', roles: [] };

/** Invites a person by email, with the roles they will have. */
export function InviteForm({ organization }: { organization: OrganizationBrief }): ReactNode {
  const { t } = useTranslation('accounts');
  const form = useContractForm(invitePerson.body, empty);
  const inviting = useInvitePerson(organization.id);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    if (!form.check(form.values)) return;
    inviting.mutate(form.values, {
      onError: form.takeError,
      onSuccess: (invitation) => {
        form.reset();
        sayDone({ mark: 'sent', title: t('people.invited', { email: invitation.email }) });
      },
    });
  };
  const isTold = isApiError(inviting.error) && Object.keys(inviting.error.fields).length > 0;
  return (
    <form onSubmit={submit} noValidate className="fields">
      <Field
        label={t('people.name')}
        autoComplete="off"
        maxLength={120}
        value={form.values.name}
        error={form.faultOf('name')}
        onChange={(event) => form.set('name', event.target.value)}
      />
      <Field
        label={t('people.email')}
        type="email"
        autoComplete="off"
        value={form.values.email}
        error={form.faultOf('email')}
        onChange={(event) => form.set('email', event.target.value)}
      />
      <RoleChecks
        kind={organization.kind}
        roles={form.values.roles}
        onChange={(roles) => form.set('roles', roles)}
        label={t('people.roles')}
        error={form.faultOf('roles')}
      />
      {inviting.error !== null && !isTold ? <Failed error={inviting.error} level={3} /> : null}
      <div>
        <Act kind="first" type="submit" busy={inviting.isPending}>
          {t('people.inviteAct')}
        </Act>
      </div>
    </form>
  );
}
