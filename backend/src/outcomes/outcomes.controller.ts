import { Controller } from '@nestjs/common';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import { type Outcome, readOutcome, recordOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { beginVisit, undoBegin, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { BeginVisit } from './begin-visit.service.js';
import { ReadOutcome } from './read-outcome.service.js';
import { RecordOutcome } from './record-outcome.service.js';

@Controller()
export class OutcomesController {
  constructor(
    private readonly beginning: BeginVisit,
    private readonly recording: RecordOutcome,
    private readonly reading: ReadOutcome,
  ) {}

  @ContractRoute(beginVisit, signedIn('outcomes.canInspect'))
  begin(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof beginVisit>): Promise<VisitSummary> {
    return this.beginning.begin(actor, input.params.visitId, input.body);
  }

  @ContractRoute(undoBegin, signedIn('outcomes.canInspect'))
  undoBegin(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof undoBegin>): Promise<VisitSummary> {
    return this.beginning.undo(actor, input.params.visitId, input.body.expectedVersion);
  }

  @ContractRoute(recordOutcome, signedIn('outcomes.canInspect'))
  record(
    @CurrentActor() actor: Actor,
    @Input() input: RouteInput<typeof recordOutcome>,
  ): Promise<RouteAnswer<typeof recordOutcome>> {
    return this.recording.record(actor, input.params.visitId, input.body);
  }

  @ContractRoute(readOutcome, signedIn('lots.canReadLot'))
  read(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof readOutcome>): Promise<Outcome> {
    return this.reading.read(actor, input.params.visitId);
  }
}
