import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { instantOf } from '../scheduling/working-time/local-instant.js';

export interface WindowDay {
  readonly date: string;
  readonly startAt: Date;
}

/**
 * When the tests of a visit must be up by the rule card: a clock time of the window's day, or so many hours before the window starts;
 * never later than its start. Null for a stage that asks for no test.
 */
export function upByOf(
  readiness: Pick<RuleCardContent['readiness'], 'upBy'>,
  stage: { readonly systems: readonly unknown[] },
  window: WindowDay,
  zone: string,
): Date | null {
  if (stage.systems.length === 0) return null;
  const { upBy } = readiness;
  if (upBy.kind === 'hours-before') return new Date(window.startAt.getTime() - upBy.hours * 3_600_000);
  const at = instantOf(window.date, upBy.time, zone);
  return at < window.startAt ? at : window.startAt;
}
