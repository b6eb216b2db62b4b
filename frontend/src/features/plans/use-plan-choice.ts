import { usualTools, type PlanTools } from '@holdwater/shared-types/plans/plan-tools.js';
import type { PlanWay, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { sayDone } from '../../components/done-line';
import { useDebounced } from '../../lib/use-debounced';
import { useChoosePlan } from './api/choose-plan';
import { planOffersQuery, type PlannedPart } from './api/plan-offers';
import { firstWay, wayKey, wayOfPlan, type ShownPlan } from './shown-plan';
import { draftOfTools, keepTools, keptTools, readDraft } from './tools-draft';

/**
 * The state of choosing for one part of a lot: tools as typed, ways worked out with them, the way looked at. A chosen plan is shown as it
 * was told as long as it is looked at with the tools it was told with.
 */
export function usePlanChoice(lotId: string, part: PlannedPart, current: TestPlan | null) {
  const { t } = useTranslation('plans');
  const [kept] = useState<PlanTools>(() => current?.tools ?? keptTools(usualTools()));
  const [draft, setDraft] = useState(() => draftOfTools(kept));
  const [picked, setPicked] = useState<string | null>(null);
  const read = readDraft(draft, kept);
  const [good, setGood] = useState(kept);
  if (read.tools !== null && !isSame(read.tools, good)) setGood(read.tools);
  const tools = useDebounced(good);
  const offers = useQuery(planOffersQuery(lotId, part, tools));
  const choosing = useChoosePlan(lotId);
  const ways = offers.data?.ways ?? [];
  const shownKey = picked ?? firstWay(ways, current);
  const isAsTold = current !== null && wayKey(current) === shownKey && isSame(current.tools, good);
  const way = ways.find((each) => wayKey(each) === shownKey) ?? null;

  const choose = ({ method, medium }: Pick<PlanWay, 'method' | 'medium'>): void =>
    choosing.mutate(
      { ...part, method, medium, tools: good },
      {
        onSuccess: () => {
          keepTools(good);
          setPicked(null);
          sayDone({
            mark: 'sent',
            title: t('current.saved'),
            text: current === null ? undefined : t('current.supersededBy'),
          });
        },
      },
    );
  /** What is drawn; null while nothing is worked out yet. */
  const shownOf = (house: ShownPlan['house']): ShownPlan | null => {
    if (isAsTold) {
      const { geometry, isGroundwork } = current;
      return { way: wayOfPlan(current), house: geometry, tools: current.tools, isGroundwork, chosen: current };
    }
    return way === null ? null : { way, house, tools, isGroundwork: offers.data?.isGroundwork ?? false, chosen: null };
  };
  return {
    ...{ draft, setDraft, faults: read.faults, offers, ways, shownKey, setPicked, choosing, choose, shownOf },
    isCurrentWay: (key: string): boolean => current !== null && wayKey(current) === key,
  };
}

export type PlanChoice = ReturnType<typeof usePlanChoice>;

const isSame = (a: PlanTools, b: PlanTools): boolean => JSON.stringify(sorted(a)) === JSON.stringify(sorted(b));

/** Keys come back from the database in another order. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => a.localeCompare(b))
      .map(([key, each]) => [key, sorted(each)]),
  );
}
