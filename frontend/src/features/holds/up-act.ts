import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { findStanding, upState, type TestedPart } from './standing-tests';
import type { ReadingCheck } from './typed-reading';

/** What keeps "test up" from being said. */
export type WhyNotUp =
  | {
      readonly code:
        'no-visit' | 'requested' | 'underway' | 'over-limit' | 'no-reading' | 'valve-missing' | 'valve-shut' | 'fault';
    }
  | { readonly code: 'below'; readonly minimumPsi: number }
  | { readonly code: 'not-up'; readonly parts: readonly TestedPart[] };

export interface UpQuestion {
  readonly visit: VisitSummary | null;
  readonly stageCode: string;
  readonly holds: readonly Hold[];
  readonly part: TestedPart;
  readonly hold: Hold | null;
  readonly check: ReadingCheck;
  /** Nothing was typed: what stands already is meant. */
  readonly isUntyped: boolean;
  readonly minimumPsi: number | null;
  readonly isValveShut: boolean;
}

/** Why the tests cannot be said to be up yet; null when they can. The first reason is the one to mend first. */
export function whyNotUp(asked: UpQuestion): WhyNotUp | null {
  const { visit } = asked;
  return whyOfReading(asked) ?? (visit === null ? { code: 'no-visit' } : whyOfVisit(visit, asked));
}

function whyOfReading(asked: UpQuestion): WhyNotUp | null {
  const { check, isUntyped, hold, isValveShut, minimumPsi } = asked;
  if (check.isOverLimit) return { code: 'over-limit' };
  if (isUntyped) return whyOfStanding(hold);
  if (check.faults.value !== undefined || check.faults.temperatureF !== undefined) return { code: 'fault' };
  if (check.faults.valve !== undefined) return { code: 'valve-missing' };
  if (isValveShut) return { code: 'valve-shut' };
  return check.isBelowMinimum ? { code: 'below', minimumPsi: minimumPsi ?? 0 } : null;
}

function whyOfStanding(hold: Hold | null): WhyNotUp | null {
  const state = upState(hold);
  if (state === 'over') return { code: 'over-limit' };
  if (state === 'below') return { code: 'below', minimumPsi: hold?.minimumPsi ?? 0 };
  return state === 'up' ? null : { code: 'no-reading' };
}

function whyOfVisit(visit: VisitSummary, { holds, stageCode, part }: UpQuestion): WhyNotUp | null {
  if (visit.state === 'requested') return { code: 'requested' };
  if (visit.state === 'underway') return { code: 'underway' };
  const others = visit.systemsUp.filter((one) => one.unitNumber !== part.unitNumber || one.system !== part.system);
  const parts = others
    .map(({ unitNumber, system }) => ({ unitNumber, system }))
    .filter((one) => upState(findStanding(holds, one, stageCode)) !== 'up');
  return parts.length > 0 ? { code: 'not-up', parts } : null;
}
