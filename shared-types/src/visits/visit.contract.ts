import { z } from 'zod';
import { personBrief } from '../accounts/person.contract.js';
import { expectedVersion, fieldWrite, id, instant, line, localDate, words } from '../common/fields.js';
import { route } from '../common/route.js';
import { systems } from '../holds/hold.states.js';
import { readingFields } from '../holds/hold.contract.js';
import { outcomeKinds } from '../outcomes/outcome.states.js';
import { visitMoves, visitStates } from './visit.states.js';

export const visitWindow = z.object({ date: localDate, label: z.string(), startAt: instant, endAt: instant });
export type VisitWindow = z.infer<typeof visitWindow>;

export const withdrawReasons = ['weather', 'not-ready-in-time', 'plans-changed', 'asked-by-mistake', 'other'] as const;

export const visitSummary = z.object({
  id,
  lotId: id,
  lotNumber: z.string(),
  tractName: z.string().nullable(),
  address: z.string(),
  builderName: z.string(),
  plumberName: z.string().nullable(),
  departmentId: id,
  departmentName: z.string(),
  zone: z.string(),
  stageCode: z.string(),
  stageName: z.object({ en: z.string(), es: z.string().optional() }),
  ruleCardVersion: z.number().int(),
  unitNumbers: z.array(z.number().int()),
  state: z.enum(visitStates),
  version: z.number().int(),
  /** The window booked, or the one wished for while requested. */
  window: visitWindow,
  plannedStartAt: instant.nullable(),
  plannedEndAt: instant.nullable(),
  inspector: personBrief.nullable(),
  /** What stands of what is required. */
  systemsUp: z.array(z.object({ unitNumber: z.number().int(), system: z.enum(systems), isUp: z.boolean() })),
  upSince: instant.nullable(),
  /** When the tests must be up; null where the rule card sets no time. */
  upBy: instant.nullable(),
  outcome: z.object({ kind: z.enum(outcomeKinds), reason: z.string().nullable() }).nullable(),
  /** Why it was declined, withdrawn or freed. */
  endReason: z.string().nullable(),
  endNote: z.string().nullable(),
  openCorrections: z.number().int(),
  isRetest: z.boolean(),
  hasFirstPlace: z.boolean(),
  neededBy: instant.nullable(),
  note: z.string().nullable(),
  requestedAt: instant,
  /** The moves this reader may make now. */
  moves: z.array(z.enum(visitMoves)),
});
export type VisitSummary = z.infer<typeof visitSummary>;

const visitParams = z.object({ visitId: id });
const asked = { expectedVersion };

/** A day's window for requesting, with the reason where it cannot be taken. */
export const offeredWindow = visitWindow.extend({
  roomLeft: z.number().int(),
  isTakeable: z.boolean(),
  whyNot: z.enum(['past', 'cut-off-passed', 'beyond-horizon', 'closed', 'full', 'no-inspector']).nullable(),
});
export type OfferedWindow = z.infer<typeof offeredWindow>;

export const requestedLot = z.strictObject({
  lotId: id,
  unitNumbers: z.array(z.number().int().min(1).max(12)).min(1).max(12).optional(),
});

export const readOffers = route({
  method: 'POST',
  path: '/api/visits/offers',
  summary: 'The windows of the department for these lots and this stage; asks nothing, books nothing',
  status: 200,
  body: z.strictObject({ lots: z.array(requestedLot).min(1).max(50), stageCode: z.string().max(40) }),
  answer: z.object({
    departmentId: id,
    departmentName: z.string(),
    departmentPhone: z.string().nullable(),
    zone: z.string(),
    booking: z.enum(['self', 'desk']),
    ruleCardVersion: z.number().int(),
    lotsPerRequest: z.number().int(),
    /** The first day still open, and until when a request counts for it. */
    firstDate: localDate,
    lastDate: localDate,
    cutoffAt: instant,
    now: instant,
    upByFor: z.enum(['clock-time', 'hours-before']),
    windows: z.array(offeredWindow),
  }),
});

