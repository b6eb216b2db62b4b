import { Inject, Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { Interval } from '@nestjs/schedule';
import { PinoLogger } from 'nestjs-pino';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { anchorHashOf, genesisHash } from './canonical.js';
import { type AnchoredHead, LedgerAnchorsQueries } from './ledger-anchors.queries.js';

const lookEveryMs = 60_000;
/** Any number that no other job of ours locks by. */
const anchorLock = 7_301_001;

/** Writes one anchor a day (UTC) over the heads of all chains. */
@Injectable()
export class LedgerAnchors {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
    private readonly queries: LedgerAnchorsQueries,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly logger: PinoLogger,
  ) {}

  @Interval(lookEveryMs)
  async look(): Promise<void> {
    if (this.environment.ROLE === 'web') return;
    try {
      await this.anchorToday();
    } catch (error) {
      this.logger.error({ err: error }, 'the ledger could not be anchored; the next look tries again');
    }
  }

  /** False when the day has its anchor already, or another process is just writing it. */
  async anchorToday(): Promise<boolean> {
    const at = this.clock.now();
    const day = at.toISOString().slice(0, 10);
    if (await this.queries.hasSince(day)) return false;
    return this.unitOfWork.run(async () => {
      if (!(await this.isFirstToLock()) || (await this.queries.hasSince(day))) return false;
      const previousHash = (await this.queries.findNewest())?.hash ?? genesisHash;
      await this.queries.nameMovedHeads(day);
      const heads = await this.queries.listHeads(day);
      await this.write(day, at, previousHash, heads);
      return true;
    });
  }

  private async write(day: string, at: Date, previousHash: string, heads: readonly AnchoredHead[]): Promise<void> {
    const facts = { day, at: at.toISOString(), chains: heads.length, previousHash };
    const hash = anchorHashOf(facts, heads);
    await this.sequelize.query(
      'INSERT INTO ledger_anchors (day, at, chains, previous_hash, hash) VALUES (:day, :at, :chains, :previousHash, :hash)',
      { replacements: { ...facts, at, hash }, type: QueryTypes.INSERT },
    );
  }

  /** Held until the end of the transaction; whoever does not get it leaves the day to the one who did. */
  private async isFirstToLock(): Promise<boolean> {
    const [row] = await this.sequelize.query<{ locked: boolean }>(
      'SELECT pg_try_advisory_xact_lock(:anchorLock) AS locked',
      {
        replacements: { anchorLock },
        type: QueryTypes.SELECT,
      },
    );
    return row?.locked ?? false;
  }
}
