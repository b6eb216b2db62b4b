import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { createTract, Tract, updateTract } from '@holdwater/shared-types/lots/tract.contract.js';
import { UniqueConstraintError } from 'sequelize';
import { type Actor, isMember } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { LotFollowers } from './lot-followers.js';
import { TractModel } from './tract.model.js';
import { canEditTracts } from './tracts.policy.js';
import { TractsQueries } from './tracts.queries.js';

type TractGiven = RouteInput<typeof createTract>['body'];
type TractUpdate = RouteInput<typeof updateTract>['body'];

@Injectable()
export class TractsService {
  constructor(
    @InjectModel(TractModel) private readonly models: typeof TractModel,
    private readonly tracts: TractsQueries,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
    private readonly followers: LotFollowers,
  ) {}

  /** Throws `not-found`, `not-allowed`, `tract-name-taken`. */
  async create(actor: Actor, { builderId, name, plat = null }: TractGiven): Promise<Tract> {
    return this.unitOfWork.run(async () => {
      if (!isMember(actor, builderId)) refuse('not-found');
      if (!canEditTracts(actor, builderId)) refuse('not-allowed');
      const id = randomUUID();
      await namedOnce(this.models.create({ id, builderId, name, plat, createdAt: this.clock.now() }));
      await this.ledger.appendTo(`organization:${builderId}`, 'tract-added', { name }, whoActs(actor));
      return this.tracts.getFor(actor, id);
    });
  }

  /** Throws `not-found`, `not-allowed`, `tract-name-taken`. */
  async update(actor: Actor, tractId: string, update: TractUpdate): Promise<Tract> {
    return this.unitOfWork.run(async () => {
      const tract = await this.tracts.getFor(actor, tractId);
      if (!canEditTracts(actor, tract.builderId)) refuse('not-allowed');
      const fields = Object.keys(update);
      if (fields.length === 0) return tract;
      await namedOnce(this.models.update(update, { where: { id: tractId } }));
      const changed = { name: update.name ?? tract.name, fields };
      await this.ledger.appendTo(`organization:${tract.builderId}`, 'tract-changed', changed, whoActs(actor));
      if (changed.name !== tract.name) await this.followers.renamed(await this.tracts.listLotIds(tractId), actor);
      return this.tracts.getFor(actor, tractId);
    });
  }
}

/** A builder has each name once; the refusal undoes the unit of work. */
async function namedOnce(write: Promise<unknown>): Promise<void> {
  try {
    await write;
  } catch (error) {
    if (error instanceof UniqueConstraintError) refuse('tract-name-taken', {}, { name: 'taken' });
    throw error;
  }
}

function whoActs(actor: Actor) {
  return { personId: actor.personId, role: 'superintendent' };
}
