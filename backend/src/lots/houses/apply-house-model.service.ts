import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { keepOwnChanges } from '@holdwater/shared-types/lots/house-differences.js';
import type { applyHouseModel } from '@holdwater/shared-types/lots/house-model.contract.js';
import { houseToSave } from '@holdwater/shared-types/lots/house.rules.js';
import type { Actor } from '../../common/access/actor.js';
import { Changes } from '../../common/changes/changes.js';
import { refuse } from '../../common/errors/app-error.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../../ledger/ledger.service.js';
import type { LotRecord } from '../lot-record.js';
import { LotUnitModel } from '../lot-unit.model.js';
import { actingRole, canEditGeometry } from '../lots.policy.js';
import { LotsQueries } from '../lots.queries.js';
import { HouseModelsQueries, type HouseModelRecord } from './house-models.queries.js';
import { modelledUnitOf } from './modelled-units.js';
import { type UnitHouse, UnitHousesQueries } from './unit-houses.queries.js';

type Given = RouteInput<typeof applyHouseModel>['body'];
type Wish = Given['units'][number];
type Answer = RouteAnswer<typeof applyHouseModel>;

/** What one unit gets. */
interface Change {
  readonly unit: UnitHouse;
  readonly geometry: HouseGeometry;
  /** The parts in which the lot's own changes stay. */
  readonly keptChanges: string[];
}

/** Gives the newest version of a house model to units of several lots: all of them or none. */
@Injectable()
export class ApplyHouseModelService {
  constructor(
    @InjectModel(LotUnitModel) private readonly rows: typeof LotUnitModel,
    private readonly models: HouseModelsQueries,
    private readonly units: UnitHousesQueries,
    private readonly lots: LotsQueries,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly changes: Changes,
  ) {}

  /**
   * Throws `not-found` (model, lot or unit), `not-allowed`, `stale-state` (another version meanwhile), `houses-changed-by-hand` (params: which
   * were not asked about), `house-cannot-be` (params: the lot whose kept changes do not fit the version).
   */
  async apply(actor: Actor, modelId: string, given: Given): Promise<Answer> {
    return this.unitOfWork.run(async () => {
      const model = await this.models.lockFor(actor, modelId, 'SHARE');
      const lots = await this.lockLots(actor, model, given.units);
      if (model.version !== given.expectedVersion) refuse('stale-state', { version: model.version });
      const planned = await this.plan(model, given.units);
      for (const change of planned) await this.write(actor, model, change, lots);
      const changedLots = new Set(planned.map(({ unit }) => unit.lotId));
      for (const lotId of changedLots) this.changes.lot(lotId, 'lot');
      return { units: planned.length, lots: changedLots.size, alreadySo: given.units.length - planned.length };
    });
  }

  private async lockLots(
    actor: Actor,
    model: HouseModelRecord,
    wishes: readonly Wish[],
  ): Promise<Map<string, LotRecord>> {
    const lotIds = [...new Set(wishes.map(({ lotId }) => lotId))];
    const lots = await this.lots.lockLotsFor(actor, lotIds);
    for (const lot of lots) {
      if (lot.builderId !== model.builderId) refuse('not-found', { what: 'lot' });
      if (!canEditGeometry(actor, lot)) refuse('not-allowed');
    }
    return new Map(lots.map((lot) => [lot.id, lot]));
  }

  /** What is to be written; a unit that is so already is left out. */
  private async plan(model: HouseModelRecord, wishes: readonly Wish[]): Promise<Change[]> {
    const houses = await this.units.listOfLots(wishes.map(({ lotId }) => lotId));
    const found = wishes.map((wish) => ({
      unit:
        houses.find(({ lotId, unitNumber }) => lotId === wish.lotId && unitNumber === wish.unitNumber) ??
        refuse('not-found', { what: 'unit' }),
      wish,
    }));
    refuseUnasked(found, model);
    return found.flatMap(({ unit, wish }) => changeOf(unit, wish, model) ?? []);
  }

  private async write(
    actor: Actor,
    model: HouseModelRecord,
    { unit, geometry, keptChanges }: Change,
    lots: ReadonlyMap<string, LotRecord>,
  ): Promise<void> {
    const { lotId, unitNumber } = unit;
    const lot = lots.get(lotId) ?? refuse('not-found', { what: 'lot' });
    await this.rows.update(
      { geometry, houseModelId: model.id, houseModelVersion: model.version },
      { where: { lotId, number: unitNumber } },
    );
    const entry = { unitNumber, modelId: model.id, name: model.name, version: model.version, keptChanges };
    const who = { personId: actor.personId, role: actingRole(actor, lot) };
    await this.ledger.appendToLot(lotId, 'house-applied', entry, who);
  }
}

/** Houses measured or changed on their lot are named and asked about before anything is done. */
function refuseUnasked(found: ReadonlyArray<{ unit: UnitHouse; wish: Wish }>, model: HouseModelRecord): void {
  const unasked = found.filter(({ unit, wish }) => {
    const { isByHand, canKeepChanges } = modelledUnitOf(unit, model);
    return isByHand && (wish.whenChanged === 'ask' || (wish.whenChanged === 'keep-changes' && !canKeepChanges));
  });
  if (unasked.length === 0) return;
  const units = unasked.map(({ unit: { lotId, lotNumber, unitNumber, unitLabel } }) => ({
    ...{ lotId, lotNumber, unitNumber, unitLabel },
  }));
  refuse('houses-changed-by-hand', { count: units.length, units });
}

function changeOf(unit: UnitHouse, wish: Wish, model: HouseModelRecord): Change | null {
  const { isSame, canKeepChanges, origin } = modelledUnitOf(unit, model);
  if (isSame) return null;
  if (wish.whenChanged !== 'keep-changes' || !canKeepChanges || unit.geometry === null || unit.modelGeometry === null)
    return { unit, geometry: model.geometry, keptChanges: [] };
  if (origin?.version === model.version) return null;
  const merged = houseToSave.safeParse(keepOwnChanges(unit.modelGeometry, unit.geometry, model.geometry));
  if (!merged.success) refuse('house-cannot-be', { lotId: unit.lotId, lotNumber: unit.lotNumber });
  return { unit, geometry: merged.data, keptChanges: origin?.changes ?? [] };
}
