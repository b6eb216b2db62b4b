import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { PastLot, readPastLot, readPastLotLedger } from '@holdwater/shared-types/lots/handover.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { type Actor, organizationIds } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { HoldsPresenter } from '../holds/holds.presenter.js';
import { HoldsQueries } from '../holds/holds.queries.js';
import { LedgerQueries } from '../ledger/ledger.queries.js';
import { asOf, isOwnEvidence } from './as-of.js';
import type { PastPartyModel } from './past-party.model.js';

type PastRow = Omit<PastLot, 'until'> & Pick<PastPartyModel, 'organizationId' | 'until' | 'untilSequence'>;

/** What those who were replaced keep to read: their evidence as it stood then. Nothing here writes, and nothing later is shown. */
@Injectable()
export class PastLots {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly holds: HoldsQueries,
    private readonly presenter: HoldsPresenter,
    private readonly ledger: LedgerQueries,
  ) {}

  /** The last handed over first. A lot they are on again is among their own. */
  async list(actor: Actor): Promise<{ items: PastLot[] }> {
    return { items: (await this.select(actor, null)).map(pastLotOf) };
  }

  /** Throws `not-found`. */
  async read(actor: Actor, lotId: string): Promise<RouteAnswer<typeof readPastLot>> {
    const past = await this.getPast(actor, lotId);
    const holds = (await this.holds.listOfLot(lotId)).filter((hold) => isOwnEvidence(past, hold));
    const struckAt = await this.listStruck(holds.map(({ id }) => id));
    const shown = await this.presenter.many(holds);
    return { ...pastLotOf(past), holds: shown.map((hold) => asOf(hold, past.until, struckAt)) };
  }

  /** Throws `not-found`. */
  async readLedger(
    actor: Actor,
    lotId: string,
    query: RouteInput<typeof readPastLotLedger>['query'],
  ): Promise<RouteAnswer<typeof readPastLotLedger>> {
    const past = await this.getPast(actor, lotId);
    return this.ledger.listOfLot(lotId, { ...query, upTo: past.untilSequence });
  }

  private async getPast(actor: Actor, lotId: string): Promise<PastRow> {
    return (await this.select(actor, lotId))[0] ?? refuse('not-found');
  }

  /** One row a lot: the last time an organization of the reader's was replaced on it. */
  private async select(actor: Actor, lotId: string | null): Promise<PastRow[]> {
    const where =
      lotId === null ? 'NOT ARRAY[l.builder_id, l.plumber_id] && ARRAY[:readerIds]::uuid[]' : 'pp.lot_id = :lotId';
    return this.sequelize.query<PastRow>(
      `SELECT * FROM (
         SELECT DISTINCT ON (pp.lot_id) pp.lot_id AS "lotId", pp.lot_number AS "lotNumber", pp.tract_name AS "tractName", pp.address, pp.kind,
           o.name AS "organizationName", r.name AS "replacedByName", pp.until, d.zone, pp.organization_id AS "organizationId",
           pp.until_sequence AS "untilSequence"
         FROM lot_past_parties pp JOIN lots l ON l.id = pp.lot_id JOIN organizations o ON o.id = pp.organization_id
         JOIN organizations r ON r.id = pp.replaced_by_id LEFT JOIN departments d ON d.id = l.department_id
         WHERE pp.organization_id = ANY (ARRAY[:readerIds]::uuid[]) AND ${where} ORDER BY pp.lot_id, pp.until DESC, pp.until_sequence DESC
       ) past ORDER BY until DESC, "lotId"`,
      { replacements: { readerIds: organizationIds(actor), lotId }, type: QueryTypes.SELECT },
    );
  }

  private async listStruck(holdIds: readonly string[]): Promise<Map<string, Date>> {
    const found = await this.sequelize.query<{ id: string; struckAt: Date }>(
      `SELECT id, struck_at AS "struckAt" FROM readings WHERE hold_id = ANY (ARRAY[:holdIds]::uuid[]) AND struck_at IS NOT NULL`,
      { replacements: { holdIds: [...holdIds] }, type: QueryTypes.SELECT },
    );
    return new Map(found.map(({ id, struckAt }) => [id, struckAt]));
  }
}

function pastLotOf({ organizationId: _, untilSequence: __, until, ...named }: PastRow): PastLot {
  return { ...named, until: until.toISOString() };
}
