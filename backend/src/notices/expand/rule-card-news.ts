import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { locales, type Locale } from '@holdwater/shared-types/common/locale.js';
import {
  changesForStages,
  changeSentence,
  compareRuleCards,
  type RuleCardChange,
} from '@holdwater/shared-types/departments/compare-rule-cards.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { OutboxPayloads } from '../outbox.kinds.js';
import type { PersonRow } from './event-facts.queries.js';

/** What a new version changes for one reader, a sentence each, in every language: notices are read in the language of their day. */
export interface NewsForPerson {
  readonly sentences: Readonly<Record<Locale, readonly string[]>>;
  /** How many more there are than are told here. */
  readonly more: number;
}

export interface RuleCardNews {
  readonly departmentName: string;
  readonly of: (person: PersonRow) => NewsForPerson;
}

/** A visit held to its own version, and whose it is. */
interface HeldVisit {
  stageCode: string;
  content: RuleCardContent;
  builderId: string;
  plumberId: string | null;
}

/** A mail that goes on longer is not read; the rest stands on the rule card's page. */
const mostSentences = 8;

/** Reads what a published rule card changes, for whom. */
@Injectable()
export class RuleCardNewsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /**
   * Builders and plumbers are told what changes for the stages of their open visits, against the version each visit is held to; members of
   * the department what changes against the version before. Null when the rule card is no more.
   */
  async find({
    ruleCardId,
    departmentId,
    version,
  }: OutboxPayloads['rule-card-published']): Promise<RuleCardNews | null> {
    const [card] = await this.select<{ content: RuleCardContent; departmentName: string }>(
      `SELECT rc.content, o.name AS "departmentName" FROM rule_cards rc JOIN organizations o ON o.id = rc.department_id
       WHERE rc.id = :ruleCardId`,
      { ruleCardId },
    );
    if (card === undefined) return null;
    const [before] = await this.select<{ content: RuleCardContent }>(
      `SELECT content FROM rule_cards WHERE department_id = :departmentId AND state = 'published' AND version < :version
       ORDER BY version DESC LIMIT 1`,
      { departmentId, version },
    );
    const visits = await this.listHeldVisits(departmentId, ruleCardId);
    const forDepartment = newsOf(before === undefined ? [] : compareRuleCards(before.content, card.content));
    return {
      departmentName: card.departmentName,
      of: ({ organizationId }) =>
        organizationId === departmentId
          ? forDepartment
          : newsOf(
              changesForVisits(
                visits.filter((each) => [each.builderId, each.plumberId].includes(organizationId)),
                card.content,
              ),
            ),
    };
  }

  private async listHeldVisits(departmentId: string, ruleCardId: string): Promise<HeldVisit[]> {
    return this.select(
      `SELECT v.stage_code AS "stageCode", rc.content, l.builder_id AS "builderId", l.plumber_id AS "plumberId"
       FROM visits v JOIN rule_cards rc ON rc.id = v.rule_card_id JOIN lots l ON l.id = v.lot_id
       WHERE v.department_id = :departmentId AND v.rule_card_id <> :ruleCardId
         AND v.state IN ('requested', 'booked', 'ready', 'underway')
       ORDER BY rc.version DESC, v.stage_code`,
      { departmentId, ruleCardId },
    );
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}

/** A row that changes against several older versions is told once, against the newest of them. */
export function changesForVisits(
  visits: ReadonlyArray<Pick<HeldVisit, 'stageCode' | 'content'>>,
  after: RuleCardContent,
): RuleCardChange[] {
  const told = new Map<string, RuleCardChange>();
  for (const { stageCode, content } of visits) {
    for (const change of changesForStages(compareRuleCards(content, after), [stageCode])) {
      const key = [change.stageCode, change.note, change.row].join(' ');
      if (!told.has(key)) told.set(key, change);
    }
  }
  return [...told.values()];
}

function newsOf(changes: readonly RuleCardChange[]): NewsForPerson {
  // where a value comes from changes nothing for who works by it
  const telling = changes.filter(({ note }) => note !== 'sources');
  const shown = telling.slice(0, mostSentences);
  const sentences = Object.fromEntries(
    locales.map((locale) => [locale, shown.map((change) => changeSentence(change, locale))]),
  ) as Record<Locale, string[]>;
  return { sentences, more: telling.length - shown.length };
}
