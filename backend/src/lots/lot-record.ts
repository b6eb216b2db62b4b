import type { LotParties } from './lots.policy.js';

/** A lot's row, read only. */
export interface LotRecord extends LotParties {
  readonly id: string;
  readonly tractId: string | null;
  readonly number: string;
  readonly address: string;
  readonly latitude: number | null;
  readonly longitude: number | null;
  readonly permitNumber: string | null;
  readonly permitStatus: 'not-applied' | 'applied' | 'issued' | 'expired';
  readonly permitHolder: string | null;
  readonly coverDate: string | null;
  readonly gateCode: string | null;
  readonly contactName: string | null;
  readonly contactPhone: string | null;
  readonly hazards: string | null;
}

/** What names a lot to a reader, with the names of its parties. */
export interface LotBrief extends LotParties {
  readonly id: string;
  readonly number: string;
  readonly address: string;
  readonly tractId: string | null;
  readonly tractName: string | null;
  readonly permitNumber: string | null;
  readonly permitStatus: LotRecord['permitStatus'];
  readonly builderName: string;
  readonly plumberName: string | null;
  readonly departmentName: string | null;
  /** The department's zone. */
  readonly zone: string | null;
}

export const lotColumns = `l.id, l.builder_id AS "builderId", l.plumber_id AS "plumberId", l.department_id AS "departmentId",
  l.may_plumber_request AS "mayPlumberRequest", l.tract_id AS "tractId", l.number, l.address, l.latitude, l.longitude,
  l.permit_number AS "permitNumber", l.permit_status AS "permitStatus", l.permit_holder AS "permitHolder", l.cover_date::text AS "coverDate",
  l.gate_code AS "gateCode", l.contact_name AS "contactName", l.contact_phone AS "contactPhone", l.hazards`;

export const briefColumns = `l.id, l.number, l.address, l.tract_id AS "tractId", t.name AS "tractName", l.permit_number AS "permitNumber",
  l.permit_status AS "permitStatus", l.may_plumber_request AS "mayPlumberRequest", l.builder_id AS "builderId", b.name AS "builderName",
  l.plumber_id AS "plumberId", p.name AS "plumberName", l.department_id AS "departmentId", o.name AS "departmentName", d.zone`;

/** The tables `briefColumns` come from. */
export const briefTables = `lots l JOIN organizations b ON b.id = l.builder_id LEFT JOIN tracts t ON t.id = l.tract_id
  LEFT JOIN organizations p ON p.id = l.plumber_id LEFT JOIN organizations o ON o.id = l.department_id
  LEFT JOIN departments d ON d.id = l.department_id`;

/** The lots a reader may see: those of the organizations `:readerIds`. The same rule as `canReadLot`. */
export const isReadable = `(l.builder_id = ANY (ARRAY[:readerIds]::uuid[]) OR l.plumber_id = ANY (ARRAY[:readerIds]::uuid[])
  OR l.department_id = ANY (ARRAY[:readerIds]::uuid[]))`;
