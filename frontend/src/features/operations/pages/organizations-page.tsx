import { organizationKinds, type OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import { useInfiniteQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { Head } from '../../../components/head';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { useDebounced } from '../../../lib/use-debounced';
import { organizationsQuery } from '../api/organizations';
import { OrganizationForm } from '../components/organization-form';
import '../operations.css';

type KindFilter = OrganizationKind | 'all';

/** Operator: the organizations of this installation, and adding one. */
export function OrganizationsPage(): ReactNode {
  const { t } = useTranslation(['operations', 'common']);
  const [kind, setKind] = useState<KindFilter>('all');
  const [typed, setTyped] = useState('');
  const q = useDebounced(typed.trim());
  const query = useInfiniteQuery(
    organizationsQuery({ kind: kind === 'all' ? undefined : kind, q: q === '' ? undefined : q }),
  );
  const kinds: readonly KindFilter[] = ['all', ...organizationKinds];
  return (
    <>
      <Head
        label={t('organizations.label')}
        title={t('organizations.title')}
        cells={[
          { label: t('organizations.count'), value: query.data?.pages.flatMap((page) => page.items).length ?? '' },
        ]}
      />
      <div className="two-columns">
        <div>
          <div className="filter-row">
            <Choice
              label={t('organizations.filter')}
              options={kinds.map((value) => ({
                value,
                label: value === 'all' ? t('organizations.all') : t(`common.kinds.${value}`),
              }))}
              value={kind}
              onChange={setKind}
            />
            <Field
              label={t('organizations.find')}
              type="search"
              value={typed}
              maxLength={100}
              onChange={(event) => setTyped(event.target.value)}
            />
          </div>
          <QueryState query={query}>
            {({ pages }) => (
              <OrganizationList items={pages.flatMap((page) => page.items)} isFiltered={kind !== 'all' || q !== ''} />
            )}
          </QueryState>
          {query.hasNextPage ? (
            <div className="more-row">
              <Act busy={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
                {t('common.more')}
              </Act>
            </div>
          ) : null}
        </div>
        <Panel title={t('organizations.addTitle')}>
          <OrganizationForm />
        </Panel>
      </div>
    </>
  );
}

function OrganizationList({
  items,
  isFiltered,
}: {
  items: readonly OrganizationBrief[];
  isFiltered: boolean;
}): ReactNode {
  const { t } = useTranslation(['operations', 'common']);
  if (items.length === 0) {
    const which = isFiltered ? 'none' : 'empty';
    return (
      <Plain kind="empty" title={t(`organizations.${which}Title`)}>
        {t(`organizations.${which}Text`)}
      </Plain>
    );
  }
  return (
    <table className="ruled">
      <thead>
        <tr>
          <th scope="col">{t('organizations.name')}</th>
          <th scope="col">{t('organizations.kind')}</th>
          <th scope="col">{t('organizations.phone')}</th>
        </tr>
      </thead>
      <tbody>
        {items.map((organization) => (
          <tr key={organization.id}>
            <th scope="row">{organization.name}</th>
            <td>{t(`common.kinds.${organization.kind}`)}</td>
            <td className="n">{organization.phone}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
