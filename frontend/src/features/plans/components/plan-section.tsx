import { dwvMethods } from '@holdwater/shared-types/holds/hold.states.js';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useMe } from '../../../app/session';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { Cutaway } from '../../../drawings/cutaway';
import { drawHouse } from '../../../drawings/cutaway-house';
import { Dial } from '../../../drawings/dial';
import { drawnHouseOf } from '../../lots/dwv-ways';
import { usePlanWords } from '../plan-words';
import type { ShownPlan } from '../shown-plan';
import { DwvFacts } from './dwv-facts';
import { WaterFacts } from './water-facts';

/** The way looked at, large on this very house, with its numbers beside it. */
export function PlanSection({ shown, rule }: { shown: ShownPlan; rule: TestRule | null }): ReactNode {
  const { way, house, tools, isGroundwork } = shown;
  const isPhone = useSheetWidth() === 'phone';
  const datumFt = drawHouse(drawnHouseOf(house)).datumFt;
  const words = usePlanWords(datumFt);
  const why = words.whyNot(way);
  return (
    <div className="plan-split">
      <div className="plan-drawing">
        <PlanDrawing shown={shown} maxHeight={isPhone ? 420 : 560} />
      </div>
      <div className="plan-facts">
        {way.isOffered ? null : (
          <ul className="plan-why t-red">
            {why.map((each) => (
              <li key={each}>{each}</li>
            ))}
          </ul>
        )}
        {way.dwv === null ? null : <DwvFacts {...{ rule, isGroundwork, datumFt, words }} plan={way.dwv} />}
        {way.water === null ? null : (
          <>
            <PlanDial shown={shown} size={isPhone ? 200 : 220} />
            <WaterFacts {...{ rule, tools, words }} plan={way.water} />
          </>
        )}
      </div>
    </div>
  );
}

/** The section through the house under the way looked at; the water lines with their gauge for a line test. */
export function PlanDrawing({ shown, maxHeight }: { shown: ShownPlan; maxHeight: number }): ReactNode {
  const { way, house } = shown;
  const { units } = useMe();
  const method = dwvMethods.find((one) => one === way.method) ?? null;
  return (
    <Cutaway
      house={drawnHouseOf(house)}
      method={method}
      fillLevelFt={way.dwv?.fillLevelFt ?? null}
      levels={way.dwv?.levels}
      lifts={way.dwv?.lifts}
      view={method === null ? 'water' : 'dwv'}
      units={units}
      maxHeight={maxHeight}
    />
  );
}

/** Target and ceiling on the gauge in hand. */
export function PlanDial({ shown, size }: { shown: ShownPlan; size: number }): ReactNode {
  const { way, tools } = shown;
  if (way.water === null) return null;
  const { targetPsi, floorPsi, ceilingPsi } = way.water;
  return (
    <div className="plan-dial">
      <Dial
        max={tools.gauge.rangePsi}
        unit="psi"
        increment={tools.gauge.incrementPsi}
        value={null}
        minimum={floorPsi}
        limit={ceilingPsi}
        pumpTo={targetPsi}
        size={size}
      />
    </div>
  );
}
