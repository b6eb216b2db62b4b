import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Changes } from '../common/changes/changes.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { genesisHash, hashOf } from './canonical.js';
import { LedgerEntryModel } from './ledger-entry.model.js';
import type { LedgerPayloads } from './ledger.kinds.js';

export interface LedgerActor {
  personId: string;
  /** The role the act was done in; null where none applies. */
  role: string | null;
}

interface Head {
  sequence: number;
  hash: string;
}

/**
 * Appends to the chain of a lot, a department, an organization or the installation. Always inside the unit of work of the change itself:
 * the newest entry of the chain is locked, so that two writers of one chain wait for each other.
 */
@Injectable()
export class Ledger {
  constructor(
    @InjectModel(LedgerEntryModel) private readonly entries: typeof LedgerEntryModel,
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly clock: Clock,
    private readonly changes: Changes,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  async appendToLot<K extends keyof LedgerPayloads>(
    lotId: string,
    kind: K,
    payload: LedgerPayloads[K],
    actor: LedgerActor | null,
  ): Promise<number> {
    const sequence = await this.append(`lot:${lotId}`, lotId, kind, payload, actor);
    this.changes.lot(lotId, 'ledger');
    return sequence;
  }

  async appendTo<K extends keyof LedgerPayloads>(
    scope: `department:${string}` | `organization:${string}` | `person:${string}` | 'installation',
    kind: K,
    payload: LedgerPayloads[K],
    actor: LedgerActor | null,
  ): Promise<number> {
    return this.append(scope, null, kind, payload, actor);
  }

  private async append(
    scope: string,
    lotId: string | null,
    kind: string,
    payload: object,
    actor: LedgerActor | null,
  ): Promise<number> {
    return this.unitOfWork.run(async () => {
      const head = await this.lockHead(scope);
      const at = this.clock.now();
      const entry = {
        scope,
        sequence: head.sequence + 1,
        at: at.toISOString(),
        kind,
        actorId: actor?.personId ?? null,
        actorRole: actor?.role ?? null,
        // what JSON makes of it is what is hashed and what is stored
        payload: JSON.parse(JSON.stringify(payload)) as Record<string, unknown>,
        previousHash: head.hash,
      };
      const hash = hashOf(entry);
      await this.entries.create({ ...entry, at, lotId, hash });
      await this.moveHead(scope, entry.sequence, hash);
      return entry.sequence;
    });
  }

  private async lockHead(scope: string): Promise<Head> {
    await this.sequelize.query(
      'INSERT INTO ledger_heads (scope, sequence, hash) VALUES (:scope, 0, :hash) ON CONFLICT (scope) DO NOTHING',
      { replacements: { scope, hash: genesisHash }, type: QueryTypes.INSERT },
    );
    const [head] = await this.sequelize.query<Head>(
      'SELECT sequence, hash FROM ledger_heads WHERE scope = :scope FOR UPDATE',
      {
        replacements: { scope },
        type: QueryTypes.SELECT,
      },
    );
    return head ?? { sequence: 0, hash: genesisHash };
  }

  private async moveHead(scope: string, sequence: number, hash: string): Promise<void> {
    await this.sequelize.query('UPDATE ledger_heads SET sequence = :sequence, hash = :hash WHERE scope = :scope', {
      replacements: { scope, sequence, hash },
      type: QueryTypes.UPDATE,
    });
  }
}
