import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { anchorHashOf, genesisHash, hashOf } from './canonical.js';
import { type AnchorRecord, LedgerAnchorsQueries } from './ledger-anchors.queries.js';

export interface ChainVerdict {
  isWhole: boolean;
  entries: number;
  firstBroken: number | null;
}

export interface LedgerVerdict {
  chains: number;
  entries: number;
  broken: Array<{ scope: string; firstBroken: number }>;
  /** The daily anchors: how many, and the first day whose anchor does not fit. */
  anchors: { days: number; lastDay: string | null; firstBroken: string | null };
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
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly anchors: LedgerAnchorsQueries,
  ) {}

  /** One chain: every hash, every link, the head, which tells of a tail that was cut, and the anchors, which tell of it where the head was cut too. */
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
    const lost = await this.anchors.findLost(scope);
    if (lost !== null) return { isWhole: false, entries: sequence, firstBroken: Math.min(lost, sequence + 1) };
    const isWhole = await this.isHead(scope, sequence, previousHash);
    return { isWhole, entries: sequence, firstBroken: isWhole ? null : sequence + 1 };
  }

  /** Every chain there is, and the chain of anchors; answers what is broken. */
  async verifyAll(): Promise<LedgerVerdict> {
    const scopes = await this.sequelize.query<{ scope: string }>(
      `SELECT scope FROM ledger_heads UNION SELECT DISTINCT scope FROM ledger_entries
       UNION SELECT DISTINCT scope FROM ledger_anchor_heads ORDER BY scope`,
      { type: QueryTypes.SELECT },
    );
    const broken: Array<{ scope: string; firstBroken: number }> = [];
    let entries = 0;
    for (const { scope } of scopes) {
      const verdict = await this.verify(scope);
      entries += verdict.entries;
      if (verdict.firstBroken !== null) broken.push({ scope, firstBroken: verdict.firstBroken });
    }
    return { chains: scopes.length, entries, broken, anchors: await this.verifyAnchors() };
  }

  private async verifyAnchors(): Promise<LedgerVerdict['anchors']> {
    const anchors = await this.anchors.listAnchors();
    const verdict = { days: anchors.length, lastDay: anchors.at(-1)?.day ?? null };
    let previousHash = genesisHash;
    for (const anchor of anchors) {
      if (anchor.previousHash !== previousHash || !(await this.isAnchor(anchor)))
        return { ...verdict, firstBroken: anchor.day };
      previousHash = anchor.hash;
    }
    return { ...verdict, firstBroken: null };
  }

  private async isAnchor({ hash, at, ...facts }: AnchorRecord): Promise<boolean> {
    return anchorHashOf({ ...facts, at: at.toISOString() }, await this.anchors.listHeads(facts.day)) === hash;
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
