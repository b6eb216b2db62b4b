import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useKeptTemperatures } from '../holds/use-kept-temperatures';
import { useTestAnalysis, type FoundAnalysis } from '../holds/use-test-analysis';

export interface LotAnalysis {
  readonly found: FoundAnalysis;
  /** The inspector reads the gauge before seeing what the log says. */
  readonly isVerdictHeld: boolean;
}

/** The newest test of what is looked at, worked out; a test that ended stands for no window any more. */
export function useLotAnalysis(
  lot: LotDetail,
  test: Hold | null,
  visit: VisitSummary | null,
  rule: TestRule | null,
): LotAnalysis | null {
  const [temperatures] = useKeptTemperatures(lot);
  const isStanding = test?.state === 'standing';
  const hasOwnReading = test?.readings.some(({ byRole, isStruck }) => byRole === 'inspector' && !isStruck) ?? false;
  const isVerdictHeld = isStanding && lot.abilities.canDecide && !hasOwnReading;
  const ofUnit = visit !== null && test !== null && visit.unitNumbers.includes(test.unitNumber);
  const found = useTestAnalysis({
    lot,
    test,
    visit: isStanding && ofUnit && !isVerdictHeld ? visit : null,
    rule,
    temperatures,
  });
  return found && { found, isVerdictHeld };
}
