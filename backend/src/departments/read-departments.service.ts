import { Injectable } from '@nestjs/common';
import type { Department, readDepartment, RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { ClosuresQueries } from './closures.queries.js';
import { canClose, canEditRuleCards, canReadDraft } from './departments.policy.js';
import { presentDepartment, presentRuleCard, presentRuleCardBrief } from './departments.presenter.js';
import { type DepartmentRecord, DepartmentsQueries } from './departments.queries.js';
import { RuleCardsQueries } from './rule-cards.queries.js';

@Injectable()
export class ReadDepartmentsService {
  constructor(
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly closures: ClosuresQueries,
    private readonly clock: Clock,
  ) {}

  /** Every department, by name, with the rule card in force today where it is. */
  async listDepartments(): Promise<Department[]> {
    return this.present(await this.departments.listDepartments());
  }

  /** A department with its versions (drafts to its own only) and the closures from today on. Throws `not-found`. */
  async readDepartment(actor: Actor, departmentId: string): Promise<RouteAnswer<typeof readDepartment>> {
    const record = await this.departments.getDepartment(departmentId);
    const [department = refuse('not-found')] = await this.present([record]);
    const today = this.todayIn(record);
    const versions = await this.ruleCards.listVersions(departmentId);
    const isOwn = canReadDraft(actor, departmentId);
    return {
      department,
      ruleCards: versions
        .filter(({ state }) => isOwn || state === 'published')
        .map((card) => presentRuleCardBrief(card, today)),
      closures: (await this.closures.listClosures(departmentId, today)).map(
        ({ departmentId: _, ...closure }) => closure,
      ),
      abilities: { canEditRuleCards: canEditRuleCards(actor, departmentId), canClose: canClose(actor, departmentId) },
    };
  }

  /** One version; a draft only to its department, and to nobody who is not signed in. Throws `not-found`. */
  async readRuleCard(actor: Actor | null, ruleCardId: string): Promise<RuleCard> {
    const card = await this.ruleCards.getRuleCard(ruleCardId);
    const isOwn = actor !== null && canReadDraft(actor, card.departmentId);
    if (card.state === 'draft' && !isOwn) refuse('not-found');
    const department = await this.departments.getDepartment(card.departmentId);
    return presentRuleCard(card, department, this.todayIn(department), isOwn);
  }

  private async present(records: readonly DepartmentRecord[]): Promise<Department[]> {
    const inForce = await this.ruleCards.listInForce(
      records.map(({ id }) => id),
      this.clock.now(),
    );
    return records.map((record) => presentDepartment(record, inForce.get(record.id) ?? null, this.todayIn(record)));
  }

  private todayIn({ zone }: DepartmentRecord): string {
    return localDateOf(this.clock.now(), zone);
  }
}
