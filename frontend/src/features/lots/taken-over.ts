import type { TestToTakeOver } from '@holdwater/shared-types/lots/lot.contract.js';
import { parseNumber } from '../holds/typed-reading';
import type { HandoverAnswer } from './api/handovers';

export interface TakenOver {
  readonly takeOver: HandoverAnswer['takeOver'];
  /** By test: what is wrong with what was typed, a code of `errors:fields`. */
  readonly faults: Readonly<Record<string, string>>;
}

/** The tests something was typed for; the others are left to end. */
export function takenOver(tests: readonly TestToTakeOver[], typed: Readonly<Record<string, string>>): TakenOver {
  const takeOver: Array<HandoverAnswer['takeOver'][number]> = [];
  const faults: Record<string, string> = {};
  for (const { holdId, isLevel } of tests) {
    const text = (typed[holdId] ?? '').trim();
    if (text === '') continue;
    const value = parseNumber(text);
    if (value === null) faults[holdId] = 'must-be-a-number';
    else if (value < 0) faults[holdId] = 'must-not-be-negative';
    else takeOver.push({ holdId, isLevel, value });
  }
  return { takeOver, faults };
}
