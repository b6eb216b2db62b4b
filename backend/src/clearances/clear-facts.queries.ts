import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { buriedByMethod } from '@holdwater/shared-types/clearances/take-down.js';
import type { ClearFacts } from '@holdwater/shared-types/clearances/clearance.rules.js';
import type { Method } from '@holdwater/shared-types/holds/hold.states.js';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

interface Asked {
  readonly lotId: string;
  readonly unitNumber: number;
  readonly stageCode: string;
}

interface FactRow {
  hasPassed: boolean | null;
  corrections: ClearFacts['corrections'] | null;
  openVisit: ClearFacts['openVisit'];
  isHoldStanding: boolean;
  passedMethods: Method[] | null;
}

/**
 * One statement, so that all facts are of one moment. The stage's systems and points of work are those of the rule card the closed visit
 * was booked under; a point with a correction on it was looked at too. The tests a pass rests on are those that stood while it was made.
 */
const factsSql = `
  WITH last_closed AS (
    SELECT v.id, v.begun_at, o.id AS outcome_id, o.kind, o.made_at, s.stage
    FROM visits v JOIN outcomes o ON o.visit_id = v.id JOIN rule_cards rc ON rc.id = v.rule_card_id
    LEFT JOIN LATERAL (SELECT e.value AS stage FROM jsonb_array_elements(rc.content -> 'stages') e WHERE e.value ->> 'code' = v.stage_code) s ON true
    WHERE v.lot_id = :lotId AND v.stage_code = :stageCode AND v.state = 'closed' AND :unitNumber = ANY (v.unit_numbers)
    ORDER BY o.made_at DESC, o.received_at DESC LIMIT 1
  ), passed AS (
    SELECT lc.*, lc.kind = 'pass'
      AND NOT EXISTS (
        SELECT 1 FROM jsonb_array_elements_text(lc.stage -> 'systems') required
        WHERE NOT EXISTS (SELECT 1 FROM outcome_systems os WHERE os.outcome_id = lc.outcome_id AND os.unit_number = :unitNumber
          AND os.system = required.value AND os.answer = 'pass'))
      AND NOT EXISTS (
        SELECT 1 FROM jsonb_array_elements(lc.stage -> 'work') point
        WHERE NOT EXISTS (SELECT 1 FROM outcome_work ow WHERE ow.outcome_id = lc.outcome_id AND ow.point_code = point.value ->> 'code' AND ow.is_looked_at)
          AND NOT EXISTS (SELECT 1 FROM corrections c WHERE c.visit_id = lc.id AND c.point_code = point.value ->> 'code')) AS has_passed
    FROM last_closed lc
  )
  SELECT
    (SELECT has_passed FROM passed) AS "hasPassed",
    (SELECT json_agg(json_build_object('state', c.state, 'severity', c.severity)) FROM corrections c
      WHERE c.lot_id = :lotId AND c.unit_number = :unitNumber AND c.stage_code = :stageCode) AS corrections,
    (SELECT v.state FROM visits v WHERE v.lot_id = :lotId AND v.stage_code = :stageCode AND :unitNumber = ANY (v.unit_numbers)
      AND v.state IN (:openStates)) AS "openVisit",
    EXISTS (SELECT 1 FROM holds h WHERE h.lot_id = :lotId AND h.unit_number = :unitNumber AND h.stage_code = :stageCode
      AND h.state = 'standing') AS "isHoldStanding",
    (SELECT json_agg(DISTINCT h.method) FROM holds h, passed p WHERE p.has_passed
      AND h.lot_id = :lotId AND h.unit_number = :unitNumber AND h.stage_code = :stageCode
      AND h.started_at <= p.made_at AND (h.ended_at IS NULL OR h.ended_at >= COALESCE(p.begun_at, p.made_at))) AS "passedMethods"`;

/** Gathers what the state of one lot, unit and stage rests on. */
@Injectable()
export class ClearFactsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async readFacts(asked: Asked): Promise<ClearFacts> {
    const [row] = await this.sequelize.query<FactRow>(factsSql, {
      replacements: { ...asked, openStates: [...openVisitStates] },
      type: QueryTypes.SELECT,
    });
    return {
      hasPassed: row?.hasPassed ?? false,
      corrections: row?.corrections ?? [],
      // the list of what was put back is not kept yet: everything a passed method leaves behind is still to do
      putBackBeforeCover: (row?.passedMethods ?? []).flatMap((method) => buriedByMethod[method] ?? []).length,
      hasFeeDue: false,
      isRevoked: false,
      openVisit: row?.openVisit ?? null,
      isHoldStanding: row?.isHoldStanding ?? false,
    };
  }
}
