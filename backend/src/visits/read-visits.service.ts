import { Injectable } from '@nestjs/common';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { type Actor, isMember } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { canWorkRequests } from './visits.policy.js';
import { VisitsPresenter } from './visits.presenter.js';
import { VisitsQueries } from './visits.queries.js';

/** Visits read one by one, by lot, and as the desk's pile of requests. */
@Injectable()
export class ReadVisits {
  constructor(
    private readonly lots: LotsQueries,
    private readonly queries: VisitsQueries,
    private readonly presenter: VisitsPresenter,
  ) {}

  /** Throws `not-found` unless the actor may read its lot. */
  async read(actor: Actor, visitId: string): Promise<VisitSummary> {
    return this.presenter.present(actor, visitId);
  }

  /** Newest first. Throws `not-found` unless the actor may read the lot. */
  async listOfLot(actor: Actor, lotId: string): Promise<{ items: VisitSummary[] }> {
    await this.lots.getLotFor(actor, lotId);
    return { items: this.presenter.presentRows(actor, await this.queries.listOfLot(lotId)) };
  }

  /** Throws `not-found` to strangers of the department, `not-allowed` to its members who are not the desk. */
  async listRequests(actor: Actor, departmentId: string): Promise<{ items: VisitSummary[] }> {
    requireDesk(actor, departmentId);
    return { items: this.presenter.presentRows(actor, await this.queries.listRequests(departmentId)) };
  }
}

/** Throws `not-found` to strangers of a department, `not-allowed` to its members who are not the desk. */
export function requireDesk(actor: Actor, departmentId: string): void {
  if (!isMember(actor, departmentId)) refuse('not-found');
  if (!canWorkRequests(actor, departmentId)) refuse('not-allowed');
}
