import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Outcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

interface OutcomeRow extends Omit<Outcome, 'at' | 'receivedAt' | 'systems' | 'work'> {
  readonly at: Date;
  readonly receivedAt: Date;
  readonly systems: Outcome['systems'] | null;
  readonly looked: Array<{ pointCode: string; isLookedAt: boolean }> | null;
  readonly points: Stage['work'] | null;
}

/** The points bear the words of the rule card the visit was booked under. */
const outcomeSql = `
  SELECT o.id, o.visit_id AS "visitId", o.kind, o.reason, o.note, o.made_at AS at, o.received_at AS "receivedAt", p.name AS "byName",
    (SELECT json_agg(json_build_object('unitNumber', s.unit_number, 'system', s.system, 'answer', s.answer, 'needle', s.needle,
        'pressurePsi', s.pressure_psi, 'levelIn', s.level_in, 'note', s.note) ORDER BY s.unit_number, s.system)
      FROM outcome_systems s WHERE s.outcome_id = o.id) AS systems,
    (SELECT json_agg(json_build_object('pointCode', w.point_code, 'isLookedAt', w.is_looked_at))
      FROM outcome_work w WHERE w.outcome_id = o.id) AS looked,
    (SELECT e.value -> 'work' FROM jsonb_array_elements(rc.content -> 'stages') e WHERE e.value ->> 'code' = v.stage_code LIMIT 1) AS points
  FROM outcomes o
  JOIN persons p ON p.id = o.by_person
  JOIN visits v ON v.id = o.visit_id
  JOIN rule_cards rc ON rc.id = v.rule_card_id
  WHERE o.visit_id = :visitId`;

/** How outcomes are read. Whether somebody may is the caller's to ask. */
@Injectable()
export class OutcomesQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** The outcome of a visit, or null while it has none. */
  async findOfVisit(visitId: string): Promise<Outcome | null> {
    const [row] = await this.sequelize.query<OutcomeRow>(outcomeSql, {
      replacements: { visitId },
      type: QueryTypes.SELECT,
    });
    return row ? presentOutcome(row) : null;
  }
}

function presentOutcome({ at, receivedAt, systems, looked, points, ...shown }: OutcomeRow): Outcome {
  return {
    ...shown,
    at: at.toISOString(),
    receivedAt: receivedAt.toISOString(),
    systems: systems ?? [],
    work: (points ?? []).flatMap(({ code, label }) => {
      const line = looked?.find((each) => each.pointCode === code);
      return line ? [{ pointCode: code, label, isLookedAt: line.isLookedAt }] : [];
    }),
  };
}
