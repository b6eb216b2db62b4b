import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { listDeliveries } from '@holdwater/shared-types/operations/operations.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';
import { fromNumberCursor, toPage } from '../common/paging/cursor.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';

interface DeliveryRow {
  id: string;
  position: string;
  channel: 'email';
  to: string;
  kind: string;
  state: 'waiting' | 'sent' | 'given-up' | 'dropped';
  attempts: number;
  lastError: string | null;
  nextAttemptAt: Date;
  createdAt: Date;
}

/** The pile of what could not be delivered yet, for the operator. */
@Injectable()
export class DeliveriesQueries {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  async list({ cursor, limit, state }: RouteInput<typeof listDeliveries>['query']) {
    const before = fromNumberCursor(cursor);
    const states = state ? [state] : ['waiting', 'given-up'];
    const rows = await this.sequelize.query<DeliveryRow>(
      `SELECT id, position, channel, address AS "to", kind, state, attempts, last_error AS "lastError", next_attempt_at AS "nextAttemptAt",
         created_at AS "createdAt"
       FROM deliveries WHERE state IN (:states) ${before === null ? '' : 'AND position < :before'} ORDER BY position DESC LIMIT :take`,
      { replacements: { states, before, take: limit + 1 }, type: QueryTypes.SELECT },
    );
    const page = toPage(rows, limit, (row) => [row.position]);
    const items = page.items.map((row) => ({
      ...row,
      nextAttemptAt: row.state === 'waiting' ? row.nextAttemptAt.toISOString() : null,
      createdAt: row.createdAt.toISOString(),
    }));
    return { items, nextCursor: page.nextCursor, ...(await this.count()) };
  }

  /** Tries a given-up delivery again, from the first attempt on. Throws `not-found` when it is not given up. */
  async retry(deliveryId: string): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      const found = await this.sequelize.query(
        `UPDATE deliveries SET state = 'waiting', attempts = 0, next_attempt_at = :now, claimed_until = NULL
         WHERE id = :deliveryId AND state = 'given-up' RETURNING id`,
        { replacements: { deliveryId, now: this.clock.now() }, type: QueryTypes.SELECT },
      );
      if (found.length === 0) refuse('not-found');
      return { done: true } as const;
    });
  }

  private async count(): Promise<{ waiting: number; givenUp: number }> {
    const [row] = await this.sequelize.query<{ waiting: number; givenUp: number }>(
      `SELECT count(*) FILTER (WHERE state = 'waiting')::int AS waiting, count(*) FILTER (WHERE state = 'given-up')::int AS "givenUp"
       FROM deliveries WHERE state IN ('waiting', 'given-up')`,
      { type: QueryTypes.SELECT },
    );
    return row ?? { waiting: 0, givenUp: 0 };
  }
}
