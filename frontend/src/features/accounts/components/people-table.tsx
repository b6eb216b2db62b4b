import type { Member } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useChangeMember } from '../api/change-member';
import { RolesEditor } from './roles-editor';

export interface PeopleTableProps {
  organization: OrganizationBrief;
  people: readonly Member[];
  canManage: boolean;
}

/** Who works here, as what; an owner changes roles and disables. */
export function PeopleTable({ organization, people, canManage }: PeopleTableProps): ReactNode {
  const { t } = useTranslation('accounts');
  return (
    <table className="ruled">
      <thead>
        <tr>
          <th scope="col">{t('people.name')}</th>
          <th scope="col">{t('people.roles')}</th>
          <th scope="col">{t('people.email')}</th>
          <th scope="col">{t('people.phone')}</th>
          <th scope="col">{t('people.state')}</th>
          {canManage ? <td /> : null}
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <PersonRow key={person.personId} organization={organization} person={person} canManage={canManage} />
        ))}
      </tbody>
    </table>
  );
}

interface PersonRowProps {
  organization: OrganizationBrief;
  person: Member;
  canManage: boolean;
}

function PersonRow({ organization, person, canManage }: PersonRowProps): ReactNode {
  const { t } = useTranslation(['accounts', 'common']);
  const me = useMe();
  const [isEditing, setIsEditing] = useState(false);
  const roles = person.roles.map((role) => t(`common.roles.${role}`)).join(', ');
  return (
    <tr className={person.isDisabled ? 'off' : undefined}>
      <th scope="row">
        {person.name}
        {person.personId === me.id ? <span className="mut">, {t('people.you')}</span> : null}
      </th>
      <td>
        {isEditing ? (
          <RolesEditor organization={organization} person={person} onLeave={() => setIsEditing(false)} />
        ) : (
          roles
        )}
      </td>
      <td data-label={t('people.email')}>{person.email}</td>
      <td data-label={t('people.phone')} className="n">
        {person.phone}
      </td>
      <td data-label={t('people.state')}>{person.isDisabled ? t('people.disabled') : t('people.works')}</td>
      {canManage ? (
        <td className="acts-cell">
          <div className="row">
            {isEditing || person.isDisabled ? null : (
              <Act
                size="sm"
                aria-label={t('people.changeOf', { name: person.name })}
                onClick={() => setIsEditing(true)}
              >
                {t('people.change')}
              </Act>
            )}
            {person.personId === me.id ? null : <DisableAct organization={organization} person={person} />}
          </div>
        </td>
      ) : null}
    </tr>
  );
}

function DisableAct({ organization, person }: Omit<PersonRowProps, 'canManage'>): ReactNode {
  const { t } = useTranslation('accounts');
  const [isAsking, setIsAsking] = useState(false);
  const changing = useChangeMember(organization.id);
  const words = useErrorWords(changing.error);
  const change = (isDisabled: boolean): void =>
    changing.mutate(
      { personId: person.personId, isDisabled },
      {
        onSuccess: () => {
          setIsAsking(false);
          sayDone({
            mark: 'sent',
            title: t(isDisabled ? 'people.disabledDone' : 'people.enabledDone', { name: person.name }),
          });
        },
      },
    );
  if (person.isDisabled) {
    return (
      <>
        <Act size="sm" busy={changing.isPending} onClick={() => change(false)}>
          {t('people.enable')}
        </Act>
        {words === null ? null : <span role="alert">{words.title}</span>}
      </>
    );
  }
  return (
    <>
      <Act size="sm" kind="text" onClick={() => setIsAsking(true)}>
        {t('people.disable')}
      </Act>
      <Question
        isOpen={isAsking}
        title={t('people.disableTitle', { name: person.name })}
        keepWord={t('people.keep')}
        endWord={t('people.disable')}
        onKeep={() => setIsAsking(false)}
        onEnd={() => change(true)}
        busy={changing.isPending}
        error={words === null ? undefined : `${words.title}. ${words.next}`}
      >
        {t('people.disableText', { name: person.name, organization: organization.name })}
      </Question>
    </>
  );
}
