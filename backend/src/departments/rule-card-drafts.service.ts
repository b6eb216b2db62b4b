import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { canEditRuleCards, canReadDraft } from './departments.policy.js';
import { DepartmentsQueries } from './departments.queries.js';
import { ReadDepartmentsService } from './read-departments.service.js';
import { RuleCardModel } from './rule-card.model.js';
import { RuleCardsQueries, type RuleCardVersion } from './rule-cards.queries.js';
import { starterRuleCard } from './starter-rule-card.js';

/** Drafts of rule cards: begun from the newest version, edited as often as the desk likes. */
@Injectable()
export class RuleCardDraftsService {
  constructor(
    @InjectModel(RuleCardModel) private readonly models: typeof RuleCardModel,
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly reading: ReadDepartmentsService,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
  ) {}

  /** A department has one draft at most: where there is one, that is given. Throws `not-found`, `not-allowed`. */
  async draft(actor: Actor, departmentId: string): Promise<RuleCard> {
    return this.unitOfWork.run(async () => {
      await this.departments.lockDepartment(departmentId);
      if (!canEditRuleCards(actor, departmentId)) refuse('not-allowed');
      const [newest] = await this.ruleCards.listVersions(departmentId);
      const id = newest?.state === 'draft' ? newest.id : await this.create(actor, departmentId, newest);
      return this.reading.readRuleCard(actor, id);
    });
  }

  /** Throws `not-found`, `not-allowed`, `rule-card-not-draft`. */
  async edit(actor: Actor, ruleCardId: string, content: RuleCardContent): Promise<RuleCard> {
    return this.unitOfWork.run(async () => {
      await this.getDraftToChange(actor, ruleCardId);
      const editedAt = this.clock.now();
      await this.models.update({ content, editedBy: actor.personId, editedAt }, { where: { id: ruleCardId } });
      return this.reading.readRuleCard(actor, ruleCardId);
    });
  }

  /** Throws a draft away; its number is the next draft's. Throws `not-found`, `not-allowed`, `rule-card-not-draft`. */
  async remove(actor: Actor, ruleCardId: string): Promise<void> {
    await this.unitOfWork.run(async () => {
      const { departmentId, version } = await this.getDraftToChange(actor, ruleCardId);
      await this.models.destroy({ where: { id: ruleCardId } });
      const who = { personId: actor.personId, role: 'desk' };
      await this.ledger.appendTo(`department:${departmentId}`, 'rule-card-draft-deleted', { ruleCardId, version }, who);
    });
  }

  /** A draft the actor may change, its department locked. Throws `not-found`, `not-allowed`, `rule-card-not-draft`. */
  async getDraftToChange(actor: Actor, ruleCardId: string): Promise<RuleCardVersion> {
    const { departmentId } = await this.ruleCards.getRuleCard(ruleCardId);
    await this.departments.lockDepartment(departmentId);
    const card = await this.ruleCards.getRuleCard(ruleCardId);
    if (card.state === 'draft' && !canReadDraft(actor, departmentId)) refuse('not-found');
    if (!canEditRuleCards(actor, departmentId)) refuse('not-allowed');
    return card.state === 'draft' ? card : refuse('rule-card-not-draft', { version: card.version });
  }

  private async create(actor: Actor, departmentId: string, newest: RuleCardVersion | undefined): Promise<string> {
    const id = randomUUID();
    const version = (newest?.version ?? 0) + 1;
    await this.models.create({
      id,
      departmentId,
      version,
      state: 'draft',
      content: newest?.content ?? starterRuleCard,
      effective: null,
      createdBy: actor.personId,
      createdAt: this.clock.now(),
    });
    await this.ledger.appendTo(
      `department:${departmentId}`,
      'rule-card-drafted',
      { ruleCardId: id, version },
      { personId: actor.personId, role: 'desk' },
    );
    return id;
  }
}
