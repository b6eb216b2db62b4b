import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Notice } from '@holdwater/shared-types/notices/notice.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../common/access/actor.js';
import { fromInstantCursor, toPage } from '../common/paging/cursor.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';

interface NoticeRow extends Omit<Notice, 'at' | 'readAt'> {
  at: Date;
  readAt: Date | null;
}

/** A person's own notices. */
@Injectable()
export class Notices {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  async list(actor: Actor, { cursor, limit }: { cursor?: string; limit: number }) {
    const [at, id] = fromInstantCursor(cursor);
    const rows = await this.sequelize.query<NoticeRow>(
      `SELECT id, kind, params, lot_id AS "lotId", visit_id AS "visitId", at, read_at AS "readAt" FROM notices
       WHERE person_id = :personId ${cursor ? 'AND (at, id) < (:at::timestamptz, :id::uuid)' : ''} ORDER BY at DESC, id DESC LIMIT :take`,
      { replacements: { personId: actor.personId, at, id, take: limit + 1 }, type: QueryTypes.SELECT },
    );
    const page = toPage(rows, limit, (row) => [row.at.toISOString(), row.id]);
    const items = page.items.map((row): Notice => ({
      ...row,
      at: row.at.toISOString(),
      readAt: row.readAt?.toISOString() ?? null,
    }));
    return { items, nextCursor: page.nextCursor, unread: await this.countUnread(actor) };
  }

  /** Marks these of the actor's notices as read, or all. Others' ids do nothing. */
  async markRead(actor: Actor, ids: readonly string[] | undefined): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      await this.sequelize.query(
        `UPDATE notices SET read_at = :now WHERE person_id = :personId AND read_at IS NULL
         ${ids ? 'AND id = ANY (ARRAY[:ids]::uuid[])' : ''}`,
        {
          replacements: { personId: actor.personId, now: this.clock.now(), ids: ids ? [...ids] : [] },
          type: QueryTypes.UPDATE,
        },
      );
      return { done: true } as const;
    });
  }

  private async countUnread(actor: Actor): Promise<number> {
    const [row] = await this.sequelize.query<{ unread: number }>(
      'SELECT count(*)::int AS unread FROM notices WHERE person_id = :personId AND read_at IS NULL',
      { replacements: { personId: actor.personId }, type: QueryTypes.SELECT },
    );
    return row?.unread ?? 0;
  }
}
