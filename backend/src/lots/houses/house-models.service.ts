import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { differingParts } from '@holdwater/shared-types/lots/house-differences.js';
import type {
  addHouseModelVersion,
  createHouseModel,
  HouseModelDetail,
} from '@holdwater/shared-types/lots/house-model.contract.js';
import { UniqueConstraintError } from 'sequelize';
import type { Actor } from '../../common/access/actor.js';
import { refuse } from '../../common/errors/app-error.js';
import { Clock } from '../../common/time/clock.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../../ledger/ledger.service.js';
import { HouseModelModel } from './house-model.model.js';
import { HouseModelVersionModel } from './house-model-version.model.js';
import { canReadHouseModels, canWriteHouseModels, modellingRole } from './house-models.policy.js';
import { HouseModelsPresenter } from './house-models.presenter.js';
import { HouseModelsQueries, type HouseModelRecord } from './house-models.queries.js';

type ModelGiven = RouteInput<typeof createHouseModel>['body'];
type VersionGiven = RouteInput<typeof addHouseModelVersion>['body'];

/** A builder saves houses under names, renames them and makes new versions. */
@Injectable()
export class HouseModelsService {
  constructor(
    @InjectModel(HouseModelModel) private readonly rows: typeof HouseModelModel,
    @InjectModel(HouseModelVersionModel) private readonly versions: typeof HouseModelVersionModel,
    private readonly models: HouseModelsQueries,
    private readonly presenter: HouseModelsPresenter,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
  ) {}

  /** Throws `not-found` (not the actor's builder), `not-allowed`, `house-model-name-taken`. */
  async create(actor: Actor, { builderId, name, geometry }: ModelGiven): Promise<HouseModelDetail> {
    return this.unitOfWork.run(async () => {
      if (!canReadHouseModels(actor, builderId)) refuse('not-found');
      if (!canWriteHouseModels(actor, builderId)) refuse('not-allowed');
      const [modelId, now] = [randomUUID(), this.clock.now()];
      await namedOnce(this.rows.create({ id: modelId, builderId, name, newestVersion: 1, createdAt: now }));
      await this.versions.create({ modelId, number: 1, geometry, madeBy: actor.personId, madeAt: now });
      await this.ledger.appendTo(
        `organization:${builderId}`,
        'house-model-added',
        { modelId, name },
        whoActs(actor, builderId),
      );
      return this.presenter.present(actor, modelId);
    });
  }

  /** Throws `not-found`, `not-allowed`, `house-model-name-taken`. */
  async rename(actor: Actor, modelId: string, name: string): Promise<HouseModelDetail> {
    return this.unitOfWork.run(async () => {
      const model = await this.lockToWrite(actor, modelId);
      if (name !== model.name) {
        await namedOnce(this.rows.update({ name }, { where: { id: modelId } }));
        await this.ledger.appendTo(
          `organization:${model.builderId}`,
          'house-model-renamed',
          { modelId, name, formerName: model.name },
          whoActs(actor, model.builderId),
        );
      }
      return this.presenter.present(actor, modelId);
    });
  }

  /** A house that is as the newest version makes none. Throws `not-found`, `not-allowed`, `stale-state` (another made one meanwhile). */
  async addVersion(actor: Actor, modelId: string, given: VersionGiven): Promise<HouseModelDetail> {
    return this.unitOfWork.run(async () => {
      const model = await this.lockToWrite(actor, modelId);
      if (model.version !== given.expectedVersion) refuse('stale-state', { version: model.version });
      if (differingParts(model.geometry, given.geometry).length > 0) await this.write(actor, model, given.geometry);
      return this.presenter.present(actor, modelId);
    });
  }

  private async write(actor: Actor, model: HouseModelRecord, geometry: VersionGiven['geometry']): Promise<void> {
    const { id: modelId, name, builderId } = model;
    const version = model.version + 1;
    const madeAt = this.clock.now();
    await this.versions.create({ modelId, number: version, geometry, madeBy: actor.personId, madeAt });
    await this.rows.update({ newestVersion: version }, { where: { id: modelId } });
    const entry = { modelId, name, version };
    await this.ledger.appendTo(`organization:${builderId}`, 'house-model-versioned', entry, whoActs(actor, builderId));
  }

  private async lockToWrite(actor: Actor, modelId: string): Promise<HouseModelRecord> {
    const model = await this.models.lockFor(actor, modelId, 'UPDATE');
    if (!canWriteHouseModels(actor, model.builderId)) refuse('not-allowed');
    return model;
  }
}

/** A builder has each name once; the refusal undoes the unit of work. */
async function namedOnce(write: Promise<unknown>): Promise<void> {
  try {
    await write;
  } catch (error) {
    if (error instanceof UniqueConstraintError) refuse('house-model-name-taken', {}, { name: 'taken' });
    throw error;
  }
}

function whoActs(actor: Actor, builderId: string) {
  return { personId: actor.personId, role: modellingRole(actor, builderId) };
}
