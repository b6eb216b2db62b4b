import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { DemoDepartment } from './demo-rule-cards.js';

/** Tallowmere's versions before the one in force, and the draft its desk is at: each a few changes from the next. */
export function tallowmereVersions(inForce: RuleCardContent): Pick<DemoDepartment, 'earlier' | 'draft'> {
  const fifth: RuleCardContent = {
    ...inForce,
    asking: { ...inForce.asking, cutoff: '14:00', lotsPerRequest: 2 },
    fees: inForce.fees.filter(({ event }) => event === 're-inspection'),
  };
  const fourth: RuleCardContent = {
    ...fifth,
    asking: { ...fifth.asking, booking: 'desk' },
    readiness: { ...fifth.readiness, whenNotUp: 'stays', isExtensionAllowed: false },
    corrections: { ...fifth.corrections, acceptFromPhoto: [] },
  };
  return {
    earlier: [
      { version: 5, content: fifth, days: 305 },
      { version: 4, content: fourth, days: 425 },
    ],
    draft: draftOf(inForce),
  };
}

/** More air in the lines, tests up half an hour earlier, a longer Friday, and not ready is charged at once. */
function draftOf(inForce: RuleCardContent): RuleCardContent {
  const { asking, readiness, fees, tests } = inForce;
  return {
    ...inForce,
    asking: {
      ...asking,
      windows: asking.windows.map((window) => (window.label === 'midday' ? { ...window, days: [] } : window)),
    },
    readiness: { ...readiness, upBy: { kind: 'clock-time', time: '06:30' } },
    fees: fees.map((fee) => (fee.event === 'not-ready' ? { ...fee, firstFree: 0 } : fee)),
    tests: tests.map((test) => ({
      ...test,
      pressures: test.pressures.map((pressure) =>
        pressure.medium === 'air' ? { ...pressure, minimumPsi: 60, preferredPsi: 70 } : pressure,
      ),
    })),
  };
}
