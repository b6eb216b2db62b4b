import type { Member } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { useErrorWords } from '../../../lib/errors';
import { useChangeMember } from '../api/change-member';
import { RoleChecks } from './role-checks';

/** Changes the roles of one person, in their row. */
export function RolesEditor(props: {
  organization: OrganizationBrief;
  person: Member;
  onLeave: () => void;
}): ReactNode {
  const { organization, person, onLeave } = props;
  const { t } = useTranslation(['accounts', 'common']);
  const [roles, setRoles] = useState(person.roles);
  const changing = useChangeMember(organization.id);
  const words = useErrorWords(changing.error);
  const done = (): void => {
    sayDone({ mark: 'sent', title: t('people.rolesDone', { name: person.name }) });
    onLeave();
  };
  const none = roles.length === 0 ? t('people.rolesRequired') : undefined;
  return (
    <div className="fields">
      <RoleChecks
        kind={organization.kind}
        roles={roles}
        onChange={setRoles}
        label={t('people.changeOf', { name: person.name })}
        error={none ?? (words === null ? undefined : `${words.title}. ${words.next}`)}
      />
      <div className="row wrap">
        <Act
          size="sm"
          busy={changing.isPending}
          cannotYet={none}
          onClick={() => changing.mutate({ personId: person.personId, roles }, { onSuccess: done })}
        >
          {t('people.save')}
        </Act>
        <Act size="sm" kind="text" onClick={onLeave}>
          {t('common.cancel')}
        </Act>
      </div>
    </div>
  );
}
