import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Cell, Cells } from '../../../components/cells';
import { Numeral } from '../../../components/numeral';
import { drawHouse } from '../../../drawings/cutaway-house';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import { drawnHouseOf } from '../../lots/dwv-ways';
import { usePlanWords } from '../plan-words';
import type { ShownPlan } from '../shown-plan';
import { useWayName } from '../way-name';
import { DwvFacts } from './dwv-facts';
import { GaugeTag } from './gauge-tag';
import { PlanSteps, PlanTakeDown } from './plan-lists';
import { PlanDial, PlanDrawing } from './plan-section';
import { WaterFacts } from './water-facts';

export interface PlanPrintProps {
  lot: LotDetail;
  shown: ShownPlan;
  plan: TestPlan;
  rule: TestRule | null;
  standingSince: string | null;
  zone: string;
}

/** The plan and its gauge tag on one sheet of paper, always in the light theme. */
export function PlanPrint({ lot, shown, plan, rule, standingSince, zone }: PlanPrintProps): ReactNode {
  const { t } = useTranslation(['plans', 'common']);
  const datumFt = drawHouse(drawnHouseOf(plan.geometry)).datumFt;
  const words = usePlanWords(datumFt);
  const { way, tools, isGroundwork } = shown;
  return (
    <article className="plan-print" data-theme="light">
      <PrintHead lot={lot} plan={plan} zone={zone} />
      <div className="print-columns">
        <div>
          <PlanDrawing shown={shown} maxHeight={330} />
          <PlanDial shown={shown} size={150} />
          <h2 className="h3">{t('stepsTitle')}</h2>
          <PlanSteps shown={shown} settleMinutes={rule?.settleMinutes ?? 0} />
          <h2 className="h3">{t('takeDownTitle')}</h2>
          <PlanTakeDown items={way.dwv?.takeDown ?? way.water?.takeDown ?? []} />
        </div>
        <div>
          {way.dwv === null ? null : <DwvFacts {...{ rule, isGroundwork, datumFt, words }} plan={way.dwv} />}
          {way.water === null ? null : <WaterFacts {...{ rule, tools, words }} plan={way.water} />}
          <GaugeTag lot={lot} plan={plan} standingSince={standingSince} zone={zone} />
        </div>
      </div>
      <p className="print-foot b">{t('common.localCode')}</p>
    </article>
  );
}

function PrintHead({ lot, plan, zone }: Pick<PlanPrintProps, 'lot' | 'plan' | 'zone'>): ReactNode {
  const { t } = useTranslation(['plans', 'common']);
  const locale = useLocale();
  const words = useTimeWords();
  const nameOf = useWayName();
  const stage = lot.stages.find(({ code }) => code === plan.stageCode);
  const unit = lot.units.length > 1 ? lot.units.find(({ number }) => number === plan.unitNumber)?.label : undefined;
  const part = [stage === undefined ? plan.stageCode : localName(stage.name, locale), unit].filter(Boolean).join(', ');
  return (
    <>
      <h1 className="h1">
        {t('sheet.title')}: {t(`common.systems.${plan.system}`)}, {nameOf(plan)}
      </h1>
      <Cells columns={4}>
        <Cell label={t('sheet.lot')}>
          <Numeral text={[lot.number, lot.tract?.name].filter(Boolean).join(', ')} />
        </Cell>
        <Cell label={t('sheet.address')}>{lot.address}</Cell>
        <Cell label={t('stage')}>{part}</Cell>
        <Cell label={t('sheet.department')}>
          {lot.departmentName}, {t('common.ruleCard', { version: plan.ruleCard.version })}
        </Cell>
      </Cells>
      <p className="s">
        {t('sheet.chosen')} {plan.chosenBy}. {t('sheet.printedAt', { time: words.dayClock(plan.chosenAt, zone) })}
      </p>
    </>
  );
}
