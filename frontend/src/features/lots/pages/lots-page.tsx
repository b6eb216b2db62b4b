import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { waitingQuery } from '../../../app/layout/counts';
import { useOrganization } from '../../../app/session';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { lotsQuery } from '../api/lots';
import { tractsQuery } from '../api/tracts';
import { LotsSheet } from '../components/lots-sheet';
import { useLotsAddress } from '../use-lots-address';
import '../lots.css';

/** The lots of a tract on its plat and in a table, what waits on the reader first. */
export function LotsPage(): ReactNode {
  const { t } = useTranslation('lots');
  const chosen = useOrganization();
  if (chosen === null) {
    return (
      <Plain kind="none" level={1} title={t('page.noOrganizationTitle')}>
        {t('page.noOrganizationText')}
      </Plain>
    );
  }
  return <OrganizationLots key={chosen.organization.id} organizationId={chosen.organization.id} />;
}

/** The tract with the most lots is shown first; without tracts, all lots. */
function OrganizationLots({ organizationId }: { organizationId: string }): ReactNode {
  const { t } = useTranslation('lots');
  const { tractId } = useLotsAddress();
  const isContractor = useOrganization()?.organization.kind !== 'department';
  const tracts = useQuery(tractsQuery());
  const known = tracts.data?.items ?? [];
  const usual = [...known].sort((a, b) => b.lotCount - a.lotCount)[0]?.id ?? null;
  const shownId = tractId === 'all' ? null : (tractId ?? usual);
  const lots = useQuery({
    ...lotsQuery({ organizationId, tractId: shownId ?? undefined }),
    enabled: tracts.data !== undefined,
  });
  const waiting = useQuery(waitingQuery(organizationId));
  return (
    <QueryState query={tracts} loading={<Lines rows={10} />}>
      {({ items }) => (
        <QueryState query={lots} loading={<Lines rows={10} />}>
          {(scoped) => (
            <>
              <LotsSheet
                tracts={items}
                tract={items.find(({ id }) => id === shownId) ?? null}
                scoped={scoped}
                waiting={waiting.data?.items ?? []}
                isWaitingUnknown={waiting.isError}
              />
              {isContractor ? (
                <p className="past-link s">
                  <Link to="/past-lots">{t('past.title')}</Link>
                </p>
              ) : null}
            </>
          )}
        </QueryState>
      )}
    </QueryState>
  );
}
