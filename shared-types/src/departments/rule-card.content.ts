import { z } from 'zod';
import { clockTime, line, localDate } from '../common/fields.js';
import { media, methods, systems } from '../holds/hold.states.js';
import { severities } from '../outcomes/correction.states.js';

/** Words of the department itself; Spanish where it has them. */
const ownWords = z.strictObject({ en: line(300), es: line(300).optional() });
const code = z.string().regex(/^[a-z0-9][a-z0-9-]{0,39}$/, 'not-a-code');

/** A point of the build that is tested and inspected, named and ordered by the department. */
export const stage = z.strictObject({
  code,
  name: ownWords,
  /** The department's own inspection code, such as 210. */
  inspectionCode: z.string().max(20),
  order: z.number().int().min(1).max(20),
  systems: z.array(z.enum(systems)).max(2),
  /** What it lets cover. */
  covers: z.enum(['slab', 'wall']).nullable(),
  minutesPerVisit: z.number().int().min(5).max(240),
  /** The work: points to look at. */
  work: z.array(z.strictObject({ code, label: ownWords })).max(40),
});
export type Stage = z.infer<typeof stage>;

const headRule = z.strictObject({
  kind: z.enum(['above-highest-fitting', 'fill-level']),
  feet: z.number().min(0).max(100).nullable(),
});

const pressure = z.strictObject({
  medium: z.enum(media),
  minimumPsi: z.number().positive('must-be-positive').max(1000),
  preferredPsi: z.number().positive('must-be-positive').max(1000).nullable(),
});

/** What the department asks where a test is made with air, besides the pressure. */
const airRules = z.strictObject({
  /** Null: no highest pressure of its own. */
  highestPsi: z.number().positive('must-be-positive').max(1000).nullable(),
  needsMakersConsent: z.boolean(),
  needsReliefValve: z.boolean(),
});

/** How one system is tested at one stage. */
export const testRule = z.strictObject({
  stageCode: code,
  system: z.enum(systems),
  acceptedMethods: z.array(z.enum(methods)).min(1, 'no-accepted-method').max(8),
  headRule: headRule.nullable(),
  /** Per medium; empty for DWV with water. */
  pressures: z.array(pressure).max(3),
  measuredAt: z.enum(['gauge', 'highest-outlet']),
  /** Minutes to stand; null: until seen. */
  standMinutes: z.number().int().min(1).max(2880).nullable(),
  airOnPlastic: z.boolean(),
  /** Absent from versions written before there were any: no further rule. */
  airRules: airRules.optional(),
  settleMinutes: z.number().int().min(0).max(600),
  gaugeIncrements: z
    .array(
      z.union([
        z.strictObject({
          upToPsi: z.number().positive('must-be-positive'),
          incrementPsi: z.number().positive('must-be-positive'),
        }),
        z.strictObject({ percent: z.number().positive('must-be-positive') }),
      ]),
    )
    .max(10),
  mayStayIsolated: z.array(ownWords).max(20),
  levelSeenFrom: z.array(z.enum(['sight-tube', 'overflow', 'photo-with-tape'])).max(3),
  photoWanted: z.strictObject({ reading: z.boolean(), fix: z.boolean(), takeDown: z.boolean() }),
});
export type TestRule = z.infer<typeof testRule>;

export const askingWindow = z
  .strictObject({
    label: z.string().trim().min(1).max(30),
    start: clockTime,
    end: clockTime,
    /** ISO weekdays; empty: every working day. */
    days: z.array(z.number().int().min(1).max(7)).max(7),
    /** How many visits it takes. */
    room: z.number().int().min(1).max(500),
  })
  .refine((window) => window.end > window.start, { message: 'ends-before-it-starts', path: ['end'] });

export const asking = z.strictObject({
  windows: z.array(askingWindow).min(1, 'no-window').max(20),
  workingDays: z.array(z.number().int().min(1).max(7)).min(1).max(7),
  holidays: z.strictObject({
    federal: z.boolean(),
    adds: z.array(localDate).max(60),
    drops: z.array(localDate).max(60),
  }),
  cutoff: clockTime,
  workingDaysAhead: z.number().int().min(0).max(60),
  horizonWorkingDays: z.number().int().min(1).max(260),
  lotsPerRequest: z.number().int().min(1).max(50),
  whoMayRequest: z.array(z.enum(['superintendent', 'plumber'])).min(1),
  /** `self`: a request books at once; `desk`: it waits for the desk to place it. */
  booking: z.enum(['self', 'desk']),
  isPermitNeeded: z.boolean(),
  /** Labels of the windows open to re-inspections; null: all. */
  reinspectionWindows: z.array(z.string()).nullable(),
});

export const readiness = z.strictObject({
  upBy: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('clock-time'), time: clockTime }),
    z.strictObject({ kind: z.literal('hours-before'), hours: z.number().min(0).max(72) }),
  ]),
  reminderHoursBefore: z.array(z.number().positive().max(72)).max(6),
  whenNotUp: z.enum(['goes-to-standby', 'stays']),
  isExtensionAllowed: z.boolean(),
  standbyOfferMinutes: z.number().int().min(5).max(1440),
});

export const feeEvents = ['re-inspection', 'not-ready', 'no-access', 'late-withdrawal'] as const;
export const fee = z.strictObject({
  event: z.enum(feeEvents),
  firstFree: z.number().int().min(0).max(10),
  cents: z.number().int().min(0).max(10_000_000),
  payer: z.enum(['builder', 'plumber']),
  isPaidBeforeNext: z.boolean(),
});

export const correctionRules = z.strictObject({
  frequent: z.array(z.strictObject({ code, label: ownWords, section: z.string().max(40).nullable() })).max(60),
  sections: z.array(z.strictObject({ section: z.string().max(40), says: ownWords })).max(200),
  /** Severities the inspector may accept from a photo alone. */
  acceptFromPhoto: z.array(z.enum(severities)),
});

/**
 * What one department requires, one version. Everything here is the department's to decide; model codes only offer defaults, so each value
 * may name where it comes from (`sources`, keyed by path; absent: local).
 */
export const ruleCardContent = z
  .strictObject({
    stages: z.array(stage).min(1, 'no-stage').max(12),
    tests: z.array(testRule).max(40),
    asking,
    readiness,
    fees: z.array(fee).max(12),
    corrections: correctionRules,
    weather: z.strictObject({ isFeeFree: z.boolean(), latestHoursBefore: z.number().min(0).max(72) }),
    lateness: z.strictObject({ minutesBeforeLate: z.number().int().min(0).max(240) }),
    sources: z.record(z.string(), z.strictObject({ from: z.string().max(80), section: z.string().max(80) })),
  })
  .superRefine((content, ctx) => {
    content.stages.forEach((each, s) => {
      each.systems.forEach((system) => {
        if (!content.tests.some((rule) => rule.stageCode === each.code && rule.system === system)) {
          ctx.addIssue({ code: 'custom', message: 'no-test-for-system', path: ['stages', s, 'systems'] });
        }
      });
      if (content.stages.findIndex((other) => other.code === each.code) !== s) {
        ctx.addIssue({ code: 'custom', message: 'named-twice', path: ['stages', s, 'code'] });
      }
    });
    const labels = content.asking.windows.map((window) => window.label);
    labels.forEach((label, w) => {
      if (labels.indexOf(label) !== w)
        ctx.addIssue({ code: 'custom', message: 'named-twice', path: ['asking', 'windows', w, 'label'] });
    });
  });
export type RuleCardContent = z.infer<typeof ruleCardContent>;
