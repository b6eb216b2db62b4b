import type { updateMe } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { Me } from '@holdwater/shared-types/accounts/person.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Actor } from '../../common/access/actor.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { presentMe } from '../accounts.presenter.js';
import { AccountsQueries } from '../accounts.queries.js';
import { PersonModel } from '../person.model.js';

/** One's own account. */
@Injectable()
export class MyAccount {
  constructor(
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly queries: AccountsQueries,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  async read(actor: Actor): Promise<Me> {
    const person = await this.persons.findByPk(actor.personId, { rejectOnEmpty: true });
    return presentMe(person, await this.queries.listMembershipsOf(person.id));
  }

  async update(actor: Actor, changes: RouteInput<typeof updateMe>['body']): Promise<Me> {
    return this.unitOfWork.run(async () => {
      await this.persons.update(changes, { where: { id: actor.personId } });
      return this.read(actor);
    });
  }
}
