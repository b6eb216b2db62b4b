import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Panel } from '../../../components/panel';
import { drawHouse } from '../../../drawings/cutaway-house';
import { Failed, QueryState } from '../../../lib/query-state';
import { ruleCardQuery } from '../../departments/api/rule-card';
import { lotHoldsQuery } from '../../lots/api/lot-holds';
import { drawnHouseOf } from '../../lots/dwv-ways';
import { zoneOf } from '../../lots/lot-view';
import type { PlannedPart } from '../api/plan-offers';
import { usePlanWords } from '../plan-words';
import { wayKey } from '../shown-plan';
import { usePlanChoice } from '../use-plan-choice';
import { usePrinting } from '../use-printing';
import { PlanActs } from './plan-acts';
import { PlanCurrent } from './plan-current';
import { PlanHistory } from './plan-history';
import { PlanSteps, PlanTakeDown } from './plan-lists';
import { PlanPrint } from './plan-print';
import { PlanSection } from './plan-section';
import { ToolsForm } from './tools-form';
import { WayCards } from './way-cards';

export interface PlanBodyProps {
  lot: LotDetail;
  part: PlannedPart;
  house: HouseGeometry;
  current: TestPlan | null;
}

/** The plan of one unit, stage and system: the ways side by side, the one looked at large, and all that follows from it. */
export function PlanBody({ lot, part, house, current }: PlanBodyProps): ReactNode {
  const { t } = useTranslation(['plans', 'common']);
  const choice = usePlanChoice(lot.id, part, current);
  const { offers, ways, choosing } = choice;
  const words = usePlanWords(drawHouse(drawnHouseOf(house)).datumFt);
  const { isPrinting, print } = usePrinting();
  const zone = zoneOf(lot);
  const shown = choice.shownOf(house);
  const cardId = shown?.chosen?.ruleCard.id ?? offers.data?.ruleCard.id;
  const ruleCard = useQuery({ ...ruleCardQuery(cardId ?? ''), enabled: cardId !== undefined });
  const rule =
    ruleCard.data?.content.tests.find((one) => one.stageCode === part.stageCode && one.system === part.system) ?? null;
  const holds = useQuery(lotHoldsQuery(lot.id));
  const standing = holds.data?.items.find(
    (hold) =>
      hold.state === 'standing' &&
      hold.unitNumber === part.unitNumber &&
      hold.stageCode === part.stageCode &&
      hold.system === part.system,
  );
  const again = current === null ? undefined : ways.find((way) => wayKey(way) === wayKey(current));
  const takeDown = shown?.way.dwv?.takeDown ?? shown?.way.water?.takeDown ?? [];
  return (
    <>
      <PlanCurrent
        current={current}
        zone={zone}
        canChoose={lot.abilities.canTest}
        cannotAnew={again === undefined || again.isOffered ? undefined : (words.whyNot(again)[0] ?? '')}
        isBusy={choosing.isPending}
        onAnew={() => (current === null ? undefined : choice.choose(current))}
      />
      <QueryState query={offers}>
        {() => (
          <Panel title={t('ways.title')} isFlush>
            <WayCards
              ways={ways}
              house={house}
              rangePsi={shown?.tools.gauge.rangePsi ?? 200}
              current={current}
              shown={choice.shownKey}
              onShow={choice.setPicked}
            />
          </Panel>
        )}
      </QueryState>
      {choosing.error === null ? null : <Failed error={choosing.error} />}
      {shown === null ? null : (
        <>
          <Panel
            title={t('section.title')}
            side={shown.chosen === null ? <span className="s mid">{t('current.preview')}</span> : undefined}
            isFlush
          >
            <PlanSection shown={shown} rule={rule} />
          </Panel>
          <div className="plan-pair">
            <Panel title={t('stepsTitle')}>
              <PlanSteps shown={shown} settleMinutes={rule?.settleMinutes ?? 0} />
            </Panel>
            <Panel title={t('takeDownTitle')} side={<span className="s mid">{t('takeDownSide')}</span>}>
              <PlanTakeDown items={takeDown} />
            </Panel>
          </div>
        </>
      )}
      {lot.abilities.canTest ? (
        <ToolsForm
          system={part.system}
          acceptedMethods={rule?.acceptedMethods ?? []}
          hasAir={rule?.pressures.some(({ medium }) => medium !== 'water') ?? false}
          draft={choice.draft}
          faults={choice.faults}
          onChange={choice.setDraft}
          houseTo={lot.abilities.canEditGeometry ? `/lots/${lot.id}/edit?part=house&unit=${part.unitNumber}` : null}
        />
      ) : null}
      <div className="plan-history-place">
        <PlanHistory lotId={lot.id} part={part} zone={zone} />
      </div>
      <PlanActs lot={lot} shown={shown} choice={choice} words={words} onPrint={print} />
      {isPrinting && shown?.chosen ? (
        <PlanPrint {...{ lot, shown, rule, zone }} plan={shown.chosen} standingSince={standing?.startedAt ?? null} />
      ) : null}
    </>
  );
}
