import { z } from 'zod';
import { fieldWrite, id, instant, words } from '../common/fields.js';
import { route } from '../common/route.js';
import { gaugeValves, holdEndReasons, holdStates, media, methods, systems } from './hold.states.js';

/** A pressure gauge, or for DWV a tape: the smallest mark on it. */
export const gauge = z.strictObject({
  rangePsi: z.number().positive().max(1000),
  incrementPsi: z.number().positive().max(50),
});
export const tape = z.strictObject({ incrementIn: z.number().positive().max(12) });

/**
 * One reading as typed: pressure in psi, or for DWV the water level in inches below the rim. With the gauge valve shut it tells of the
 * gauge and its hose only.
 */
export const readingFields = {
  ...fieldWrite,
  pressurePsi: z.number().min(0).max(1000).nullable().optional(),
  levelIn: z.number().min(0).max(1200).nullable().optional(),
  temperatureF: z.number().min(-60).max(160).nullable().optional(),
  gaugeValve: z.enum(gaugeValves).nullable().optional(),
  note: words(500).nullable().optional(),
};

export const reading = z.object({
  id,
  at: instant,
  receivedAt: instant,
  pressurePsi: z.number().nullable(),
  levelIn: z.number().nullable(),
  temperatureF: z.number().nullable(),
  gaugeValve: z.enum(gaugeValves).nullable(),
  note: z.string().nullable(),
  byName: z.string(),
  byRole: z.enum(['plumber', 'helper', 'superintendent', 'inspector']),
  isStruck: z.boolean(),
  struckWhy: z.string().nullable(),
});
export type Reading = z.infer<typeof reading>;

export const hold = z.object({
  id,
  lotId: id,
  unitNumber: z.number().int(),
  stageCode: z.string(),
  system: z.enum(systems),
  /** 1 for the first test of this unit, stage and system, 2 for the re-test. */
  ordinal: z.number().int(),
  /** The plan it was started by. */
  planId: id.nullable().optional(),
  method: z.enum(methods),
  medium: z.enum(media),
  gauge: gauge.nullable(),
  tape: tape.nullable(),
  fillLevelFt: z.number().nullable(),
  ceilingPsi: z.number().nullable(),
  minimumPsi: z.number().nullable(),
  settleMinutes: z.number().int(),
  state: z.enum(holdStates),
  startedAt: instant,
  endedAt: instant.nullable(),
  endReason: z.enum(holdEndReasons).nullable(),
  readings: z.array(reading),
});
export type Hold = z.infer<typeof hold>;

export const listHolds = route({
  method: 'GET',
  path: '/api/lots/:lotId/holds',
  summary: 'The tests of a lot with their readings, newest first',
  status: 200,
  params: z.object({ lotId: id }),
  answer: z.object({ items: z.array(hold) }),
});

export const startHold = route({
  method: 'POST',
  path: '/api/lots/:lotId/holds',
  summary:
    'Plumber: start a test with its first reading; an earlier one still standing is superseded only when asked for',
  status: 201,
  params: z.object({ lotId: id }),
  body: z.strictObject({
    ...fieldWrite,
    unitNumber: z.number().int().min(1).max(12),
    stageCode: z.string().max(40),
    system: z.enum(systems),
    method: z.enum(methods),
    medium: z.enum(media),
    gauge: gauge.nullable().optional(),
    tape: tape.nullable().optional(),
    /** DWV: feet above the finished first floor that the water stands at. */
    fillLevelFt: z.number().min(-40).max(300).nullable().optional(),
    /** The lowest-rated part, at the gauge. */
    ceilingPsi: z.number().positive().max(1000).nullable().optional(),
    /** The plan it goes by: what is left out here is taken from it. Without one the current plan of the same way is meant. */
    planId: id.nullable().optional(),
    isSuperseding: z.boolean().optional(),
    firstReading: z.strictObject(readingFields),
  }),
  answer: hold,
});

export const addReading = route({
  method: 'POST',
  path: '/api/holds/:holdId/readings',
  summary: 'Add a reading; a superintendent’s is marked as theirs. It is never edited',
  status: 201,
  params: z.object({ holdId: id }),
  body: z.strictObject(readingFields),
  answer: hold,
});

export const strikeReading = route({
  method: 'POST',
  path: '/api/readings/:readingId/strike',
  summary: 'Strike a reading with a reason; it is kept and shown struck',
  status: 200,
  params: z.object({ readingId: id }),
  body: z.strictObject({ why: words(300) }),
  answer: hold,
});

export const endHold = route({
  method: 'POST',
  path: '/api/holds/:holdId/end',
  summary: 'Plumber: end a test with its reason',
  status: 200,
  params: z.object({ holdId: id }),
  body: z.strictObject({ ...fieldWrite, reason: z.enum(['taken-down', 'lost']), note: words(500).optional() }),
  answer: hold,
});
