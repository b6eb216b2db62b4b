import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { PhoneHead } from '../../../components/head';
import { StateWord } from '../../../components/state-word';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { QueryState } from '../../../lib/query-state';
import { useHasThreadColumn } from '../../../lib/use-media';
import { ruleCardQuery } from '../../departments/api/rule-card';
import { ThreadPanel } from '../../threads/components/thread-panel';
import { lotCorrectionsQuery } from '../api/lot-corrections';
import { lotHoldsQuery } from '../api/lot-holds';
import { lotVisitsQuery } from '../api/lot-visits';
import { findOpenVisit, testsOf, unitState, useLotView, zoneOf } from '../lot-view';
import { useLotAnalysis } from '../use-lot-analysis';
import { BeforeClear } from './before-clear';
import { Changes } from './changes';
import { CorrectionsPart } from './corrections-part';
import { SectionPart } from './section-part';
import { TestLog } from './test-log';
import { TitleFacts } from './title-facts';
import { TitleNumber, TitleState } from './title-block';
import { TitleVisit } from './title-visit';
import { VisitsPart } from './visits-part';
import '../lot-sheet.css';
import '../lot-title.css';

/**
 * The lot sheet: on desk the title block at the right edge, on a very wide one the thread in a column of its own beside it, on a phone one
 * column in the order of what is needed there.
 */
export function LotSheet({ lot }: { lot: LotDetail }): ReactNode {
  const { t } = useTranslation(['lots', 'common', 'marks']);
  const isPhone = useSheetWidth() === 'phone';
  const hasThreadColumn = useHasThreadColumn();
  const view = useLotView(lot);
  const holds = useQuery(lotHoldsQuery(lot.id));
  const visits = useQuery(lotVisitsQuery(lot.id));
  const corrections = useQuery(lotCorrectionsQuery(lot.id));
  const ruleCard = useQuery({ ...ruleCardQuery(lot.ruleCard?.id ?? ''), enabled: lot.ruleCard !== null });
  const zone = zoneOf(lot);
  const known = {
    visits: visits.data?.items ?? [],
    holds: holds.data?.items ?? [],
    corrections: corrections.data?.items ?? [],
  };
  const rule =
    ruleCard.data?.content.tests.find((one) => one.stageCode === view.stage?.code && one.system === view.system) ??
    null;
  const analysis = useLotAnalysis(
    lot,
    testsOf(known.holds, view)[0] ?? null,
    findOpenVisit(known.visits, view.stage?.code),
    rule,
  );
  const isGroundwork = ruleCard.data?.content.stages.find(({ code }) => code === view.stage?.code)?.covers === 'slab';
  const { abilities } = lot;
  // The thumb button is for whoever puts tests up; the superintendent's first act on a phone is the request.
  const hasThumb = isPhone && abilities.canAddReading && !abilities.canDecide && !abilities.canEdit;
  const top = (
    <>
      <TitleState lot={lot} view={view} />
      <QueryState query={visits}>
        {({ items }) => <TitleVisit lot={lot} view={view} visit={findOpenVisit(items, view.stage?.code)} />}
      </QueryState>
    </>
  );
  const rest = (
    <>
      <TitleFacts lot={lot} />
      <Changes lotId={lot.id} zone={zone} />
      <BeforeClear lotId={lot.id} view={view} {...known} />
    </>
  );
  const section = (
    <QueryState query={holds}>
      {({ items }) => (
        <SectionPart
          lot={lot}
          view={view}
          tests={testsOf(items, view)}
          corrections={known.corrections}
          rule={rule}
          isGroundwork={isGroundwork}
          zone={zone}
        />
      )}
    </QueryState>
  );
  const log = (
    <QueryState query={holds}>
      {({ items }) => (
        <TestLog
          lotId={lot.id}
          tests={testsOf(items, view)}
          systemWord={t(`common.systems.${view.system}`)}
          zone={zone}
          canAddReading={abilities.canAddReading && !hasThumb}
          canTest={abilities.canTest && !hasThumb}
          abilities={abilities}
          analysis={analysis}
        />
      )}
    </QueryState>
  );
  if (isPhone) {
    return (
      <article className="lot-phone">
        <PhoneHead
          backTo="/lots"
          label={lot.tract?.name ?? lot.address}
          title={<span>{t('common.lot', { number: lot.number })}</span>}
          right={view.stage === null ? undefined : <StateWord state={unitState(view.stage, view.unitNumber)} />}
        />
        <p className="s mid phone-address">{lot.address}</p>
        {top}
        {section}
        {log}
        <CorrectionsPart query={corrections} zone={zone} />
        <VisitsPart query={visits} />
        <div className="phone-acts">
          <Act icon="notices" to={`/lots/${lot.id}/thread`} wide>
            {t('sheet.thread')}
          </Act>
          {abilities.canEdit || abilities.canSetPermit ? (
            <Act to={`/lots/${lot.id}/edit`}>{t('title.edit')}</Act>
          ) : null}
        </div>
        {rest}
        {hasThumb ? (
          <div className="thumb">
            <Act kind="first" size="lg" wide to={`/lots/${lot.id}/test`}>
              {t('log.add')}
            </Act>
          </div>
        ) : null}
      </article>
    );
  }
  const thread = (
    <div className="lot-thread">
      <ThreadPanel lotId={lot.id} />
    </div>
  );
  return (
    <article className={hasThreadColumn ? 'lot-sheet with-thread' : 'lot-sheet'}>
      <div className="lot-title">
        <TitleNumber lot={lot} />
        {top}
        {rest}
      </div>
      <div className="lot-main">
        <div className="lot-pair">
          {section}
          {log}
        </div>
        <div className={hasThreadColumn ? 'lot-trio of-2' : 'lot-trio'}>
          <CorrectionsPart query={corrections} zone={zone} />
          <VisitsPart query={visits} />
          {hasThreadColumn ? null : thread}
        </div>
      </div>
      {hasThreadColumn ? thread : null}
    </article>
  );
}
