import { randomUUID } from 'node:crypto';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import type { recordOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { HoldScenario } from '../holds/holds.scenario.js';

export type OutcomeBody = RouteCall<typeof recordOutcome>['body'];
export type Seen = Extract<OutcomeBody['result'], { kind: 'seen' }>;
export type GivenCorrection = Seen['corrections'][number];

/** A correction on the drain to fix before cover, unless told otherwise. */
export function correctionBody(parts: Partial<GivenCorrection> = {}): GivenCorrection {
  return {
    clientId: randomUUID(),
    unitNumber: 1,
    subject: 'dwv',
    text: 'Drip at the second-floor tee',
    place: { x: 0.4, y: 0.25 },
    floor: 'second',
    room: 'bath',
    severity: 'fix-before-cover',
    ...parts,
  };
}

/** Both systems of the rough-in passed and every point looked at, unless told otherwise. */
export function seenResult(parts: Partial<Seen> = {}): Seen {
  return {
    kind: 'seen',
    systems: [
      { unitNumber: 1, system: 'dwv', answer: 'pass' },
      { unitNumber: 1, system: 'water', answer: 'pass' },
    ],
    lookedAt: ['nail-plates', 'supports'],
    corrections: [],
    accepted: [],
    reopened: [],
    ...parts,
  };
}

/** The drain failed with one correction on it, the water passed. */
export function failedDrain(parts: Partial<GivenCorrection> = {}): Seen {
  return seenResult({
    systems: [
      { unitNumber: 1, system: 'dwv', answer: 'fail', note: 'drips' },
      { unitNumber: 1, system: 'water', answer: 'pass' },
    ],
    corrections: [correctionBody(parts)],
  });
}

export function outcomeBody(
  scenario: HoldScenario,
  expectedVersion: number,
  result: OutcomeBody['result'],
): OutcomeBody {
  return { ...scenario.stamp(), expectedVersion, result };
}
