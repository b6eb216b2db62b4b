import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { TFunction } from 'i18next';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import type { MarkName } from '../../../components/mark';
import { markTones } from '../../../components/mark-names';
import { readPressure } from '../../../lib/units';
import { levelWords } from '../level-words';
import { findStanding, instrumentOf, lastCounted, upState, type TestedPart, type UpState } from '../standing-tests';
import { useKeptTemperatures } from '../use-kept-temperatures';
import { findAnalysis, useElevation } from '../use-test-analysis';
import { verdictKind, verdictMarks } from '../verdict';
import { SystemCells, type SystemCell } from './system-cells';

export interface PartCellsProps {
  lot: LotDetail;
  holds: readonly Hold[];
  visit: VisitSummary | null;
  stageCode: string;
  ruleCard: RuleCard;
  systems: readonly System[];
  chosen: TestedPart;
  onChoose: (part: TestedPart) => void;
}

/** Which unit and which system: each cell says what is up and what is needed. */
export function PartCells(props: PartCellsProps): ReactNode {
  const { lot, systems, chosen, onChoose } = props;
  const { t } = useTranslation(['holds', 'common', 'marks']);
  const verdictOf = useVerdicts(props);
  const cells = systems.map((system) => cellOf(t, props, { unitNumber: chosen.unitNumber, system }, verdictOf));
  return (
    <>
      {lot.units.length > 1 ? (
        <div className="panel-body">
          <Choice
            label={t('page.unit')}
            options={lot.units.map((unit) => ({ value: String(unit.number), label: unit.label }))}
            value={String(chosen.unitNumber)}
            wide
            onChange={(unit) => onChoose({ unitNumber: Number(unit), system: chosen.system })}
          />
        </div>
      ) : null}
      <SystemCells
        label={t('page.system')}
        cells={cells}
        chosen={chosen.system}
        onChoose={(key) => {
          const system = systems.find((one) => one === key);
          if (system !== undefined) onChoose({ unitNumber: chosen.unitNumber, system });
        }}
      />
    </>
  );
}

const markOf: Record<UpState, MarkName> = {
  none: 'booked',
  'no-reading': 'booked',
  below: 'test-short',
  over: 'test-over',
  up: 'ready',
};

type Words = TFunction<['holds', 'common', 'marks']>;
type VerdictOf = (hold: Hold) => (typeof verdictMarks)[keyof typeof verdictMarks] | null;

/** The mark of what a standing test's log says; the inspector reads the gauge before seeing it. */
function useVerdicts({ lot, holds, visit, ruleCard, stageCode, chosen }: PartCellsProps): VerdictOf {
  const [temperatures] = useKeptTemperatures(lot);
  const hasAir = holds.some(({ medium }) => medium !== 'water');
  const elevationFt = useElevation(lot, chosen.unitNumber, hasAir);
  return (test) => {
    if (elevationFt === null || lot.abilities.canDecide) return null;
    const rule = ruleCard.content.tests.find((one) => one.stageCode === stageCode && one.system === test.system);
    const found = findAnalysis({ lot, test, visit, rule: rule ?? null, temperatures }, elevationFt);
    return found && verdictMarks[verdictKind(found.analysis)];
  };
}

function cellOf(
  t: Words,
  { lot, holds, stageCode, ruleCard }: PartCellsProps,
  part: TestedPart,
  verdictOf: VerdictOf,
): SystemCell {
  const hold = findStanding(holds, part, stageCode);
  const state = upState(hold);
  const isLevelUp = state === 'up' && part.system === 'dwv' && hold?.fillLevelFt != null;
  const verdict = hold === null || state !== 'up' ? null : verdictOf(hold);
  const isQuiet = isLevelUp && (verdict === 'test-holds' || verdict === 'test-few');
  const told = isQuiet ? null : verdict;
  const mark = told ?? (isLevelUp ? 'level' : markOf[state]);
  const bare = hold === null ? needs() : stands(hold);
  const line = told === null ? bare : t('cell.told', { what: bare, verdict: t(`marks.${told}`) });
  return { key: part.system, label: t(`common.systems.${part.system}`), line, mark, tone: markTones[mark] };

  function needs(): string {
    const rule = ruleCard.content.tests.find((one) => one.stageCode === stageCode && one.system === part.system);
    const minimums = rule?.pressures.map(({ minimumPsi }) => minimumPsi) ?? [];
    return minimums.length === 0 ? t('cell.notUp') : t('cell.notUpNeeds', { psi: [...new Set(minimums)].join('/') });
  }

  function stands(standing: Hold): string {
    const reading = lastCounted(standing);
    const house = lot.units.find(({ number }) => number === part.unitNumber)?.geometry ?? null;
    if (reading === null) return t('cell.noReading');
    if (reading.pressurePsi === null) {
      return standing.fillLevelFt === null
        ? t('cell.up')
        : t('cell.upAt', { what: levelWords(t, standing.fillLevelFt, house) });
    }
    const { number } = readPressure(reading.pressurePsi, instrumentOf(standing).increment);
    if (state === 'below') return t('cell.below', { psi: number, minimum: standing.minimumPsi ?? 0 });
    return t(state === 'over' ? 'cell.over' : 'cell.upAtPsi', { psi: number });
  }
}
