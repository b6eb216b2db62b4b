import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type {
  CorrectionState,
  CorrectionSubject,
  Severity,
} from '@holdwater/shared-types/outcomes/correction.states.js';
import type { recordOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';

export type OutcomeBody = RouteInput<typeof recordOutcome>['body'];
export type SeenResult = Extract<OutcomeBody['result'], { kind: 'seen' }>;
export type UnseenResult = Exclude<OutcomeBody['result'], SeenResult>;

/** A correction of the lot as it stands before the act. */
export interface LotCorrection {
  readonly id: string;
  readonly number: number;
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly subject: CorrectionSubject;
  readonly severity: Severity;
  readonly state: CorrectionState;
}

export interface SeenVisit {
  readonly stage: Stage;
  readonly unitNumbers: readonly number[];
  /** Every correction of the lot, of whatever stage. */
  readonly corrections: readonly LotCorrection[];
}
