import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { addClosure, Closure } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { ClosureEffects } from './closure-effects.js';
import { ClosureModel } from './closure.model.js';
import { canClose } from './departments.policy.js';
import { DepartmentsQueries } from './departments.queries.js';

type ClosureGiven = RouteInput<typeof addClosure>['body'];

/** Days, or spans of a day, on which a department does not come. */
@Injectable()
export class ClosuresService {
  constructor(
    @InjectModel(ClosureModel) private readonly models: typeof ClosureModel,
    private readonly departments: DepartmentsQueries,
    private readonly effects: ClosureEffects,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
  ) {}

  /** Open visits inside it are freed in the same unit of work. Throws `not-found`, `not-allowed`, `bad-input` for a day gone by. */
  async add(actor: Actor, departmentId: string, given: ClosureGiven): Promise<Closure> {
    return this.unitOfWork.run(async () => {
      const { zone } = await this.lockFor(actor, departmentId);
      if (given.date < localDateOf(this.clock.now(), zone)) refuse('bad-input', {}, { date: 'in-the-past' });
      const closure = { id: randomUUID(), ...given };
      await this.models.create({
        id: closure.id,
        departmentId,
        date: given.date,
        fromTime: given.from,
        toTime: given.to,
        why: given.why,
        createdBy: actor.personId,
        createdAt: this.clock.now(),
      });
      const who = { personId: actor.personId, role: 'desk' };
      await this.ledger.appendTo(`department:${departmentId}`, 'closure-added', given, who);
      await this.effects.afterClosureAdded({ ...closure, departmentId, zone, actor: who });
      return closure;
    });
  }

  /** Visits freed by it stay freed. Throws `not-found`, `not-allowed`. */
  async remove(actor: Actor, departmentId: string, closureId: string): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      await this.lockFor(actor, departmentId);
      const closure = await this.models.findOne({ where: { id: closureId, departmentId, removedAt: null } });
      if (closure === null) return refuse('not-found');
      await this.models.update({ removedAt: this.clock.now() }, { where: { id: closureId } });
      const who = { personId: actor.personId, role: 'desk' };
      await this.ledger.appendTo(`department:${departmentId}`, 'closure-removed', { date: closure.date }, who);
      return { done: true };
    });
  }

  private async lockFor(actor: Actor, departmentId: string) {
    const department = await this.departments.lockDepartment(departmentId);
    if (!canClose(actor, departmentId)) refuse('not-allowed');
    return department;
  }
}
