import type { HouseModelBrief } from '@holdwater/shared-types/lots/house-model.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { useOrganization } from '../../../app/session';
import { Act } from '../../../components/act';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { houseModelsQuery } from '../api/house-models';
import { HouseHead } from '../components/house-head';
import '../lots.css';
import '../house-models.css';

/** The houses a builder saved under names, with how many lots use each. */
export function HouseModelsPage(): ReactNode {
  const { t } = useTranslation(['houses', 'lots']);
  const chosen = useOrganization();
  if (chosen?.organization.kind === 'builder') return <Models builderId={chosen.organization.id} />;
  return (
    <>
      <HouseHead title={t('page.title')} backTo="/lots" />
      <Plain kind="none" title={t('page.onlyBuilders')} acts={<Act to="/lots">{t('lots.form.toLots')}</Act>}>
        {t('page.onlyBuildersText')}
      </Plain>
    </>
  );
}

function Models({ builderId }: { builderId: string }): ReactNode {
  const { t } = useTranslation('houses');
  const models = useQuery(houseModelsQuery(builderId));
  const add = models.data?.canWrite ? (
    <Act kind="first" icon="plus" to="/lots/houses/new">
      {t('acts.add')}
    </Act>
  ) : undefined;
  return (
    <>
      <HouseHead
        title={t('page.title')}
        backTo="/lots"
        cells={[{ label: t('page.count'), value: models.data?.items.length ?? '' }]}
        acts={models.data?.items.length === 0 ? undefined : add}
      />
      <QueryState query={models} loading={<Lines rows={6} />}>
        {({ items, canWrite }) =>
          items.length === 0 ? (
            <Plain kind="empty" title={t('page.empty')} acts={add}>
              {t(canWrite ? 'page.emptyText' : 'page.emptyReader')}
            </Plain>
          ) : (
            <ModelsTable models={items} />
          )
        }
      </QueryState>
    </>
  );
}

function ModelsTable({ models }: { models: readonly HouseModelBrief[] }): ReactNode {
  const { t } = useTranslation('houses');
  return (
    <table className="ruled" aria-label={t('page.title')}>
      <thead>
        <tr>
          {(['name', 'version', 'floors', 'lots', 'changed', 'behind'] as const).map((column) => (
            <th key={column} scope="col">
              {t(`columns.${column}`)}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {models.map(({ id, name, version, geometry, use }) => (
          <tr key={id}>
            <th scope="row">
              <Link to={`/lots/houses/${id}`}>{name}</Link>
            </th>
            <td data-label={t('columns.version')} className="n">
              {version}
            </td>
            <td data-label={t('columns.floors')} className="n">
              {geometry.floors.length}
            </td>
            <td data-label={t('columns.lots')} className="n">
              {use.lots}
            </td>
            <td data-label={t('columns.changed')} className="n">
              {use.changed}
            </td>
            <td data-label={t('columns.behind')} className={use.behind > 0 ? 'n t-brass' : 'n'}>
              {use.behind}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
