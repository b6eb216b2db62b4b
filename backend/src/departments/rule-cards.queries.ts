import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';

/** One version of a rule card as others read it. */
export interface RuleCardVersion {
  readonly id: string;
  readonly departmentId: string;
  readonly version: number;
  readonly state: 'draft' | 'published';
  readonly content: RuleCardContent;
  /** First day in force, by the department's calendar; null for a draft. */
  readonly effectiveFrom: string | null;
  /** Last day in force; null until replaced. */
  readonly effectiveTo: string | null;
  readonly publishedAt: Date | null;
  /** Who changed it last and when; null for one nobody changed since it was drafted. */
  readonly editedBy: string | null;
  readonly editedAt: Date | null;
}

const columns = `rc.id, rc.department_id AS "departmentId", rc.version, rc.state, rc.content,
  lower(rc.effective)::text AS "effectiveFrom", (upper(rc.effective) - 1)::text AS "effectiveTo", rc.published_at AS "publishedAt",
  (SELECT name FROM persons WHERE id = rc.edited_by) AS "editedBy", rc.edited_at AS "editedAt"`;

/** How other modules read rule cards. */
@Injectable()
export class RuleCardsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** The version in force on a day of the department's calendar. Throws `no-rule-card` when none is. */
  async getRuleCardInForce(departmentId: string, onDate: string): Promise<RuleCardVersion> {
    return (await this.findRuleCardInForce(departmentId, onDate)) ?? refuse('no-rule-card');
  }

  async findRuleCardInForce(departmentId: string, onDate: string): Promise<RuleCardVersion | null> {
    const [found] = await this.select(
      `WHERE rc.department_id = :departmentId AND rc.state = 'published' AND rc.effective @> CAST(:onDate AS date)`,
      { departmentId, onDate },
    );
    return found ?? null;
  }

  /** A version by its id, drafts too. Throws `not-found`. */
  async getRuleCard(id: string): Promise<RuleCardVersion> {
    const [found] = await this.select('WHERE rc.id = :id', { id });
    return found ?? refuse('not-found');
  }

  async listRuleCards(ids: readonly string[]): Promise<Map<string, RuleCardVersion>> {
    const found = await this.select('WHERE rc.id = ANY (ARRAY[:ids]::uuid[])', { ids: [...ids] });
    return new Map(found.map((card) => [card.id, card]));
  }

  /** The versions that rule any day of a span, both ends included, in order of their days. */
  async listInForceBetween(departmentId: string, fromDate: string, toDate: string): Promise<RuleCardVersion[]> {
    return this.select(
      `WHERE rc.department_id = :departmentId AND rc.state = 'published'
         AND rc.effective && daterange(CAST(:fromDate AS date), CAST(:toDate AS date), '[]') ORDER BY lower(rc.effective)`,
      { departmentId, fromDate, toDate },
    );
  }

  /** By department, the version in force at an instant, each by its own calendar. */
  async listInForce(departmentIds: readonly string[], now: Date): Promise<Map<string, RuleCardVersion>> {
    const found = await this.select(
      `JOIN departments d ON d.id = rc.department_id
       WHERE rc.state = 'published' AND rc.department_id = ANY (ARRAY[:departmentIds]::uuid[])
         AND rc.effective @> CAST((CAST(:now AS timestamptz) AT TIME ZONE d.zone) AS date)`,
      { departmentIds: [...departmentIds], now },
    );
    return new Map(found.map((card) => [card.departmentId, card]));
  }

  /** Every version of a department, newest first. */
  async listVersions(departmentId: string): Promise<RuleCardVersion[]> {
    return this.select('WHERE rc.department_id = :departmentId ORDER BY rc.version DESC', { departmentId });
  }

  private async select(rest: string, replacements: Record<string, unknown>): Promise<RuleCardVersion[]> {
    return this.sequelize.query<RuleCardVersion>(`SELECT ${columns} FROM rule_cards rc ${rest}`, {
      replacements,
      type: QueryTypes.SELECT,
    });
  }
}
