import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Comment } from '@holdwater/shared-types/threads/thread.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';
import { fromInstantCursor, toPage } from '../common/paging/cursor.js';

interface CommentRow extends Omit<Comment, 'at' | 'receivedAt' | 'on'> {
  at: Date;
  receivedAt: Date;
  onKind: 'visit' | 'correction' | 'hold' | null;
  onId: string | null;
  onLabel: string | null;
}

const selectSql = `
  SELECT c.id, c.lot_id AS "lotId", c.text, c.author_id AS "authorId", p.name AS "authorName", c.author_role AS "authorRole",
    c.made_at AS at, c.received_at AS "receivedAt", c.on_kind AS "onKind", c.on_id AS "onId",
    coalesce(k.number::text, h.system || ' ' || h.ordinal, v.window_date::text) AS "onLabel"
  FROM comments c JOIN persons p ON p.id = c.author_id
  LEFT JOIN corrections k ON c.on_kind = 'correction' AND k.id = c.on_id
  LEFT JOIN holds h ON c.on_kind = 'hold' AND h.id = c.on_id
  LEFT JOIN visits v ON c.on_kind = 'visit' AND v.id = c.on_id`;

@Injectable()
export class CommentsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** One comment. Throws `not-found`. */
  async getComment(id: string): Promise<Comment> {
    const [row] = await this.select(`${selectSql} WHERE c.id = :id`, { id });
    return row ? present(row) : refuse('not-found');
  }

  /** A page of a lot's thread, newest first by the time they were made. */
  async listComments(lotId: string, { cursor, limit }: { cursor?: string; limit: number }) {
    const [at, id] = fromInstantCursor(cursor);
    const rows = await this.select(
      `${selectSql} WHERE c.lot_id = :lotId ${cursor ? 'AND (c.made_at, c.id) < (:at::timestamptz, :id::uuid)' : ''}
       ORDER BY c.made_at DESC, c.id DESC LIMIT :take`,
      { lotId, at, id, take: limit + 1 },
    );
    const page = toPage(rows, limit, (row) => [row.at.toISOString(), row.id]);
    return { items: page.items.map(present), nextCursor: page.nextCursor };
  }

  private select(sql: string, replacements: Record<string, unknown>): Promise<CommentRow[]> {
    return this.sequelize.query<CommentRow>(sql, { replacements, type: QueryTypes.SELECT });
  }
}

function present({ onKind, onId, onLabel, at, receivedAt, ...row }: CommentRow): Comment {
  return {
    ...row,
    at: at.toISOString(),
    receivedAt: receivedAt.toISOString(),
    on: onKind && onId ? { kind: onKind, id: onId, label: onLabel ?? '' } : null,
  };
}
