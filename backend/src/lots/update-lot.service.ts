import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { fieldsChanged, fieldsGiven, type LotFields, type LotUpdate } from './lot-changes.js';
import { LotFollowers } from './lot-followers.js';
import { LotDetailPresenter } from './lot-detail.presenter.js';
import type { LotRecord } from './lot-record.js';
import { LotUnitModel } from './lot-unit.model.js';
import { LotModel } from './lot.model.js';
import { actingRole, canEditGeometry, canEditLot, canSetPermit } from './lots.policy.js';
import { LotsQueries } from './lots.queries.js';
import { refuseHalfPlace } from './place-on-earth.js';

@Injectable()
export class UpdateLotService {
  constructor(
    @InjectModel(LotModel) private readonly models: typeof LotModel,
    @InjectModel(LotUnitModel) private readonly units: typeof LotUnitModel,
    private readonly lots: LotsQueries,
    private readonly detail: LotDetailPresenter,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly changes: Changes,
    private readonly followers: LotFollowers,
  ) {}

  /** Throws `not-found`, `not-allowed` (the desk may set the permit alone), `bad-input`, `lot-number-taken`. */
  async update(actor: Actor, lotId: string, update: LotUpdate): Promise<LotDetail> {
    return this.unitOfWork.run(async () => {
      await this.lockFollowers(actor, lotId, update);
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!mayUpdate(actor, lot, update)) refuse('not-allowed');
      const given = fieldsGiven(update);
      const merged = { ...lot, ...given };
      refuseHalfPlace(merged.latitude, merged.longitude);
      await this.write(actor, lot, fieldsChanged(lot, given));
      return this.detail.present(actor, lotId);
    });
  }

  /** Throws `not-found` (the unit too), `not-allowed`. */
  async setGeometry(actor: Actor, lotId: string, unitNumber: number, geometry: HouseGeometry): Promise<LotDetail> {
    return this.unitOfWork.run(async () => {
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canEditGeometry(actor, lot)) refuse('not-allowed');
      const [changed] = await this.units.update({ geometry }, { where: { lotId, number: unitNumber } });
      if (changed === 0) refuse('not-found', { what: 'unit' });
      await this.ledger.appendToLot(lotId, 'geometry-set', { unitNumber }, whoActs(actor, lot));
      this.changes.lot(lotId, 'lot');
      return this.detail.present(actor, lotId);
    });
  }

  private async write(actor: Actor, lot: LotRecord, changed: LotFields): Promise<void> {
    const fields = Object.keys(changed);
    if (fields.length === 0) return;
    await this.models.update(changed, { where: { id: lot.id } });
    // names of fields and the permit only: gate codes and telephones do not belong in a record that is kept for ever
    const { permitStatus, permitNumber } = changed;
    await this.ledger.appendToLot(lot.id, 'lot-changed', { fields, permitStatus, permitNumber }, whoActs(actor, lot));
    this.changes.lot(lot.id, 'lot');
    // gate code and contact stand in no invite, so they send none
    if (isRenamed(changed)) await this.followers.renamed([lot.id], actor);
  }

  /** Visits are locked before their lot, and only where this may concern them. */
  private async lockFollowers(actor: Actor, lotId: string, update: LotUpdate): Promise<void> {
    if (!isRenamed(update)) return;
    await this.lots.getLotFor(actor, lotId);
    await this.followers.lock([lotId]);
  }
}

/** What the calendar entries of a lot's visits name it by. */
function isRenamed(fields: LotFields | LotUpdate): boolean {
  return fields.number !== undefined || fields.address !== undefined;
}

function mayUpdate(actor: Actor, lot: LotRecord, { permit: _, ...others }: LotUpdate): boolean {
  if (canEditLot(actor, lot)) return true;
  return canSetPermit(actor, lot) && Object.keys(others).length === 0;
}

function whoActs(actor: Actor, lot: LotRecord) {
  return { personId: actor.personId, role: actingRole(actor, lot) };
}
