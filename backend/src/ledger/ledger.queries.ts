import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { fromNumberCursor, toPage } from '../common/paging/cursor.js';

interface EntryRow extends Omit<LedgerEntry, 'at'> {
  at: Date;
}

/** The largest a sequence can be: PostgreSQL's integer. */
const newestSequence = 2_147_483_647;

@Injectable()
export class LedgerQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** A page of a lot's entries, newest first, and how many there are; `upTo` leaves out those after that one. */
  async listOfLot(
    lotId: string,
    { cursor, limit, upTo = newestSequence }: { cursor?: string; limit: number; upTo?: number },
  ) {
    const before = fromNumberCursor(cursor);
    const rows = await this.sequelize.query<EntryRow>(
      `SELECT e.sequence, e.at, e.kind, p.name AS "actorName", e.actor_role AS "actorRole", e.payload, e.hash
       FROM ledger_entries e LEFT JOIN persons p ON p.id = e.actor_id
       WHERE e.lot_id = :lotId AND e.sequence < :before AND e.sequence <= :upTo ORDER BY e.sequence DESC LIMIT :take`,
      { replacements: { lotId, before: before ?? newestSequence, upTo, take: limit + 1 }, type: QueryTypes.SELECT },
    );
    const page = toPage(rows, limit, (row) => [row.sequence]);
    return {
      items: page.items.map((row): LedgerEntry => ({ ...row, at: row.at.toISOString() })),
      nextCursor: page.nextCursor,
      total: await this.countOfLot(lotId, upTo),
    };
  }

  private async countOfLot(lotId: string, upTo: number): Promise<number> {
    const [row] = await this.sequelize.query<{ count: number }>(
      'SELECT count(*)::int AS count FROM ledger_entries WHERE lot_id = :lotId AND sequence <= :upTo',
      {
        replacements: { lotId, upTo },
        type: QueryTypes.SELECT,
      },
    );
    return row?.count ?? 0;
  }
}
