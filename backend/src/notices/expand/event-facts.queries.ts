import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';

export interface LotFacts {
  lotNumber: string;
  tractName: string | null;
  address: string;
  builderId: string;
  plumberId: string | null;
  departmentId: string | null;
  builderName: string;
  departmentName: string | null;
  departmentPhone: string | null;
  zone: string | null;
  hasOpenVisit: boolean;
}

export interface VisitFacts {
  stageCode: string;
  windowDate: string;
  inspectorId: string | null;
  requestedBy: string;
  calendarUid: string;
  content: RuleCardContent;
}

export interface PersonRow {
  id: string;
  name: string;
  email: string;
  locale: Locale;
  organizationId: string;
  organizationName: string;
  roles: string[];
}

/** What an event's notices are made of, read when it is expanded. */
@Injectable()
export class EventFactsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async findLot(lotId: string): Promise<LotFacts | null> {
    return this.one<LotFacts>(
      `SELECT l.number AS "lotNumber", t.name AS "tractName", l.address, l.builder_id AS "builderId", l.plumber_id AS "plumberId",
         l.department_id AS "departmentId", b.name AS "builderName", o.name AS "departmentName", o.phone AS "departmentPhone", d.zone,
         EXISTS (SELECT 1 FROM visits v WHERE v.lot_id = l.id AND v.state IN ('requested', 'booked', 'ready', 'underway')) AS "hasOpenVisit"
       FROM lots l JOIN organizations b ON b.id = l.builder_id LEFT JOIN tracts t ON t.id = l.tract_id
       LEFT JOIN departments d ON d.id = l.department_id LEFT JOIN organizations o ON o.id = d.id
       WHERE l.id = :lotId`,
      { lotId },
    );
  }

  async findVisit(visitId: string): Promise<VisitFacts | null> {
    return this.one<VisitFacts>(
      `SELECT v.stage_code AS "stageCode", v.window_date::text AS "windowDate", v.inspector_id AS "inspectorId",
         v.requested_by AS "requestedBy", v.calendar_uid AS "calendarUid", r.content
       FROM visits v JOIN rule_cards r ON r.id = v.rule_card_id WHERE v.id = :visitId`,
      { visitId },
    );
  }

  /** Members in force of these organizations, with the language they read. */
  async listMembers(organizationIds: ReadonlyArray<string | null>): Promise<PersonRow[]> {
    return this.sequelize.query<PersonRow>(
      `SELECT p.id, p.name, p.email, p.locale, o.id AS "organizationId", o.name AS "organizationName", m.roles
       FROM memberships m JOIN persons p ON p.id = m.person_id JOIN organizations o ON o.id = m.organization_id
       WHERE o.id = ANY (ARRAY[:ids]::uuid[]) AND NOT m.is_disabled AND NOT p.is_disabled ORDER BY p.name, p.id`,
      { replacements: { ids: organizationIds.filter((id) => id !== null) }, type: QueryTypes.SELECT },
    );
  }

  /** Somebody who may be on no organization of the lot any more, as a member of any. */
  async findMember(personId: string): Promise<PersonRow | null> {
    return this.one<PersonRow>(
      `SELECT p.id, p.name, p.email, p.locale, o.id AS "organizationId", o.name AS "organizationName", m.roles
       FROM memberships m JOIN persons p ON p.id = m.person_id JOIN organizations o ON o.id = m.organization_id
       WHERE p.id = :personId AND NOT m.is_disabled AND NOT p.is_disabled ORDER BY o.name, o.id LIMIT 1`,
      { personId },
    );
  }

  async findPersonName(personId: string | null): Promise<string | null> {
    if (personId === null) return null;
    const row = await this.one<{ name: string }>('SELECT name FROM persons WHERE id = :personId', { personId });
    return row?.name ?? null;
  }

  async findOpenerId(correctionId: string): Promise<string | null> {
    const row = await this.one<{ openedBy: string }>(
      'SELECT opened_by AS "openedBy" FROM corrections WHERE id = :correctionId',
      { correctionId },
    );
    return row?.openedBy ?? null;
  }

  /** Organizations of builder and plumber with an open visit under a department: whom a new rule card concerns. */
  async listOrganizationsWithOpenVisit(departmentId: string): Promise<string[]> {
    const rows = await this.sequelize.query<{ id: string }>(
      `SELECT DISTINCT unnest(ARRAY[l.builder_id, l.plumber_id]) AS id FROM visits v JOIN lots l ON l.id = v.lot_id
       WHERE v.department_id = :departmentId AND v.state IN ('requested', 'booked', 'ready', 'underway')`,
      { replacements: { departmentId }, type: QueryTypes.SELECT },
    );
    return rows.map(({ id }) => id).filter((id) => id !== null);
  }

  /** Who has, by our own mails, an entry of this visit in their calendar, and the newest sequence of it. */
  async listInvited(visitId: string): Promise<Array<{ personId: string; address: string }>> {
    return this.sequelize
      .query(
        `SELECT DISTINCT ON (address) person_id AS "personId", address, payload -> 'invite' ->> 'method' AS method
       FROM deliveries WHERE order_key = :key AND payload -> 'invite' ->> 'method' IS NOT NULL AND state <> 'dropped'
       ORDER BY address, position DESC`,
        { replacements: { key: visitId }, type: QueryTypes.SELECT },
      )
      .then((rows) =>
        (rows as Array<{ personId: string; address: string; method: string }>).filter(
          ({ method }) => method === 'REQUEST',
        ),
      );
  }

  private async one<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row | null> {
    const [row] = await this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
    return row ?? null;
  }
}
