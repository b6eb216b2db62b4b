import type { RuleCardContent, Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { OutcomeKind } from '@holdwater/shared-types/outcomes/outcome.states.js';
import type { VisitState } from '@holdwater/shared-types/visits/visit.states.js';

/** A visit with everything its summary shows, of one statement. */
export interface VisitRow {
  id: string;
  lotId: string;
  lotNumber: string;
  address: string;
  tractName: string | null;
  builderId: string;
  plumberId: string | null;
  mayPlumberRequest: boolean;
  builderName: string;
  plumberName: string | null;
  departmentId: string;
  departmentName: string;
  zone: string;
  stageCode: string;
  stage: Stage | null;
  readiness: RuleCardContent['readiness'];
  ruleCardId: string;
  ruleCardVersion: number;
  unitNumbers: number[];
  state: VisitState;
  version: number;
  windowDate: string;
  windowLabel: string;
  windowStartAt: Date;
  windowEndAt: Date;
  plannedStartAt: Date | null;
  plannedEndAt: Date | null;
  inspectorId: string | null;
  inspectorName: string | null;
  inspectorPhone: string | null;
  requestedBy: string;
  requestingSide: 'builder' | 'plumber' | 'desk';
  requestedAt: Date;
  readyAt: Date | null;
  begunAt: Date | null;
  begunBy: string | null;
  outcomeKind: OutcomeKind | null;
  outcomeReason: string | null;
  endReason: string | null;
  endNote: string | null;
  /** The tests standing with a reading that counts. */
  standing: Array<{ unitNumber: number; system: System }> | null;
  openCorrections: number;
  isRetest: boolean;
  hasFirstPlace: boolean;
  neededBy: Date | null;
  note: string | null;
}

/**
 * The stage is the one of the rule card the visit was booked under. A test counts as up with a reading that is not struck and tells of the
 * system: for a gauge one with its valve open. Notes are no corrections that anyone waits for.
 */
export const visitRowSql = `
  SELECT v.id, v.lot_id AS "lotId", l.number AS "lotNumber", l.address, t.name AS "tractName", l.builder_id AS "builderId",
    l.plumber_id AS "plumberId", l.may_plumber_request AS "mayPlumberRequest", b.name AS "builderName", p.name AS "plumberName",
    v.department_id AS "departmentId", o.name AS "departmentName", d.zone, v.stage_code AS "stageCode", s.stage,
    rc.content -> 'readiness' AS readiness, rc.id AS "ruleCardId", rc.version AS "ruleCardVersion", v.unit_numbers AS "unitNumbers",
    v.state, v.version, v.window_date::text AS "windowDate", v.window_label AS "windowLabel", lower(v."window") AS "windowStartAt",
    upper(v."window") AS "windowEndAt", lower(v.planned) AS "plannedStartAt", upper(v.planned) AS "plannedEndAt",
    v.inspector_id AS "inspectorId", i.name AS "inspectorName", i.phone AS "inspectorPhone", v.requested_by AS "requestedBy",
    v.requesting_side AS "requestingSide", v.requested_at AS "requestedAt", v.ready_at AS "readyAt", v.begun_at AS "begunAt",
    v.begun_by AS "begunBy", oc.kind AS "outcomeKind", oc.reason AS "outcomeReason", v.end_reason AS "endReason", v.end_note AS "endNote",
    up.standing, open.count AS "openCorrections", v.is_retest AS "isRetest", v.has_first_place AS "hasFirstPlace",
    v.needed_by AS "neededBy", v.note
  FROM visits v
  JOIN lots l ON l.id = v.lot_id
  JOIN organizations b ON b.id = l.builder_id
  LEFT JOIN organizations p ON p.id = l.plumber_id
  LEFT JOIN tracts t ON t.id = l.tract_id
  JOIN organizations o ON o.id = v.department_id
  JOIN departments d ON d.id = v.department_id
  JOIN rule_cards rc ON rc.id = v.rule_card_id
  LEFT JOIN persons i ON i.id = v.inspector_id
  LEFT JOIN outcomes oc ON oc.visit_id = v.id
  LEFT JOIN LATERAL (
    SELECT e.value AS stage FROM jsonb_array_elements(rc.content -> 'stages') e WHERE e.value ->> 'code' = v.stage_code LIMIT 1
  ) s ON true
  LEFT JOIN LATERAL (
    SELECT jsonb_agg(jsonb_build_object('unitNumber', h.unit_number, 'system', h.system)) AS standing
    FROM holds h
    WHERE h.lot_id = v.lot_id AND h.stage_code = v.stage_code AND h.state = 'standing' AND h.unit_number = ANY (v.unit_numbers)
      AND EXISTS (SELECT 1 FROM readings r WHERE r.hold_id = h.id AND r.struck_at IS NULL AND r.gauge_valve IS DISTINCT FROM 'shut')
  ) up ON true
  LEFT JOIN LATERAL (
    SELECT count(*)::int AS count FROM corrections c
    WHERE c.lot_id = v.lot_id AND c.stage_code = v.stage_code AND c.unit_number = ANY (v.unit_numbers)
      AND c.state = 'open' AND c.severity <> 'note'
  ) open ON true`;

/** Visits whose lot belongs to one of the organizations `:readerIds`; the same rule as `canReadLot`. */
export const isVisitReadable = `(l.builder_id = ANY (ARRAY[:readerIds]::uuid[]) OR l.plumber_id = ANY (ARRAY[:readerIds]::uuid[])
  OR v.department_id = ANY (ARRAY[:readerIds]::uuid[]))`;
