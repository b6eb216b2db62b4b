import type { TakeDownItem } from '@holdwater/shared-types/clearances/take-down.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { drawHouse } from '../../../drawings/cutaway-house';
import { drawnHouseOf } from '../../lots/dwv-ways';
import { planSteps } from '../plan-steps';
import { usePlanWords } from '../plan-words';
import { takeDownByGroup, type ShownPlan } from '../shown-plan';

/** Putting the test up, step by step, in trade words. */
export function PlanSteps({ shown, settleMinutes }: { shown: ShownPlan; settleMinutes: number }): ReactNode {
  const { way, tools, house, isGroundwork } = shown;
  const words = usePlanWords(drawHouse(drawnHouseOf(house)).datumFt);
  const steps = planSteps({ way, tools, settleMinutes, cappedVents: isGroundwork ? 0 : house.cappedVents });
  return (
    <ol className="plan-steps">
      {steps.map((step) => (
        <li key={step.code}>
          <Numeral text={words.step(step)} />
        </li>
      ))}
    </ol>
  );
}

/** What the test leaves to put back, in its three groups. */
export function PlanTakeDown({ items }: { items: readonly TakeDownItem[] }): ReactNode {
  const { t } = useTranslation('plans');
  return (
    <div className="plan-groups">
      {takeDownByGroup(items).map(({ group, items: here }) => (
        <div key={group}>
          <h3 className="h3">{t(`groups.${group}`)}</h3>
          <ul>
            {here.map((item) => (
              <li key={item}>{t(`takeDown.${item}`)}</li>
            ))}
          </ul>
        </div>
      ))}
    </div>
  );
}
