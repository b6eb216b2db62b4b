import type { DwvPlan } from '@holdwater/shared-types/hydraulics/dwv-plan.contract.js';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Cell, Cells } from '../../../components/cells';
import { Numeral } from '../../../components/numeral';
import { height, measureWords, workedPressure } from '../../../lib/units';
import { energy, force, planMeasureWords, volume, weight } from '../plan-measures';
import type { PlanWords } from '../plan-words';
import { PlanCautions } from './plan-cautions';
import { StandCell } from './stand-cell';

export interface DwvFactsProps {
  plan: DwvPlan;
  rule: TestRule | null;
  isGroundwork: boolean;
  datumFt: number;
  words: PlanWords;
  columns?: 2 | 3 | 4;
}

/** The numbers of a drain test: level, water and its weight, plugs; each with what may hurt about it. */
export function DwvFacts(props: DwvFactsProps): ReactNode {
  const { plan, words } = props;
  return (
    <>
      {plan.air === null ? <LevelCells {...props} /> : <AirCells {...props} />}
      <PlanCautions cautions={plan.cautions} place="level" words={words} />
      <PlanCautions cautions={plan.cautions} place="pressure" words={words} />
      <PlanCautions cautions={plan.cautions} place="filling" words={words} />
      <PlugTable {...props} />
      <PlanCautions cautions={plan.cautions} place="plugs" words={words} />
    </>
  );
}

function LevelCells({ plan, rule, isGroundwork, datumFt, columns = 2 }: DwvFactsProps): ReactNode {
  const { t } = useTranslation('plans');
  const { units } = useMe();
  const above = (feet: number | null): string =>
    feet === null
      ? t('section.notKnown')
      : t('section.abovePlug', { level: measureWords(height(feet - datumFt, units)) });
  const about = (what: string): string => t('section.about', { what });
  const minutes = plan.fillMinutes === null ? null : Math.ceil(plan.fillMinutes);
  return (
    <Cells columns={columns}>
      <Cell label={t('section.fillTo')}>
        <Numeral text={above(plan.fillLevelFt)} />
      </Cell>
      <Cell label={t('section.asked')}>
        {rule?.headRule?.kind === 'fill-level' ? t('section.askedOwn') : <Numeral text={above(plan.requiredLevelFt)} />}
      </Cell>
      <Cell label={t('section.volume')}>
        <Numeral text={about(planMeasureWords(volume(plan.volumeGal ?? 0, units)))} />
        {isGroundwork ? <span className="s mid">, {t('section.volumeGroundwork')}</span> : null}
      </Cell>
      <Cell label={t('section.weight')}>
        <Numeral text={about(planMeasureWords(weight(plan.weightLb ?? 0, units)))} />
      </Cell>
      <Cell label={t('section.fillTime')}>
        {minutes === null ? (
          <span className="mid">{t('section.rateUnknown')}</span>
        ) : (
          <Numeral text={about(t('section.minutes', { count: minutes }))} />
        )}
      </Cell>
      <StandCell rule={rule} />
    </Cells>
  );
}

function AirCells({ plan, rule, columns = 2 }: DwvFactsProps): ReactNode {
  const { t } = useTranslation('plans');
  const { units } = useMe();
  const { pressurePsi = 0, energyFtLbf = 0 } = plan.air ?? {};
  return (
    <Cells columns={columns}>
      <Cell label={t('section.pressure')}>
        <Numeral text={measureWords(workedPressure(pressurePsi, 0.1, units))} />
      </Cell>
      <Cell label={t('section.energy')}>
        <Numeral text={t('section.about', { what: planMeasureWords(energy(energyFtLbf, units)) })} />
      </Cell>
      <StandCell rule={rule} />
    </Cells>
  );
}

function PlugTable({ plan }: DwvFactsProps): ReactNode {
  const { t } = useTranslation('plans');
  const { units } = useMe();
  if (plan.plugs.length === 0) return null;
  return (
    <table className="plan-table">
      <caption className="lab">{t('section.plugs')}</caption>
      <thead>
        <tr>
          <th scope="col">{t('section.plug')}</th>
          <th scope="col">{t('section.onIt')}</th>
          <th scope="col">{t('section.ofRating')}</th>
          <th scope="col">{t('section.force')}</th>
        </tr>
      </thead>
      <tbody>
        {plan.plugs.map((plug, index) => (
          <tr key={index}>
            <th scope="row">{plug.name}</th>
            <td>
              <Numeral text={measureWords(workedPressure(plug.pressurePsi, 0.1, units))} />
            </td>
            <td className={plug.loadFraction > 1 ? 't-red b' : ''}>
              <Numeral text={`${Math.ceil(plug.loadFraction * 100 - 1e-9)} %`} />
            </td>
            <td>{plug.forceLbf === null ? '–' : <Numeral text={planMeasureWords(force(plug.forceLbf, units))} />}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
