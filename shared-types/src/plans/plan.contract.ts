import { z } from 'zod';
import { fieldWrite, id, instant } from '../common/fields.js';
import { route } from '../common/route.js';
import { media, methods, systems } from '../holds/hold.states.js';
import { dwvPlan } from '../hydraulics/dwv-plan.contract.js';
import { reason } from '../hydraulics/findings.js';
import { houseGeometry } from '../hydraulics/house-geometry.js';
import { waterPlan } from '../hydraulics/water-plan.contract.js';
import { planTools } from './plan-tools.js';

/** Which part of a lot a plan is for. */
const part = {
  unitNumber: z.number().int().min(1).max(12),
  stageCode: z.string().max(40),
  system: z.enum(systems),
};
const tools = planTools.prefault({});

/** One way to put the system under test, with its whole plan; `dwv` or `water`, null where a measure it needs is missing. */
export const planWay = z.object({
  method: z.enum(methods),
  medium: z.enum(media),
  isAccepted: z.boolean(),
  /** Accepted, worked out and usable: it may be chosen. */
  isOffered: z.boolean(),
  /** Why it is not offered. */
  reasons: z.array(reason),
  /** Fields of the house (or of the tools) that are absent or contradict, with their codes. */
  missing: z.array(z.object({ field: z.string(), code: z.string() })),
  dwv: dwvPlan.nullable(),
  water: waterPlan.nullable(),
});
export type PlanWay = z.infer<typeof planWay>;

const ruleCardNamed = z.object({ id, version: z.number().int() });

/** Why a plan no longer tells of what is there. */
export const staleReasons = ['geometry-changed', 'rule-card-changed'] as const;
export type StaleReason = (typeof staleReasons)[number];

/** The method chosen for a unit, stage and system, with everything worked out then, as it was told then. */
export const testPlan = z.object({
  id,
  lotId: id,
  ...part,
  method: z.enum(methods),
  medium: z.enum(media),
  tools: planTools,
  ruleCard: ruleCardNamed,
  /** The house it was worked out for. */
  geometry: houseGeometry,
  isGroundwork: z.boolean(),
  dwv: dwvPlan.nullable(),
  water: waterPlan.nullable(),
  chosenBy: z.string(),
  chosenAt: instant,
  receivedAt: instant,
  /** At most one of a unit, stage and system is. */
  isCurrent: z.boolean(),
  supersededAt: instant.nullable(),
  /** Of the current one: what has changed since; empty while it holds good. */
  stale: z.array(z.enum(staleReasons)),
});
export type TestPlan = z.infer<typeof testPlan>;

const lotParams = z.object({ lotId: id });

export const readPlanOffers = route({
  method: 'POST',
  path: '/api/lots/:lotId/plan-offers',
  summary: 'The ways to test a unit at a stage, each worked out, and why the others do not serve; keeps nothing',
  status: 200,
  params: lotParams,
  body: z.strictObject({ ...part, tools }),
  answer: z.object({
    ruleCard: ruleCardNamed,
    isGroundwork: z.boolean(),
    /** Without a house there is nothing to work out: no ways. */
    hasHouse: z.boolean(),
    ways: z.array(planWay),
  }),
});

export const choosePlan = route({
  method: 'POST',
  path: '/api/lots/:lotId/plans',
  summary: 'Plumber: choose the method; the plan before it is kept as superseded',
  status: 201,
  params: lotParams,
  body: z.strictObject({ ...fieldWrite, ...part, method: z.enum(methods), medium: z.enum(media), tools }),
  answer: testPlan,
});

export const listPlans = route({
  method: 'GET',
  path: '/api/lots/:lotId/plans',
  summary: 'The current plan of every unit, stage and system of a lot',
  status: 200,
  params: lotParams,
  answer: z.object({ items: z.array(testPlan) }),
});

export const listPlanHistory = route({
  method: 'GET',
  path: '/api/lots/:lotId/plans/history',
  summary: 'Every plan of a unit, stage and system, the newest first',
  status: 200,
  params: lotParams,
  query: z.object({
    unitNumber: z.coerce.number().int().min(1).max(12),
    stageCode: z.string().max(40),
    system: z.enum(systems),
  }),
  answer: z.object({ items: z.array(testPlan) }),
});

export const readPlan = route({
  method: 'GET',
  path: '/api/plans/:planId',
  summary: 'A test plan, current or not',
  status: 200,
  params: z.object({ planId: id }),
  answer: testPlan,
});
