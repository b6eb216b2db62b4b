import { z } from 'zod';
import { id } from '../common/fields.js';
import { route } from '../common/route.js';

/** Columns of the CSV; the first two are required. */
export const importColumns = [
  'number',
  'address',
  'latitude',
  'longitude',
  'permit_number',
  'permit_status',
  'permit_holder',
  'units',
  'zone',
  'gate_code',
  'contact_name',
  'contact_phone',
  'hazards',
] as const;

export const importFault = z.object({
  /** Line of the file, the head being 1; 0 for the file as a whole. */
  line: z.number().int(),
  column: z.string().nullable(),
  code: z.string(),
  value: z.string().nullable(),
  /** What was probably meant, where that can be told. */
  suggestion: z.string().nullable(),
});
export type ImportFault = z.infer<typeof importFault>;

export const importReport = z.object({
  isImported: z.boolean(),
  lots: z.number().int(),
  faults: z.array(importFault),
});
export type ImportReport = z.infer<typeof importReport>;

export const importLots = route({
  method: 'POST',
  path: '/api/lots/import',
  summary: 'Builder: add many lots from CSV; one fault and nothing is imported. With isTrial the report only',
  status: 200,
  body: z.strictObject({
    builderId: id,
    tractId: id.nullable().optional(),
    plumberId: id.nullable().optional(),
    departmentId: id.nullable().optional(),
    csv: z.string().min(1, 'required').max(2_000_000, 'too-long'),
    isTrial: z.boolean(),
  }),
  answer: importReport,
});
