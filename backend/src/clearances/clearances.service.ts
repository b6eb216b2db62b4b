import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { type ClearState, clearStateOf } from '@holdwater/shared-types/clearances/clearance.rules.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Changes } from '../common/changes/changes.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { ClearFactsQueries } from './clear-facts.queries.js';
import { ClearancesQueries } from './clearances.queries.js';

/** Keeps the state of plumbing in step with the facts below it. */
@Injectable()
export class ClearancesService {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly facts: ClearFactsQueries,
    private readonly states: ClearancesQueries,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /**
   * Computes the state of one lot, unit and stage again, inside the caller's unit of work and after its writes. A change is written, with
   * its moment, and goes into the lot's ledger. Gives the state that stands.
   */
  async recompute(lotId: string, unitNumber: number, stageCode: string): Promise<ClearState> {
    return this.unitOfWork.run(async () => {
      await this.waitForOthers(lotId);
      const from = await this.states.getState(lotId, unitNumber, stageCode);
      const to = clearStateOf(await this.facts.readFacts({ lotId, unitNumber, stageCode }));
      if (to === from) return to;
      await this.write(lotId, unitNumber, stageCode, to);
      await this.ledger.appendToLot(lotId, 'plumbing-state', { unitNumber, stageCode, from, to }, null);
      this.changes.lot(lotId, 'lot');
      return to;
    });
  }

  /**
   * Whoever changes a fact of a lot appends to its ledger, so its newest entry is the one thing all of them lock. Waiting for it first lets
   * the facts be read after the other's commit, and adds no second lock that two of them could take in opposite order.
   */
  private async waitForOthers(lotId: string): Promise<void> {
    await this.sequelize.query('SELECT 1 FROM ledger_heads WHERE scope = :scope FOR UPDATE', {
      replacements: { scope: `lot:${lotId}` },
      type: QueryTypes.SELECT,
    });
  }

  private async write(lotId: string, unitNumber: number, stageCode: string, state: ClearState): Promise<void> {
    await this.sequelize.query(
      `INSERT INTO clearances (lot_id, unit_number, stage_code, state, since) VALUES (:lotId, :unitNumber, :stageCode, :state, :now)
       ON CONFLICT (lot_id, unit_number, stage_code) DO UPDATE SET state = excluded.state, since = excluded.since`,
      { replacements: { lotId, unitNumber, stageCode, state, now: this.clock.now() }, type: QueryTypes.INSERT },
    );
  }
}
