import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../../common/access/actor.js';
import { refuse } from '../../common/errors/app-error.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../../ledger/ledger.service.js';
import { HouseModelModel } from './house-model.model.js';
import { canWriteHouseModels, modellingRole } from './house-models.policy.js';
import { HouseModelsQueries } from './house-models.queries.js';

/** A house model that no lot of its builder uses may go. */
@Injectable()
export class RemoveHouseModelService {
  constructor(
    @InjectModel(HouseModelModel) private readonly rows: typeof HouseModelModel,
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly models: HouseModelsQueries,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
  ) {}

  /** Throws `not-found`, `not-allowed`, `house-model-in-use` (params: how many lots). */
  async remove(actor: Actor, modelId: string): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      const { builderId, name } = await this.models.lockFor(actor, modelId, 'UPDATE');
      if (!canWriteHouseModels(actor, builderId)) refuse('not-allowed');
      const count = await this.countLots(modelId, builderId);
      if (count > 0) refuse('house-model-in-use', { count });
      await this.letGo(modelId);
      await this.rows.destroy({ where: { id: modelId } });
      const who = { personId: actor.personId, role: modellingRole(actor, builderId) };
      await this.ledger.appendTo(`organization:${builderId}`, 'house-model-removed', { modelId, name }, who);
      return { done: true };
    });
  }

  private async countLots(modelId: string, builderId: string): Promise<number> {
    const [found] = await this.sequelize.query<{ count: number }>(
      `SELECT count(DISTINCT l.id)::int AS count FROM lot_units u JOIN lots l ON l.id = u.lot_id
       WHERE u.house_model_id = :modelId AND l.builder_id = :builderId`,
      { replacements: { modelId, builderId }, type: QueryTypes.SELECT },
    );
    return found?.count ?? 0;
  }

  /** Lots that went to another builder keep their houses and have nothing to do with the model any more. */
  private async letGo(modelId: string): Promise<void> {
    await this.sequelize.query(
      'UPDATE lot_units SET house_model_id = NULL, house_model_version = NULL WHERE house_model_id = :modelId',
      { replacements: { modelId }, type: QueryTypes.UPDATE },
    );
  }
}
