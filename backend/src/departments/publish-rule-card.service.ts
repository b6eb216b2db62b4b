import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { ruleCardFaults } from '@holdwater/shared-types/departments/rule-card-faults.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { DepartmentsQueries } from './departments.queries.js';
import { ReadDepartmentsService } from './read-departments.service.js';
import { RuleCardDraftsService } from './rule-card-drafts.service.js';
import { RuleCardsQueries } from './rule-cards.queries.js';

/** Publishing: from a day on, for good. What was booked before keeps the version it was booked under. */
@Injectable()
export class PublishRuleCardService {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly drafts: RuleCardDraftsService,
    private readonly reading: ReadDepartmentsService,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly clock: Clock,
  ) {}

  /**
   * The version in force on that day ends the day before. Throws `rule-card-in-the-past` (params: the first day possible),
   * `rule-card-overlap` (a version begins on that day or later already), `rule-card-incomplete` (fields name what does not fit).
   */
  async publish(actor: Actor, ruleCardId: string, effectiveFrom: string): Promise<RuleCard> {
    return this.unitOfWork.run(async () => {
      const { departmentId, version, content } = await this.drafts.getDraftToChange(actor, ruleCardId);
      await this.refuseWrongDay(departmentId, effectiveFrom);
      const faults = ruleCardFaults(content);
      if (Object.keys(faults).length > 0) refuse('rule-card-incomplete', {}, faults);
      await this.endVersionBefore(departmentId, effectiveFrom);
      await this.write(actor, ruleCardId, effectiveFrom);
      const who = { personId: actor.personId, role: 'desk' };
      await this.ledger.appendTo(
        `department:${departmentId}`,
        'rule-card-published',
        { ruleCardId, version, effectiveFrom },
        who,
      );
      await this.outbox.add(
        'rule-card-published',
        { actorId: actor.personId },
        { ruleCardId, departmentId, version, effectiveFrom },
      );
      return this.reading.readRuleCard(actor, ruleCardId);
    });
  }

  private async refuseWrongDay(departmentId: string, effectiveFrom: string): Promise<void> {
    const { zone } = await this.departments.getDepartment(departmentId);
    const today = localDateOf(this.clock.now(), zone);
    if (effectiveFrom < today) refuse('rule-card-in-the-past', { today }, { effectiveFrom: 'in-the-past' });
    const versions = await this.ruleCards.listVersions(departmentId);
    const later = versions.find((card) => card.effectiveFrom !== null && card.effectiveFrom >= effectiveFrom);
    if (later)
      refuse('rule-card-overlap', { version: later.version, from: later.effectiveFrom }, { effectiveFrom: 'taken' });
  }

  private async endVersionBefore(departmentId: string, effectiveFrom: string): Promise<void> {
    await this.sequelize.query(
      `UPDATE rule_cards SET effective = daterange(lower(effective), CAST(:effectiveFrom AS date))
       WHERE department_id = :departmentId AND state = 'published' AND effective @> CAST(:effectiveFrom AS date)`,
      { replacements: { departmentId, effectiveFrom }, type: QueryTypes.UPDATE },
    );
  }

  private async write(actor: Actor, ruleCardId: string, effectiveFrom: string): Promise<void> {
    await this.sequelize.query(
      `UPDATE rule_cards SET state = 'published', effective = daterange(CAST(:effectiveFrom AS date), NULL), published_by = :personId, published_at = :now
       WHERE id = :ruleCardId`,
      {
        replacements: { ruleCardId, effectiveFrom, personId: actor.personId, now: this.clock.now() },
        type: QueryTypes.UPDATE,
      },
    );
  }
}
