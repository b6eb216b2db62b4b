import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { WaterPlan } from '@holdwater/shared-types/hydraulics/water-plan.contract.js';
import type { PlanTools } from '@holdwater/shared-types/plans/plan-tools.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Cell, Cells } from '../../../components/cells';
import { Numeral } from '../../../components/numeral';
import { useRowWords } from '../../../drawings/use-cutaway-words';
import { measureWords, workedPressure } from '../../../lib/units';
import { energy, planMeasureWords } from '../plan-measures';
import type { PlanWords } from '../plan-words';
import { PlanCautions } from './plan-cautions';
import { StandCell } from './stand-cell';

export interface WaterFactsProps {
  plan: WaterPlan;
  rule: TestRule | null;
  tools: PlanTools;
  words: PlanWords;
  columns?: 2 | 3 | 4;
}

/** The numbers of a line test: what to pump to, what the weakest part takes, the gauge, the pressure on every floor. */
export function WaterFacts(props: WaterFactsProps): ReactNode {
  const { plan, words } = props;
  return (
    <>
      <PressureCells {...props} />
      <PlanCautions cautions={plan.cautions} place="pressure" words={words} />
      <LevelTable {...props} />
      <PlanCautions cautions={plan.cautions} place="filling" words={words} />
    </>
  );
}

function PressureCells({ plan, rule, tools, columns = 2 }: WaterFactsProps): ReactNode {
  const { t } = useTranslation('plans');
  const { units } = useMe();
  const psi = (value: number, markPsi = tools.gauge.incrementPsi): ReactNode => (
    <Numeral text={measureWords(workedPressure(value, markPsi, units))} />
  );
  const needs = measureWords(workedPressure(plan.requiredIncrementPsi, plan.requiredIncrementPsi, units));
  const supply = plan.needsTopUp === null ? 'supplyUnknown' : plan.needsTopUp ? 'topUp' : 'noTopUp';
  return (
    <Cells columns={columns}>
      <Cell label={t('section.target')} wash="water">
        {psi(plan.targetPsi)}
      </Cell>
      <Cell label={t('section.limit')}>{psi(plan.ceilingPsi)}</Cell>
      <Cell label={t('section.least')}>
        {psi(plan.floorPsi)}{' '}
        <span className="s mid">
          {t(rule?.measuredAt === 'highest-outlet' ? 'section.atOutlet' : 'section.atGauge')}
        </span>
      </Cell>
      <Cell label={t('section.gaugeMarks')}>
        {psi(tools.gauge.incrementPsi)} <span className="s mid">{t('section.marksAsked', { needs })}</span>
      </Cell>
      <Cell label={t('section.supply')}>{t(`section.${supply}`)}</Cell>
      <StandCell rule={rule} />
      {plan.storedEnergyFtLbf === null ? null : (
        <Cell label={t('section.energy')}>
          <Numeral text={t('section.about', { what: planMeasureWords(energy(plan.storedEnergyFtLbf, units)) })} />
        </Cell>
      )}
    </Cells>
  );
}

/** What a gauge would show on each floor while the plan's own shows the target: the drawing's twin in words. */
function LevelTable({ plan, tools }: WaterFactsProps): ReactNode {
  const { t } = useTranslation('plans');
  const { units } = useMe();
  const wordsOf = useRowWords();
  const words = (psi: number): string => measureWords(workedPressure(psi, tools.gauge.incrementPsi, units));
  const nameOf = (name: string): string => {
    if (name === 'highest outlet') return t('section.highestOutlet');
    if (name === 'lowest fitting') return t('section.lowestFitting');
    return wordsOf({ kind: name.toLowerCase() === 'attic' ? 'attic' : 'floor', name });
  };
  return (
    <table className="plan-table">
      <caption className="lab">
        <Numeral text={t('section.levels', { target: words(plan.targetPsi) })} />
      </caption>
      <thead className="hidden-words">
        <tr>
          <th scope="col">{t('section.place')}</th>
          <th scope="col">{t('section.onIt')}</th>
        </tr>
      </thead>
      <tbody>
        {plan.levels.map(({ name, elevationFt, pressurePsi }) => (
          <tr key={`${name} ${elevationFt}`}>
            <th scope="row">{nameOf(name)}</th>
            <td>
              <Numeral text={words(pressurePsi)} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
