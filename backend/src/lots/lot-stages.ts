import { type ClearState, clearStates } from '@holdwater/shared-types/clearances/clearance.rules.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { LotStage } from '@holdwater/shared-types/lots/lot.contract.js';

export interface UnitState {
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly state: ClearState;
}

/** The state of several units together: the one furthest from clear, by the pinned order. */
export function worstState(states: readonly ClearState[]): ClearState {
  return states.reduce<ClearState>(
    (worst, state) => (clearStates.indexOf(state) > clearStates.indexOf(worst) ? state : worst),
    'clear',
  );
}

/** The stages of a rule card, in the department's order, with what is known of each unit; what nobody wrote yet is not tested. */
export function lotStages(
  stages: RuleCardContent['stages'],
  unitNumbers: readonly number[],
  known: readonly UnitState[],
): LotStage[] {
  return [...stages]
    .sort((a, b) => a.order - b.order)
    .map(({ code, name, order, systems }) => {
      const units = unitNumbers.map((unitNumber) => ({
        unitNumber,
        state:
          known.find((each) => each.unitNumber === unitNumber && each.stageCode === code)?.state ??
          ('not-tested' as const),
      }));
      return { code, name, order, systems, state: worstState(units.map(({ state }) => state)), units };
    });
}

/** The first stage that is not clear; null when all are, or there is none. */
export function currentStageOf(stages: readonly LotStage[]): string | null {
  return stages.find(({ state }) => state !== 'clear')?.code ?? null;
}
