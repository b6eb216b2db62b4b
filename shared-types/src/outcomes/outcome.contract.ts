import { z } from 'zod';
import { expectedVersion, fieldWrite, id, instant, line, words } from '../common/fields.js';
import { pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';
import { systems } from '../holds/hold.states.js';
import { correctionStates, correctionSubjects, severities } from './correction.states.js';
import { noAccessReasons, notReadyReasons, outcomeKinds, systemAnswers } from './outcome.states.js';
import { visitSummary } from '../visits/visit.contract.js';

/** A point on the cutaway as fractions of its drawing, or the whole system. */
export const correctionPlace = z.union([
  z.strictObject({ x: z.number().min(0).max(1), y: z.number().min(0).max(1) }),
  z.literal('whole-system'),
]);

export const newCorrection = z.strictObject({
  clientId: id,
  unitNumber: z.number().int().min(1).max(12),
  subject: z.enum(correctionSubjects),
  /** The point of the work it was found at. */
  pointCode: z.string().max(40).nullable().optional(),
  text: words(1000),
  place: correctionPlace,
  floor: line(60).nullable().optional(),
  room: line(60).nullable().optional(),
  severity: z.enum(severities),
  section: line(40).nullable().optional(),
});
export type NewCorrection = z.infer<typeof newCorrection>;

export const correction = z.object({
  id,
  lotId: id,
  lotNumber: z.string(),
  tractName: z.string().nullable(),
  unitNumber: z.number().int(),
  stageCode: z.string(),
  visitId: id,
  /** Counted per lot. */
  number: z.number().int(),
  subject: z.enum(correctionSubjects),
  pointCode: z.string().nullable(),
  text: z.string(),
  place: correctionPlace,
  floor: z.string().nullable(),
  room: z.string().nullable(),
  severity: z.enum(severities),
  section: z.string().nullable(),
  state: z.enum(correctionStates),
  version: z.number().int(),
  openedAt: instant,
  openedBy: z.string(),
  fixedAt: instant.nullable(),
  fixedBy: z.string().nullable(),
  fixNote: z.string().nullable(),
  reopenedWhy: z.string().nullable(),
  acceptedAt: instant.nullable(),
  acceptedBy: z.string().nullable(),
  abilities: z.object({ canFix: z.boolean(), canDecide: z.boolean() }),
});
export type Correction = z.infer<typeof correction>;

const systemResult = z.strictObject({
  unitNumber: z.number().int().min(1).max(12),
  system: z.enum(systems),
  answer: z.enum(systemAnswers),
  /** What the needle did when the inspector opened the gauge valve. */
  needle: z.enum(['fell', 'stayed', 'jumped', 'was-open']).nullable().optional(),
  pressurePsi: z.number().min(0).max(1000).nullable().optional(),
  levelIn: z.number().min(0).max(1200).nullable().optional(),
  note: words(1000).nullable().optional(),
});

export const outcome = z.object({
  id,
  visitId: id,
  kind: z.enum(outcomeKinds),
  reason: z.string().nullable(),
  note: z.string().nullable(),
  at: instant,
  receivedAt: instant,
  byName: z.string(),
  systems: z.array(
    z.object({
      unitNumber: z.number().int(),
      system: z.enum(systems),
      answer: z.enum(systemAnswers),
      needle: z.string().nullable(),
      pressurePsi: z.number().nullable(),
      levelIn: z.number().nullable(),
      note: z.string().nullable(),
    }),
  ),
  work: z.array(
    z.object({
      pointCode: z.string(),
      label: z.object({ en: z.string(), es: z.string().optional() }),
      isLookedAt: z.boolean(),
    }),
  ),
});
export type Outcome = z.infer<typeof outcome>;

export const recordOutcome = route({
  method: 'POST',
  path: '/api/visits/:visitId/outcome',
  summary: 'Inspector: close the visit; corrections, acceptances and reopenings come in the same act',
  status: 200,
  params: z.object({ visitId: id }),
  body: z.strictObject({
    expectedVersion,
    ...fieldWrite,
    result: z.discriminatedUnion('kind', [
      z.strictObject({
        kind: z.literal('seen'),
        systems: z.array(systemResult).max(24),
        /** Codes of the points of the work that were looked at. */
        lookedAt: z.array(z.string().max(40)).max(40),
        corrections: z.array(newCorrection).max(60),
        accepted: z.array(id).max(60),
        reopened: z.array(z.strictObject({ correctionId: id, why: words(500) })).max(60),
      }),
      z.strictObject({ kind: z.literal('not-ready'), reason: z.enum(notReadyReasons) }),
      z.strictObject({ kind: z.literal('no-access'), reason: z.enum(noAccessReasons) }),
    ]),
    note: words(2000).nullable().optional(),
  }),
  answer: z.object({ visit: visitSummary, outcome, corrections: z.array(correction) }),
});

export const readOutcome = route({
  method: 'GET',
  path: '/api/visits/:visitId/outcome',
  summary: 'The outcome of a closed visit',
  status: 200,
  params: z.object({ visitId: id }),
  answer: outcome,
});

export const listCorrections = route({
  method: 'GET',
  path: '/api/corrections',
  summary: 'Corrections of the lots the reader may see',
  status: 200,
  query: z.object({
    ...pageQuery,
    state: z.enum(correctionStates).optional(),
    lotId: id.optional(),
    organizationId: id.optional(),
  }),
  answer: pageOf(correction),
});

const correctionParams = z.object({ correctionId: id });

export const fixCorrection = route({
  method: 'POST',
  path: '/api/corrections/:correctionId/fixed',
  summary: 'Plumber: fixed',
  status: 200,
  params: correctionParams,
  body: z.strictObject({ expectedVersion, ...fieldWrite, note: words(1000) }),
  answer: correction,
});

export const acceptCorrection = route({
  method: 'POST',
  path: '/api/corrections/:correctionId/accept',
  summary: 'Inspector of that department: accept the fix',
  status: 200,
  params: correctionParams,
  body: z.strictObject({ expectedVersion, ...fieldWrite }),
  answer: correction,
});

export const reopenCorrection = route({
  method: 'POST',
  path: '/api/corrections/:correctionId/reopen',
  summary: 'Inspector of that department: not fixed, with the reason',
  status: 200,
  params: correctionParams,
  body: z.strictObject({ expectedVersion, ...fieldWrite, why: words(500) }),
  answer: correction,
});
