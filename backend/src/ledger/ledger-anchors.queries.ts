import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

export interface AnchoredHead {
  readonly scope: string;
  readonly sequence: number;
  readonly hash: string;
}

export interface AnchorRecord {
  readonly day: string;
  readonly at: Date;
  readonly chains: number;
  readonly previousHash: string;
  readonly hash: string;
}

const anchorColumns = `day::text AS day, at, chains, previous_hash AS "previousHash", hash`;

/** Reads and writes the rows of daily anchors. */
@Injectable()
export class LedgerAnchorsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Whether there is an anchor of this day or a later one: a clock set back anchors nothing twice. */
  async hasSince(day: string): Promise<boolean> {
    return (await this.select('SELECT 1 FROM ledger_anchors WHERE day >= :day LIMIT 1', { day })).length > 0;
  }

  async findNewest(): Promise<AnchorRecord | null> {
    const [newest] = await this.select<AnchorRecord>(
      `SELECT ${anchorColumns} FROM ledger_anchors ORDER BY day DESC LIMIT 1`,
      {},
    );
    return newest ?? null;
  }

  /** From the first day on. */
  async listAnchors(): Promise<AnchorRecord[]> {
    return this.select<AnchorRecord>(`SELECT ${anchorColumns} FROM ledger_anchors ORDER BY day`, {});
  }

  /** In one order wherever the database runs: that of their bytes. */
  async listHeads(day: string): Promise<AnchoredHead[]> {
    return this.select<AnchoredHead>(
      'SELECT scope, sequence, hash FROM ledger_anchor_heads WHERE day = :day ORDER BY scope COLLATE "C"',
      { day },
    );
  }

  /** Names every head that is not as the newest anchor to name it has it; read in one statement, so as of one moment. */
  async nameMovedHeads(day: string): Promise<void> {
    await this.sequelize.query(
      `INSERT INTO ledger_anchor_heads (day, scope, sequence, hash)
       SELECT :day, h.scope, h.sequence, h.hash FROM ledger_heads h
       LEFT JOIN LATERAL (SELECT a.sequence, a.hash FROM ledger_anchor_heads a WHERE a.scope = h.scope ORDER BY a.day DESC LIMIT 1) last ON true
       WHERE h.sequence > 0 AND (last.sequence, last.hash) IS DISTINCT FROM (h.sequence, h.hash)`,
      { replacements: { day }, type: QueryTypes.INSERT },
    );
  }

  /** The first entry of a chain that an anchor names and that is gone or is another by now; null when all are there. */
  async findLost(scope: string): Promise<number | null> {
    const [lost] = await this.select<{ sequence: number | null }>(
      `SELECT min(a.sequence) AS sequence FROM ledger_anchor_heads a
       LEFT JOIN ledger_entries e ON e.scope = a.scope AND e.sequence = a.sequence
       WHERE a.scope = :scope AND e.hash IS DISTINCT FROM a.hash`,
      { scope },
    );
    return lost?.sequence ?? null;
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
