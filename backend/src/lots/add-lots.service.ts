import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { type Actor, isMember } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { Ledger } from '../ledger/ledger.service.js';
import { AskPartiesService } from './ask-parties.service.js';
import type { LotRecord } from './lot-record.js';
import { LotUnitModel } from './lot-unit.model.js';
import { LotModel } from './lot.model.js';
import { canAddLots } from './lots.policy.js';
import { TractModel } from './tract.model.js';

/** A lot about to be added: its own fields, without parties. */
export type LotDraft = Omit<LotRecord, 'id' | 'builderId' | 'plumberId' | 'departmentId' | 'tractId'> & {
  readonly unitLabels: readonly string[];
};

/** Where new lots go and whom to ask to join them. */
export interface LotTies {
  readonly builderId: string;
  readonly tractId?: string | null | undefined;
  readonly plumberId?: string | null | undefined;
  readonly departmentId?: string | null | undefined;
}

/** Adding lots: a superintendent of their builder; nobody learns of a builder they do not belong to. */
export function refuseAdding(actor: Actor, builderId: string): void {
  if (!isMember(actor, builderId)) refuse('not-found');
  if (!canAddLots(actor, builderId)) refuse('not-allowed');
}

/** Writes new lots, one or many alike. */
@Injectable()
export class AddLotsService {
  constructor(
    @InjectModel(LotModel) private readonly lots: typeof LotModel,
    @InjectModel(LotUnitModel) private readonly units: typeof LotUnitModel,
    @InjectModel(TractModel) private readonly tracts: typeof TractModel,
    private readonly asking: AskPartiesService,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
  ) {}

  /** Throws `bad-input` when the tract is not the builder's or a party is none of its kind. */
  async refuseTies({ builderId, tractId, plumberId, departmentId }: LotTies): Promise<void> {
    if (tractId && (await this.tracts.count({ where: { id: tractId, builderId } })) === 0)
      refuse('bad-input', {}, { tractId: 'unknown' });
    if (plumberId) await this.asking.getOrganization('plumber', plumberId, 'plumberId');
    if (departmentId) await this.asking.getOrganization('department', departmentId, 'departmentId');
  }

  /** Adds all of them inside the caller's unit of work, after `refuseAdding` and `refuseTies`; gives their ids in the same order. */
  async add(actor: Actor, drafts: readonly LotDraft[], ties: LotTies): Promise<string[]> {
    const createdAt = this.clock.now();
    const rows = drafts.map(({ unitLabels, ...fields }) => ({
      row: { id: randomUUID(), builderId: ties.builderId, tractId: ties.tractId ?? null, ...fields, createdAt },
      unitLabels,
    }));
    await this.lots.bulkCreate(rows.map(({ row }) => row));
    await this.units.bulkCreate(rows.flatMap(({ row, unitLabels }) => unitsOf(row.id, unitLabels)));
    for (const { row } of rows) {
      const who = { personId: actor.personId, role: 'superintendent' };
      await this.ledger.appendToLot(
        row.id,
        'lot-added',
        { number: row.number, address: row.address, builderId: ties.builderId },
        who,
      );
    }
    const lotIds = rows.map(({ row }) => row.id);
    await this.askParties(actor, lotIds, ties);
    return lotIds;
  }

  private async askParties(
    actor: Actor,
    lotIds: readonly string[],
    { builderId, plumberId, departmentId }: LotTies,
  ): Promise<void> {
    if (plumberId) {
      const plumber = await this.asking.getOrganization('plumber', plumberId, 'plumberId');
      await this.asking.ask(actor, builderId, lotIds, plumber, 'plumber');
    }
    if (departmentId) {
      const department = await this.asking.getOrganization('department', departmentId, 'departmentId');
      await this.asking.ask(actor, builderId, lotIds, department, 'department');
    }
  }
}

function unitsOf(lotId: string, labels: readonly string[]) {
  return labels.map((label, index) => ({ id: randomUUID(), lotId, number: index + 1, label, geometry: null }));
}
