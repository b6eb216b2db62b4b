import { Inject, Injectable } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { PinoLogger } from 'nestjs-pino';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { VisitEvents } from './visit-events.service.js';
import type { VisitRow } from './visit-row.js';
import { VisitMoves } from './visit-moves.service.js';
import { upByOfRow } from './visits.presenter.js';
import { VisitsQueries } from './visits.queries.js';

const sweepEveryMs = 20_000;
const hourMs = 3_600_000;
/** A deadline lies at most this long before its window: 72 hours by the rule card, or a clock time of the same day. */
const longestBeforeMs = 72 * hourMs;
/** No window is longer than its day. */
const longestWindowMs = 24 * hourMs;

/** Frees booked windows whose test was not up by the rule card's deadline, where the rule card says so. */
@Injectable()
export class FreeNotUp {
  private isSweeping = false;

  constructor(
    @Inject(ENVIRONMENT) private readonly environment: Environment,
    private readonly queries: VisitsQueries,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly logger: PinoLogger,
  ) {}

  /** Several servers may sweep at once: each visit is claimed by its guarded move. */
  @Interval(sweepEveryMs)
  async sweep(): Promise<void> {
    if (this.environment.ROLE === 'web' || this.isSweeping) return;
    this.isSweeping = true;
    try {
      await this.sweepDeadlines(this.clock.now());
    } catch (error) {
      this.logger.error({ err: error }, 'the sweep of deadlines failed; the next one tries again');
    } finally {
      this.isSweeping = false;
    }
  }

  /** Frees what is due, one transaction each; gives the ids of the visits freed. Up to and including the deadline is in time. */
  async sweepDeadlines(now: Date): Promise<string[]> {
    const from = new Date(now.getTime() - longestWindowMs);
    const candidates = await this.queries.listBookedStarting(from, new Date(now.getTime() + longestBeforeMs));
    const freed: string[] = [];
    for (const { id } of candidates.filter((row) => isDue(row, now))) {
      if (await this.free(id, now)) freed.push(id);
    }
    return freed;
  }

  /** False when the visit is no longer due: its test came up, it moved, or another server was quicker. */
  private async free(visitId: string, now: Date): Promise<boolean> {
    return this.unitOfWork.run(async () => {
      const visit = await this.moves.findLocked(visitId);
      if (!visit) return false;
      const row = await this.queries.getVisit(visitId);
      if (!isDue(row, now) || (await this.isBookedTooLate(row))) return false;
      await this.moves.apply(visit, 'free-not-up', { expectedVersion: null, changes: { endReason: 'not-up' } });
      await this.events.freed(visit, 'not-up', null);
      return true;
    });
  }

  /** Nobody could be in time for a window booked or moved to after its deadline, and a test that came down after it had been up in time. */
  private async isBookedTooLate(row: VisitRow): Promise<boolean> {
    const bookedAt = await this.queries.findBookedAt(row.id);
    const upBy = upByOfRow(row);
    return bookedAt !== null && upBy !== null && bookedAt > upBy;
  }
}

/** Once the window is over there is nothing left to give to anybody. */
function isDue(row: VisitRow, now: Date): boolean {
  if (row.state !== 'booked' || row.readiness.whenNotUp !== 'goes-to-standby' || now >= row.windowEndAt) return false;
  const upBy = upByOfRow(row);
  return upBy !== null && now > upBy;
}
