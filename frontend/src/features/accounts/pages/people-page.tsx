import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useOrganization } from '../../../app/session';
import { Head } from '../../../components/head';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { peopleQuery } from '../api/people';
import { InviteForm } from '../components/invite-form';
import { OpenInvitations } from '../components/open-invitations';
import { PeopleTable } from '../components/people-table';

/** The people of the chosen organization. */
export function PeoplePage(): ReactNode {
  const { t } = useTranslation('accounts');
  const chosen = useOrganization();
  if (chosen === null) {
    return (
      <Plain kind="none" level={1} title={t('people.noneTitle')}>
        {t('people.noneText')}
      </Plain>
    );
  }
  return <OrganizationPeople key={chosen.organization.id} organizationId={chosen.organization.id} />;
}

function OrganizationPeople({ organizationId }: { organizationId: string }): ReactNode {
  const { t } = useTranslation(['accounts', 'common']);
  const people = useQuery(peopleQuery(organizationId));
  const organization = useOrganization()?.organization;
  return (
    <>
      <Head
        label={t('people.label')}
        title={organization?.name}
        cells={[
          { label: t('people.kind'), value: organization === undefined ? '' : t(`common.kinds.${organization.kind}`) },
          { label: t('people.cellPeople'), value: people.data?.people.length ?? '' },
          { label: t('people.cellInvited'), value: people.data?.invitations.length ?? '' },
        ]}
      />
      <QueryState query={people}>
        {(answer) => (
          <div className="two-columns">
            <div>
              <PeopleTable
                organization={answer.organization}
                people={answer.people}
                canManage={answer.abilities.canManage}
              />
              {answer.people.length < 2 ? (
                <Plain kind="empty" title={t('people.emptyTitle')}>
                  {t('people.emptyText')}
                </Plain>
              ) : null}
            </div>
            <div>
              <Panel title={t('people.inviteTitle')}>
                {answer.abilities.canManage ? (
                  <InviteForm organization={answer.organization} />
                ) : (
                  <p className="mid">{t('people.onlyOwners', { organization: answer.organization.name })}</p>
                )}
              </Panel>
              {answer.abilities.canManage ? (
                <Panel title={t('people.openInvitations')}>
                  <OpenInvitations organizationId={organizationId} invitations={answer.invitations} />
                </Panel>
              ) : null}
            </div>
          </div>
        )}
      </QueryState>
    </>
  );
}
