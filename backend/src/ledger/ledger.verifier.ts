import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { genesisHash, hashOf } from './canonical.js';

export interface ChainVerdict {
  isWhole: boolean;
  entries: number;
  firstBroken: number | null;
}

interface EntryRow {
  sequence: number;
  at: Date;
  kind: string;
  actorId: string | null;
  actorRole: string | null;
  payload: Record<string, unknown>;
  previousHash: string;
  hash: string;
}

/** How many entries are read at once. */
const batch = 2_000;

/** Recomputes chains from what stands in the tables. */
@Injectable()
export class LedgerVerifier {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** One chain: every hash, every link, and the head, which tells of a tail that was cut. */
  async verify(scope: string): Promise<ChainVerdict> {
    let previousHash = genesisHash;
    let sequence = 0;
    for (;;) {
      const rows = await this.read(scope, sequence);
      for (const row of rows) {
        if (!fits(scope, row, sequence + 1, previousHash))
          return { isWhole: false, entries: sequence, firstBroken: sequence + 1 };
        sequence = row.sequence;
        previousHash = row.hash;
      }
      if (rows.length < batch) break;
    }
    const isWhole = await this.isHead(scope, sequence, previousHash);
    return { isWhole, entries: sequence, firstBroken: isWhole ? null : sequence + 1 };
  }

  /** Every chain there is; answers those that are broken. */
  async verifyAll(): Promise<{
    chains: number;
    entries: number;
    broken: Array<{ scope: string; firstBroken: number }>;
  }> {
    const scopes = await this.sequelize.query<{ scope: string }>(
      'SELECT scope FROM ledger_heads UNION SELECT DISTINCT scope FROM ledger_entries ORDER BY scope',
      { type: QueryTypes.SELECT },
    );
    const broken: Array<{ scope: string; firstBroken: number }> = [];
    let entries = 0;
    for (const { scope } of scopes) {
      const verdict = await this.verify(scope);
      entries += verdict.entries;
      if (verdict.firstBroken !== null) broken.push({ scope, firstBroken: verdict.firstBroken });
    }
    return { chains: scopes.length, entries, broken };
  }

  private read(scope: string, after: number): Promise<EntryRow[]> {
    return this.sequelize.query<EntryRow>(
      `SELECT sequence, at, kind, actor_id AS "actorId", actor_role AS "actorRole", payload, previous_hash AS "previousHash", hash
       FROM ledger_entries WHERE scope = :scope AND sequence > :after ORDER BY sequence LIMIT :batch`,
      { replacements: { scope, after, batch }, type: QueryTypes.SELECT },
    );
  }

  private async isHead(scope: string, sequence: number, hash: string): Promise<boolean> {
    const [head] = await this.sequelize.query<{ sequence: number; hash: string }>(
      'SELECT sequence, hash FROM ledger_heads WHERE scope = :scope',
      { replacements: { scope }, type: QueryTypes.SELECT },
    );
    return head?.sequence === sequence && head.hash === hash;
  }
}

function fits(scope: string, row: EntryRow, sequence: number, previousHash: string): boolean {
  const { hash, at, ...rest } = row;
  return (
    row.sequence === sequence &&
    row.previousHash === previousHash &&
    hashOf({ scope, ...rest, at: at.toISOString() }) === hash
  );
}
