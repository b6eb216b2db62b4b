import type { Tract } from '@holdwater/shared-types/lots/tract.contract.js';
import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Plain } from '../../../components/plain';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { localName, useLocale } from '../../../lib/i18n';
import type { ScopedLots } from '../api/lots';
import { filtered, lotRows, stagesOf, usualStage, type LotRow } from '../lots-model';
import { useLotsAddress } from '../use-lots-address';
import { ChosenLot } from './chosen-lot';
import { FilterChips } from './filter-chips';
import { LotsHead, LotsPhoneHead } from './lots-head';
import { LotsTable } from './lots-table';
import { AddActs, RequestAct, TableHead, useLotActs } from './lots-acts';
import { PlatPart } from './plat-part';
import '../plat.css';
import '../lots-table.css';

export interface LotsSheetProps {
  tracts: readonly Tract[];
  tract: Tract | null;
  scoped: ScopedLots;
  waiting: readonly WaitingItem[];
  isWaitingUnknown: boolean;
}

/** The lot chosen, where a window could be asked for it; null otherwise. */
function askableId(row: LotRow | null): string | null {
  if (row === null || row.lot.nextVisit !== null || row.lot.openCorrections > 0 || row.lot.departmentId === null)
    return null;
  return row.state === 'clear' || row.state === 'put-back-due' ? null : row.lot.id;
}

/** Plat beside table, one lot chosen for both. */
export function LotsSheet({ tracts, tract, scoped, waiting, isWaitingUnknown }: LotsSheetProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const locale = useLocale();
  const address = useLotsAddress();
  const isPhone = useSheetWidth() === 'phone';
  const acts = useLotActs();
  const [picked, setPicked] = useState<ReadonlySet<string>>(new Set());
  const stages = stagesOf(scoped.lots);
  const stage =
    stages.find(({ code }) => code === address.stage) ?? stages.find(({ code }) => code === usualStage(scoped.lots));
  const stageName = stage === undefined ? '' : localName(stage.name, locale);
  const all = lotRows(scoped.lots, stage?.code ?? null, waiting);
  const open = filtered(all, address.filter);
  // With nothing under way the whole tract is more use than an empty table.
  const rows = open.length === 0 && address.filter === 'open' ? all : open;
  const chosen = all.find(({ lot }) => lot.id === address.chosenId) ?? null;
  const choose = (lotId: string): void => address.change({ lot: lotId });
  const pick = (lotId: string, isPicked: boolean): void => {
    const next = new Set(picked);
    if (isPicked) next.add(lotId);
    else next.delete(lotId);
    setPicked(next);
  };
  const head = { tracts, tract, lots: scoped.lots, stages, stageCode: stage?.code ?? null };
  const table =
    all.length === 0 ? (
      <Plain kind="empty" title={t('page.emptyTitle')} acts={<AddActs acts={acts} tractId={tract?.id ?? null} />}>
        {t(acts.canAdd ? 'page.emptyBuilder' : 'page.emptyText')}
      </Plain>
    ) : (
      <>
        <FilterChips rows={all} filter={address.filter} onChange={(filter) => address.change({ filter })} />
        {isWaitingUnknown ? <p className="s mid table-note">{t('page.waitingUnknown')}</p> : null}
        {scoped.isCut ? <p className="s t-brass table-note">{t('page.cut', { count: scoped.lots.length })}</p> : null}
        <LotsTable
          rows={rows}
          stageName={stageName}
          chosenId={chosen?.lot.id ?? null}
          onChoose={choose}
          picked={picked}
          onPick={acts.canRequest ? pick : undefined}
          hasTracts={tract === null && tracts.length > 0}
        />
        {rows.length < all.length ? (
          <p className="s mid table-note">
            {address.filter === 'open' ? `${t('table.rest')} ` : null}
            <button type="button" className="link-act" onClick={() => address.change({ filter: 'all' })}>
              {t('table.showAll', { count: all.length })}
            </button>
          </p>
        ) : null}
      </>
    );
  const plat = (
    <PlatPart tract={tract} rows={all} stageName={stageName} chosenId={chosen?.lot.id ?? null} onChoose={choose} />
  );
  if (isPhone) {
    return (
      <>
        <LotsPhoneHead {...head} shown={rows.length} />
        {address.part === 'plat' && all.length > 0 ? plat : table}
        {address.part === 'plat' && chosen ? <ChosenLot row={chosen} stageName={stageName} /> : null}
        <div className="phone-acts">
          <AddActs acts={acts} tractId={tract?.id ?? null} />
        </div>
        {acts.canRequest ? (
          <div className="thumb">
            <RequestAct picked={picked} chosenId={null} stageCode={stage?.code ?? null} />
          </div>
        ) : null}
      </>
    );
  }
  return (
    <div className="lots-split">
      <div className="lots-plat">
        <LotsHead {...head} />
        <div className="lots-drawing">{all.length === 0 ? null : plat}</div>
        {all.length === 0 ? null : <ChosenLot row={chosen} stageName={stageName} />}
      </div>
      <section className="lots-side" aria-label={t('table.label')}>
        <TableHead shown={rows.length} total={all.length}>
          <AddActs acts={acts} tractId={tract?.id ?? null} />
          {acts.canRequest ? (
            <RequestAct picked={picked} chosenId={askableId(chosen)} stageCode={stage?.code ?? null} />
          ) : null}
        </TableHead>
        {table}
      </section>
    </div>
  );
}
