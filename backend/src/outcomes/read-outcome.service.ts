import { Injectable } from '@nestjs/common';
import type { Outcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { canReadLot } from '../lots/lots.policy.js';
import { VisitsQueries } from '../visits/visits.queries.js';
import { OutcomesQueries } from './outcomes.queries.js';

/** The outcome of a closed visit, for whoever may read its lot. */
@Injectable()
export class ReadOutcome {
  constructor(
    private readonly visits: VisitsQueries,
    private readonly outcomes: OutcomesQueries,
  ) {}

  /** @throws not-found */
  async read(actor: Actor, visitId: string): Promise<Outcome> {
    const visit = await this.visits.getVisit(visitId);
    if (!canReadLot(actor, visit)) refuse('not-found');
    return (await this.outcomes.findOfVisit(visitId)) ?? refuse('not-found');
  }
}
