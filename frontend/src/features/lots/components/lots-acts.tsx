import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useOrganization } from '../../../app/session';
import { Act } from '../../../components/act';

export interface LotActs {
  readonly canAdd: boolean;
  readonly canRequest: boolean;
  /** A builder's own people read its house models. */
  readonly hasHouseModels: boolean;
}

/**
 * What may be begun from a list of lots. No lot is meant yet, so no server's ability tells: as the top bar does, it goes by what the person
 * is in the chosen organization; the server has the last word on each lot.
 */
export function useLotActs(): LotActs {
  const chosen = useOrganization();
  const roles = chosen?.roles ?? [];
  return {
    canAdd: roles.includes('superintendent'),
    canRequest: roles.includes('superintendent') || roles.includes('plumber') || roles.includes('desk'),
    hasHouseModels: chosen?.organization.kind === 'builder',
  };
}

export function AddActs({ acts, tractId }: { acts: LotActs; tractId: string | null }): ReactNode {
  const { t } = useTranslation('lots');
  const query = tractId === null ? '' : `?tract=${tractId}`;
  return (
    <>
      {acts.canAdd ? (
        <>
          <Act icon="plus" to={`/lots/new${query}`}>
            {t('acts.add')}
          </Act>
          <Act to={`/lots/import${query}`}>{t('acts.import')}</Act>
        </>
      ) : null}
      {acts.hasHouseModels ? <Act to="/lots/houses">{t('acts.houses')}</Act> : null}
    </>
  );
}

export interface RequestActProps {
  picked: ReadonlySet<string>;
  chosenId: string | null;
  stageCode: string | null;
}

/** Goes to the calendar with the lots picked, or with the one chosen. */
export function RequestAct({ picked, chosenId, stageCode }: RequestActProps): ReactNode {
  const { t } = useTranslation('lots');
  const lotIds = picked.size > 0 ? [...picked] : chosenId === null ? [] : [chosenId];
  const search = new URLSearchParams({ request: lotIds.join(',') });
  if (stageCode !== null && lotIds.length > 0) search.set('stage', stageCode);
  return (
    <Act kind="first" to={`/calendar?${search.toString()}`}>
      {lotIds.length === 0 ? t('acts.request') : t('acts.requestFor', { count: lotIds.length })}
    </Act>
  );
}

export function TableHead({
  shown,
  total,
  children,
}: {
  shown: number;
  total: number;
  children: ReactNode;
}): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <header className="hd">
      <div className="c t">
        <div className="lab">{t('table.label')}</div>
        <h2 className="v">{t('table.shown', { shown, total })}</h2>
      </div>
      <div className="c x">{children}</div>
    </header>
  );
}
