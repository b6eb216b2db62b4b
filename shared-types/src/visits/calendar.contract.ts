import { z } from 'zod';
import { id, instant, localDate } from '../common/fields.js';
import { route } from '../common/route.js';
import { visitSummary, visitWindow } from './visit.contract.js';

export const calendarWindow = visitWindow.extend({
  room: z.number().int(),
  roomLeft: z.number().int(),
  /** Of the booked ones, how many have their tests up. Null to all but the department. */
  up: z.number().int().nullable(),
  isTakeable: z.boolean(),
  /**
   * Until when it can be asked for: the department's cut-off, or the window's own start where that is earlier. The department itself is
   * not bound by it. Null where no rule card is in force today.
   */
  cutoffAt: instant.nullable(),
});

export const calendarDay = z.object({
  date: localDate,
  isWorkingDay: z.boolean(),
  /** Spans closed for a reason; a whole day has none of from and to. */
  closed: z.array(z.object({ from: instant.nullable(), to: instant.nullable(), why: z.string() })),
  windows: z.array(calendarWindow),
});

export const calendarLane = z.object({
  departmentId: id,
  name: z.string(),
  zone: z.string(),
  isOwn: z.boolean(),
  ruleCardVersion: z.number().int().nullable(),
  days: z.array(calendarDay),
});

export const readCalendar = route({
  method: 'GET',
  path: '/api/calendar',
  summary: 'Days, windows and visits from one date to another, of the departments the reader has to do with',
  status: 200,
  query: z.object({ from: localDate, to: localDate, organizationId: id.optional() }),
  answer: z.object({
    now: instant,
    zone: z.string(),
    today: localDate,
    lanes: z.array(calendarLane),
    visits: z.array(visitSummary),
  }),
});

/** What a person has to do, or waits for another to do. */
export const waitingKinds = [
  'no-window',
  'test-not-up',
  'correction-to-fix',
  'correction-to-accept',
  'request-to-place',
  'consent-to-answer',
  'visit-underway',
] as const;
export const waitingItem = z.object({
  kind: z.enum(waitingKinds),
  isOnYou: z.boolean(),
  /** The person or organization it waits on, by name. */
  waitsOn: z.string(),
  lotId: id.nullable(),
  lotNumber: z.string().nullable(),
  tractName: z.string().nullable(),
  visitId: id.nullable(),
  count: z.number().int(),
  by: instant.nullable(),
  zone: z.string().nullable(),
  isPastTime: z.boolean(),
});
export type WaitingItem = z.infer<typeof waitingItem>;

export const readWaiting = route({
  method: 'GET',
  path: '/api/waiting',
  summary: 'What waits on the reader first, then what waits on others, by time',
  status: 200,
  query: z.object({ organizationId: id.optional() }),
  answer: z.object({ items: z.array(waitingItem) }),
});

export const runStop = z.object({
  visit: visitSummary,
  order: z.number().int(),
  access: z
    .object({
      gateCode: z.string().nullable(),
      contactName: z.string().nullable(),
      contactPhone: z.string().nullable(),
      hazards: z.string().nullable(),
    })
    .nullable(),
  latitude: z.number().nullable(),
  longitude: z.number().nullable(),
  /** What the rule card asks of each system, for the inspector: a minimum, never the forecast. */
  asks: z.array(
    z.object({
      unitNumber: z.number().int(),
      system: z.enum(['dwv', 'water']),
      method: z.string().nullable(),
      minimumPsi: z.number().nullable(),
      levelFt: z.number().nullable(),
    }),
  ),
});

export const readRun = route({
  method: 'GET',
  path: '/api/runs',
  summary: 'An inspector’s visits of one day, in order; the own run, or for the desk any of the department',
  status: 200,
  query: z.object({ date: localDate.optional(), inspectorId: id.optional(), departmentId: id.optional() }),
  answer: z.object({
    date: localDate,
    now: instant,
    zone: z.string(),
    inspector: z.object({ id, name: z.string() }),
    stops: z.array(runStop),
  }),
});

export const readDayBoard = route({
  method: 'GET',
  path: '/api/departments/:departmentId/day',
  summary: 'Desk: every inspector’s visits of one day, and the requests that want it',
  status: 200,
  params: z.object({ departmentId: id }),
  query: z.object({ date: localDate }),
  answer: z.object({
    date: localDate,
    now: instant,
    zone: z.string(),
    day: calendarDay,
    inspectors: z.array(
      z.object({ id, name: z.string(), phone: z.string().nullable(), visits: z.array(visitSummary) }),
    ),
    requests: z.array(visitSummary),
  }),
});
