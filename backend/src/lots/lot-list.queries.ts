import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { type ClearState, clearStates } from '@holdwater/shared-types/clearances/clearance.rules.js';
import { id } from '@holdwater/shared-types/common/fields.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';
import { fromCursor, toPage } from '../common/paging/cursor.js';
import { briefColumns, briefTables, isReadable, type LotBrief } from './lot-record.js';

export interface LotFilter {
  readonly readerIds: readonly string[];
  readonly now: Date;
  readonly limit: number;
  readonly cursor?: string | undefined;
  readonly tractId?: string | undefined;
  readonly organizationId?: string | undefined;
  readonly state?: ClearState | undefined;
  readonly stage?: string | undefined;
}

type SortedBrief = LotBrief & { sortTract: string; sortPrefix: string; sortNumber: string };

/** A lot without a tract comes last; numbers sort as people read them: 2, 10, 10B, A-3. */
const sortKeys = {
  sortTract: `COALESCE('0' || t.name, '1')`,
  sortPrefix: `substring(l.number FROM '^[^0-9]*')`,
  sortNumber: `COALESCE(substring(l.number FROM '[0-9]+'), '0')::numeric`,
};
const sortOrder = `${sortKeys.sortTract}, ${sortKeys.sortPrefix}, ${sortKeys.sortNumber}, l.number, l.id`;

/** The stages of the rule cards in force, taken out of their JSON once, not once a lot. */
const stagesInForce = `WITH stages AS MATERIALIZED (
  SELECT rc.department_id, stage.value ->> 'code' AS code, (stage.value ->> 'order')::int AS place
  FROM rule_cards rc JOIN departments d ON d.id = rc.department_id CROSS JOIN jsonb_array_elements(rc.content -> 'stages') stage
  WHERE rc.state = 'published' AND rc.effective @> CAST((CAST(:now AS timestamptz) AT TIME ZONE d.zone) AS date))`;

/** Every stage of a lot with the place, in the pinned order, of its unit furthest from clear; 1 is clear. */
const stageStates = `
  SELECT stages.code, stages.place, max(COALESCE(array_position(ARRAY[:clearStates]::text[], c.state), :notTested)) AS worst
  FROM stages CROSS JOIN lot_units u
  LEFT JOIN clearances c ON c.lot_id = u.lot_id AND c.unit_number = u.number AND c.stage_code = stages.code
  WHERE stages.department_id = l.department_id AND u.lot_id = l.id GROUP BY 1, 2`;

const isInState = `(SELECT s.worst FROM (${stageStates}) s WHERE s.code = :stage) = :statePlace`;
/** The current stage is the first that is not clear; a lot is clear when it has stages and none is left. */
const isCurrentlyInState = `(SELECT COALESCE((array_agg(s.worst ORDER BY s.place) FILTER (WHERE s.worst > 1))[1], 1)
  FROM (${stageStates}) s HAVING count(*) > 0) = :statePlace`;

/** Pages and finds lots among those a reader may see. */
@Injectable()
export class LotListQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async pageLots(filter: LotFilter): Promise<{ items: LotBrief[]; nextCursor: string | null }> {
    const rows = await this.select<SortedBrief>(
      `${filter.state === undefined ? '' : stagesInForce}
       SELECT ${briefColumns}, ${sortKeys.sortTract} AS "sortTract", ${sortKeys.sortPrefix} AS "sortPrefix", ${sortKeys.sortNumber}::text AS "sortNumber"
       FROM ${briefTables} WHERE ${conditionsOf(filter).join(' AND ')} ORDER BY ${sortOrder} LIMIT :limit`,
      replacementsOf(filter),
    );
    return toPage(rows, filter.limit, (row) => [row.sortTract, row.sortPrefix, row.sortNumber, row.number, row.id]);
  }

  /** Lots whose number, permit or address has these words; those that begin so come first. */
  async searchLots(readerIds: readonly string[], words: string, limit: number): Promise<LotBrief[]> {
    const escaped = words.toLowerCase().replaceAll(/[\\%_]/g, '\\$&');
    return this.select<LotBrief>(
      `SELECT ${briefColumns} FROM ${briefTables}
       WHERE ${isReadable} AND (lower(l.number) LIKE :contains OR lower(l.permit_number) LIKE :contains OR lower(l.address) LIKE :contains)
       ORDER BY lower(l.number) = :exact DESC, lower(l.number) LIKE :begins DESC, lower(COALESCE(l.permit_number, '')) LIKE :begins DESC,
         lower(l.address) LIKE :begins DESC, ${sortOrder}
       LIMIT :limit`,
      { readerIds: [...readerIds], exact: words.toLowerCase(), begins: `${escaped}%`, contains: `%${escaped}%`, limit },
    );
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}

function conditionsOf({ cursor, tractId, organizationId, state, stage }: LotFilter): string[] {
  const conditions: string[] = [isReadable];
  if (tractId !== undefined) conditions.push('l.tract_id = :tractId');
  if (organizationId !== undefined) conditions.push(':organizationId IN (l.builder_id, l.plumber_id, l.department_id)');
  if (state !== undefined) conditions.push(stage === undefined ? isCurrentlyInState : isInState);
  if (cursor !== undefined)
    conditions.push(
      `(${sortOrder}) > (:afterTract, :afterPrefix, CAST(:afterNumber AS numeric), :after, CAST(:afterId AS uuid))`,
    );
  return conditions;
}

function replacementsOf({ readerIds, cursor, limit, ...filter }: LotFilter): Record<string, unknown> {
  const statePlace = filter.state === undefined ? null : clearStates.indexOf(filter.state) + 1;
  const base = {
    ...filter,
    readerIds: [...readerIds],
    limit: limit + 1,
    clearStates: [...clearStates],
    notTested: clearStates.length,
    statePlace,
  };
  if (cursor === undefined) return base;
  const [afterTract, afterPrefix, afterNumber, after, afterId] = fromCursor(cursor, 5).map(String);
  const isOurs = /^[0-9]+$/.test(afterNumber ?? '') && id.safeParse(afterId).success;
  if (!isOurs) refuse('bad-input', {}, { cursor: 'not-a-cursor' });
  return { ...base, afterTract, afterPrefix, afterNumber, after, afterId };
}
