import { z } from 'zod';
import { clearStates } from '../clearances/clearance.rules.js';
import { id, instant, latitude, line, localDate, longitude, phone, words } from '../common/fields.js';
import { done, pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';
import { organizationBrief, personBrief } from '../accounts/person.contract.js';
import { houseGeometry } from '../hydraulics/house-geometry.js';
import { systems } from '../holds/hold.states.js';
import { houseOrigin } from './house-origin.js';
import { houseToSave } from './house.rules.js';
import { visitStates } from '../visits/visit.states.js';

export const permitStatuses = ['not-applied', 'applied', 'issued', 'expired'] as const;
export const permit = z.strictObject({
  number: z.string().trim().max(60).nullable(),
  status: z.enum(permitStatuses),
  /** Who holds it: often the plumber, at times the builder. */
  holder: z.string().trim().max(120).nullable(),
});

/** Shown to the builder, the plumber and that day's inspector only. */
export const lotAccess = z.strictObject({
  gateCode: z.string().trim().max(40).nullable(),
  contactName: z.string().trim().max(120).nullable(),
  contactPhone: phone.nullable(),
  hazards: z.string().trim().max(1000).nullable(),
});
export type LotAccess = z.infer<typeof lotAccess>;

export const partyKinds = ['builder', 'plumber', 'department'] as const;
/** Parties that another may take the place of. */
export const handoverKinds = ['builder', 'plumber'] as const;
export type HandoverKind = (typeof handoverKinds)[number];
export const partyStatuses = ['pending', 'attached', 'refused'] as const;
export const party = z.object({
  kind: z.enum(partyKinds),
  organization: organizationBrief,
  status: z.enum(partyStatuses),
  /** Whom to talk to there: the superintendents, plumbers or inspectors. */
  people: z.array(personBrief),
});

export const lotStage = z.object({
  code: z.string(),
  name: z.object({ en: z.string(), es: z.string().optional() }),
  order: z.number().int(),
  systems: z.array(z.enum(systems)),
  state: z.enum(clearStates),
  units: z.array(z.object({ unitNumber: z.number().int(), state: z.enum(clearStates) })),
});
export type LotStage = z.infer<typeof lotStage>;

export const lotUnit = z.object({
  number: z.number().int(),
  label: z.string(),
  geometry: houseGeometry.nullable(),
  /** The builder's house model it was taken from; null for a house measured on its own. */
  model: houseOrigin.nullish(),
});
export type LotUnit = z.infer<typeof lotUnit>;

export const nextVisit = z.object({
  id,
  state: z.enum(visitStates),
  startAt: instant,
  endAt: instant,
  zone: z.string(),
});

export const lotSummary = z.object({
  id,
  number: z.string(),
  tract: z.object({ id, name: z.string() }).nullable(),
  address: z.string(),
  permitNumber: z.string().nullable(),
  builderName: z.string(),
  plumberName: z.string().nullable(),
  departmentName: z.string().nullable(),
  departmentId: id.nullable(),
  stages: z.array(lotStage),
  /** The first stage, in the department's order, that is not clear; null when all are or no department is attached. */
  currentStage: z.string().nullable(),
  nextVisit: nextVisit.nullable(),
  openCorrections: z.number().int(),
});
export type LotSummary = z.infer<typeof lotSummary>;

export const lotAbilities = z.object({
  canEdit: z.boolean(),
  canEditGeometry: z.boolean(),
  canSetPermit: z.boolean(),
  canAttach: z.boolean(),
  canRequest: z.boolean(),
  canTest: z.boolean(),
  canAddReading: z.boolean(),
  canSayTestUp: z.boolean(),
  canFix: z.boolean(),
  canDecide: z.boolean(),
  canComment: z.boolean(),
});
export type LotAbilities = z.infer<typeof lotAbilities>;

export const lotDetail = lotSummary.extend({
  latitude: latitude.nullable(),
  longitude: longitude.nullable(),
  zone: z.string().nullable(),
  permit,
  mayPlumberRequest: z.boolean(),
  coverDate: localDate.nullable(),
  units: z.array(lotUnit),
  /** Null where the reader may not see it. */
  access: lotAccess.nullable(),
  parties: z.array(party),
  /** Who is asked to take the place of a party and has not answered. */
  handovers: z.array(z.object({ kind: z.enum(handoverKinds), organization: organizationBrief })),
  ruleCard: z.object({ id, version: z.number().int(), effectiveFrom: localDate.nullable() }).nullable(),
  abilities: lotAbilities,
});
export type LotDetail = z.infer<typeof lotDetail>;

const lotParams = z.object({ lotId: id });
const lotFields = {
  number: line(20),
  address: line(200),
  latitude: latitude.nullable().optional(),
  longitude: longitude.nullable().optional(),
  permit: permit.optional(),
  mayPlumberRequest: z.boolean().optional(),
  coverDate: localDate.nullable().optional(),
};

export const listLots = route({
  method: 'GET',
  path: '/api/lots',
  summary: 'The lots the reader may see',
  status: 200,
  query: z.object({
    ...pageQuery,
    tractId: id.optional(),
    organizationId: id.optional(),
    /** Plumbing state of `stage` (or of the current stage). */
    state: z.enum(clearStates).optional(),
    stage: z.string().max(40).optional(),
  }),
  answer: pageOf(lotSummary),
});

export const searchLots = route({
  method: 'GET',
  path: '/api/search',
  summary: 'Find by lot number, permit or address among the lots the reader may see',
  status: 200,
  query: z.object({ q: z.string().trim().min(1).max(100) }),
  answer: z.object({
    items: z.array(
      z.object({
        id,
        number: z.string(),
        tractName: z.string().nullable(),
        address: z.string(),
        permitNumber: z.string().nullable(),
      }),
    ),
  }),
});

export const createLot = route({
  method: 'POST',
  path: '/api/lots',
  summary: 'Builder: add a lot; the plumber and the department named are asked for their consent',
  status: 201,
  body: z.strictObject({
    builderId: id,
    tractId: id.nullable().optional(),
    ...lotFields,
    units: z
      .array(z.strictObject({ label: line(40) }))
      .min(1)
      .max(12)
      .optional(),
    access: lotAccess.optional(),
    plumberId: id.nullable().optional(),
    departmentId: id.nullable().optional(),
  }),
  answer: lotDetail,
});

export const readLot = route({
  method: 'GET',
  path: '/api/lots/:lotId',
  summary: 'A lot',
  status: 200,
  params: lotParams,
  answer: lotDetail,
});

export const updateLot = route({
  method: 'PATCH',
  path: '/api/lots/:lotId',
  summary: 'Change a lot; the desk may set the permit only',
  status: 200,
  params: lotParams,
  body: z.strictObject({
    number: lotFields.number.optional(),
    address: lotFields.address.optional(),
    latitude: lotFields.latitude,
    longitude: lotFields.longitude,
    permit: lotFields.permit,
    mayPlumberRequest: lotFields.mayPlumberRequest,
    coverDate: lotFields.coverDate,
    access: lotAccess.optional(),
  }),
  answer: lotDetail,
});

export const setGeometry = route({
  method: 'PUT',
  path: '/api/lots/:lotId/units/:unitNumber/geometry',
  summary: 'Builder or plumber: the house as it will be tested',
  status: 200,
  params: z.object({ lotId: id, unitNumber: z.coerce.number().int().min(1).max(12) }),
  body: z.strictObject({ geometry: houseToSave }),
  answer: lotDetail,
});

export const attachParty = route({
  method: 'POST',
  path: '/api/lots/:lotId/parties',
  summary: 'Builder: ask a plumber or a department to join the lot',
  status: 200,
  params: lotParams,
  body: z.strictObject({ kind: z.enum(['plumber', 'department']), organizationId: id }),
  answer: lotDetail,
});

/** A test that stands on a lot to be handed over: what whoever takes it over decides by. */
export const testToTakeOver = z.object({
  holdId: id,
  unitNumber: z.number().int(),
  stageName: z.object({ en: z.string(), es: z.string().optional() }).nullable(),
  system: z.enum(systems),
  ordinal: z.number().int(),
  /** DWV under water: read as a level with a tape; everything else at a gauge. */
  isLevel: z.boolean(),
  lastPsi: z.number().nullable(),
  lastLevelIn: z.number().nullable(),
});
export type TestToTakeOver = z.infer<typeof testToTakeOver>;

export const consentRequest = z.object({
  lotId: id,
  lotNumber: z.string(),
  tractName: z.string().nullable(),
  address: z.string(),
  builderName: z.string(),
  kind: z.enum(partyKinds),
  organization: organizationBrief,
  askedAt: instant,
  /** Set where they would take the place of another; answered by `answerHandover`. */
  handover: z.object({ replacesName: z.string(), tests: z.array(testToTakeOver) }).nullable(),
});
export type ConsentRequest = z.infer<typeof consentRequest>;

export const listConsents = route({
  method: 'GET',
  path: '/api/consents',
  summary: 'Lots that ask an organization of the reader to join',
  status: 200,
  answer: z.object({ items: z.array(consentRequest) }),
});

export const answerConsents = route({
  method: 'POST',
  path: '/api/consents',
  summary: 'Join lots or refuse to, several at once',
  status: 200,
  body: z.strictObject({
    organizationId: id,
    lotIds: z.array(id).min(1).max(200),
    isJoining: z.boolean(),
    why: words(500).optional(),
  }),
  answer: done,
});