export const requestVisits = route({
  method: 'POST',
  path: '/api/visits',
  summary: 'Request one window for one or several lots; all of them or none',
  status: 201,
  body: z.strictObject({
    lots: z.array(requestedLot).min(1).max(50),
    stageCode: z.string().max(40),
    date: localDate,
    label: z.string().max(30),
    note: words(1000).optional(),
    neededBy: instant.optional(),
    /** Desk only: who asked by telephone. */
    callerName: line(120).optional(),
  }),
  answer: z.object({ visits: z.array(visitSummary) }),
});

export const readVisit = route({
  method: 'GET',
  path: '/api/visits/:visitId',
  summary: 'A visit',
  status: 200,
  params: visitParams,
  answer: visitSummary,
});

export const listLotVisits = route({
  method: 'GET',
  path: '/api/lots/:lotId/visits',
  summary: 'Every visit of a lot, newest first',
  status: 200,
  params: z.object({ lotId: id }),
  answer: z.object({ items: z.array(visitSummary) }),
});

export const listRequests = route({
  method: 'GET',
  path: '/api/departments/:departmentId/requests',
  summary: 'Desk: requests to place, those that keep first place before the others, oldest first',
  status: 200,
  params: z.object({ departmentId: id }),
  answer: z.object({ items: z.array(visitSummary) }),
});

export const placeVisit = route({
  method: 'POST',
  path: '/api/visits/:visitId/place',
  summary: 'Desk: place a request in a window, with an inspector or the first free one',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, date: localDate, label: z.string().max(30), inspectorId: id.optional() }),
  answer: visitSummary,
});

export const declineVisit = route({
  method: 'POST',
  path: '/api/visits/:visitId/decline',
  summary: 'Desk: decline a request, with the reason',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, reason: words(500) }),
  answer: visitSummary,
});

export const withdrawVisit = route({
  method: 'POST',
  path: '/api/visits/:visitId/withdraw',
  summary: 'Requesting side or desk: withdraw',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, reason: z.enum(withdrawReasons), note: words(500).optional() }),
  answer: visitSummary,
});

export const moveVisit = route({
  method: 'POST',
  path: '/api/visits/:visitId/move',
  summary: 'Requesting side or desk: another window; the calendar entry stays the same one',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, date: localDate, label: z.string().max(30), inspectorId: id.optional() }),
  answer: visitSummary,
});

export const sayTestUp = route({
  method: 'POST',
  path: '/api/visits/:visitId/test-up',
  summary: 'Plumber: the systems are standing for the booked window; readings may come in the same act',
  status: 200,
  params: visitParams,
  body: z.strictObject({
    ...asked,
    ...fieldWrite,
    readings: z
      .array(z.strictObject({ holdId: id, ...readingFields }))
      .max(24)
      .optional(),
  }),
  answer: visitSummary,
});

export const sayNoLongerUp = route({
  method: 'POST',
  path: '/api/visits/:visitId/no-longer-up',
  summary: 'Plumber, or the inspector who finds it so: the test is down again',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, ...fieldWrite, note: words(500).optional() }),
  answer: visitSummary,
});

export const beginVisit = route({
  method: 'POST',
  path: '/api/visits/:visitId/begin',
  summary: 'Inspector: I am here; before the window only when the test is up',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, ...fieldWrite, isTakingOver: z.boolean().optional() }),
  answer: visitSummary,
});

export const undoBegin = route({
  method: 'POST',
  path: '/api/visits/:visitId/undo-begin',
  summary: 'Inspector: take the start back, within a minute',
  status: 200,
  params: visitParams,
  body: z.strictObject(asked),
  answer: visitSummary,
});

export const setNotReached = route({
  method: 'POST',
  path: '/api/visits/:visitId/not-reached',
  summary: 'Desk: not reached; goes back to the requests, keeps first place, no fee',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, note: words(500).optional() }),
  answer: visitSummary,
});

export const freeVisit = route({
  method: 'POST',
  path: '/api/visits/:visitId/free',
  summary: 'Desk: the window cannot be kept (closure)',
  status: 200,
  params: visitParams,
  body: z.strictObject({ ...asked, reason: words(500) }),
  answer: visitSummary,
});
