import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSearchParams } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { ruleCardVersionQuery } from '../api/rule-card-version';
import { findOpenVisit, findStanding, type TestedPart } from '../standing-tests';
import { LotTestsHead } from './lot-tests-head';
import { PartCells } from './part-cells';
import { TestSheet } from './test-sheet';
import { UpStrip } from './up-strip';

interface LotTestsProps {
  lot: LotDetail;
  holds: readonly Hold[];
  visits: readonly VisitSummary[];
}

/** The tests of the stage that is next: of the visit that is open, else of the lot's current stage; `?stage=` chooses another. */
export function LotTests({ lot, holds, visits }: LotTestsProps): ReactNode {
  const [search] = useSearchParams();
  const open = visits.find((one) => openVisitStates.some((state) => state === one.state));
  const stageCode = search.get('stage') ?? open?.stageCode ?? lot.currentStage;
  const unitNumber = Number(search.get('unit') ?? lot.units[0]?.number ?? 1);
  const visit = stageCode === null ? null : findOpenVisit(visits, stageCode, unitNumber);
  const departmentId = visit?.departmentId ?? lot.departmentId;
  const ruleCard = useQuery(
    ruleCardVersionQuery(departmentId === null ? null : { departmentId, version: visit?.ruleCardVersion ?? null }),
  );
  const stage = ruleCard.data?.content.stages.find(({ code }) => code === stageCode);
  return (
    <>
      <LotTestsHead lot={lot} stage={stage ?? null} visit={visit} />
      {departmentId === null ? (
        <NothingToTest lotId={lot.id} why="noDepartment" />
      ) : stageCode === null ? (
        <NothingToTest lotId={lot.id} why="allClear" />
      ) : (
        <QueryState query={ruleCard}>
          {(card) => (
            <StageTests
              lot={lot}
              holds={holds}
              visit={visit}
              ruleCard={card}
              stageCode={stageCode}
              unitNumber={unitNumber}
            />
          )}
        </QueryState>
      )}
    </>
  );
}

interface StageTestsProps {
  lot: LotDetail;
  holds: readonly Hold[];
  visit: VisitSummary | null;
  ruleCard: RuleCard;
  stageCode: string;
  unitNumber: number;
}

function StageTests({ lot, holds, visit, ruleCard, stageCode, unitNumber }: StageTestsProps): ReactNode {
  const [search, setSearch] = useSearchParams();
  const systems = ruleCard.content.stages.find(({ code }) => code === stageCode)?.systems ?? [];
  const asked = systems.find((one) => one === search.get('system'));
  const open = systems.find((system) => findStanding(holds, { unitNumber, system }, stageCode) === null);
  const system = asked ?? open ?? systems[0];
  const rule = ruleCard.content.tests.find((one) => one.stageCode === stageCode && one.system === system);
  if (system === undefined || rule === undefined) return <NothingToTest lotId={lot.id} why="noTest" />;
  const part: TestedPart = { unitNumber, system };
  const hold = findStanding(holds, part, stageCode);
  const choose = (next: TestedPart): void =>
    setSearch(
      (before) => {
        const after = new URLSearchParams(before);
        after.set('unit', String(next.unitNumber));
        after.set('system', next.system);
        return after;
      },
      { replace: true },
    );
  return (
    <>
      <UpStrip visit={visit} />
      <PartCells
        lot={lot}
        holds={holds}
        visit={visit}
        stageCode={stageCode}
        ruleCard={ruleCard}
        systems={systems}
        chosen={part}
        onChoose={choose}
      />
      <TestSheet
        key={`${lot.id}.${unitNumber}.${system}`}
        lot={lot}
        holds={holds}
        visit={visit}
        ruleCard={ruleCard}
        rule={rule}
        part={part}
        hold={hold}
      />
    </>
  );
}

function NothingToTest({ lotId, why }: { lotId: string; why: 'noDepartment' | 'allClear' | 'noTest' }): ReactNode {
  const { t } = useTranslation('holds');
  return (
    <Plain kind="empty" title={t(`nothing.${why}.title`)} acts={<Act to={`/lots/${lotId}`}>{t('nothing.toLot')}</Act>}>
      {t(`nothing.${why}.text`)}
    </Plain>
  );
}
