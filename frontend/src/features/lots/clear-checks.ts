import { buriedByMethod } from '@holdwater/shared-types/clearances/take-down.js';
import type { ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { Correction, Outcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';

export interface ClearFacts {
  readonly stageCode: string;
  readonly unitNumber: number;
  readonly systems: readonly System[];
  readonly state: ClearState;
  readonly corrections: readonly Correction[];
  readonly holds: readonly Hold[];
  /** Of the last closed visit of the stage; null before one, or where nothing was seen. */
  readonly outcome: Outcome | null;
}

/** One thing plumbing rests on before it is clear. */
export interface ClearCheck {
  readonly key: 'fixed' | 'dwv' | 'water' | 'work' | 'accepted' | 'putBack';
  readonly isDone: boolean;
  /** How much of how much; null where it is one thing. */
  readonly done: number | null;
  readonly total: number | null;
}

/** What is left before plumbing of this unit and stage is clear, from what was recorded; nothing here is typed in. */
export function clearChecks(facts: ClearFacts): ClearCheck[] {
  const { stageCode, unitNumber, systems, state, outcome } = facts;
  const ours = facts.corrections.filter((one) => one.stageCode === stageCode && one.unitNumber === unitNumber);
  const binding = ours.filter(({ severity }) => severity === 'fix-before-cover');
  const isPassed = state === 'clear' || state === 'put-back-due';
  const counted = (key: ClearCheck['key'], done: number, total: number): ClearCheck => ({
    ...{ key, done, total },
    isDone: done === total,
  });
  const looked = outcome?.work.filter(({ isLookedAt }) => isLookedAt).length ?? 0;
  return [
    ...(ours.length > 0 ? [counted('fixed', ours.filter((one) => one.state !== 'open').length, ours.length)] : []),
    ...systems.map((system): ClearCheck => ({
      key: system,
      isDone: isPassed || hasPassed(outcome, unitNumber, system),
      done: null,
      total: null,
    })),
    ...(outcome !== null && outcome.work.length > 0
      ? [counted('work', looked, outcome.work.length)]
      : [{ key: 'work' as const, isDone: isPassed, done: null, total: null }]),
    ...(binding.length > 0
      ? [counted('accepted', binding.filter((one) => one.state === 'accepted').length, binding.length)]
      : []),
    ...putBack(facts),
  ];
}

function hasPassed(outcome: Outcome | null, unitNumber: number, system: System): boolean {
  return (
    outcome?.systems.some((one) => one.unitNumber === unitNumber && one.system === system && one.answer === 'pass') ??
    false
  );
}

/** What the method of the last test leaves that would be buried; done only once the server says clear. */
function putBack({ stageCode, unitNumber, holds, state }: ClearFacts): ClearCheck[] {
  const last = holds
    .filter((hold) => hold.stageCode === stageCode && hold.unitNumber === unitNumber && hold.system === 'dwv')
    .sort((a, b) => b.ordinal - a.ordinal)[0];
  const total = last === undefined ? 0 : (buriedByMethod[last.method]?.length ?? 0);
  if (total === 0) return [];
  const done = state === 'clear' ? total : 0;
  return [{ key: 'putBack', isDone: done === total, done, total }];
}
