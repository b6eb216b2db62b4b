import { z } from 'zod';
import { clockTime, id, instant, line, localDate } from '../common/fields.js';
import { done } from '../common/paging.js';
import { route } from '../common/route.js';
import { systems } from '../holds/hold.states.js';
import { ruleCardContent } from './rule-card.content.js';

export const ruleCardStates = ['draft', 'published'] as const;

export const ruleCardBrief = z.object({
  id,
  departmentId: id,
  version: z.number().int(),
  state: z.enum(ruleCardStates),
  /** First day it is in force; null for a draft that has none yet. */
  effectiveFrom: localDate.nullable(),
  /** Last day it is in force; null: until replaced. */
  effectiveTo: localDate.nullable(),
  isInForce: z.boolean(),
});
export type RuleCardBrief = z.infer<typeof ruleCardBrief>;

export const ruleCard = ruleCardBrief.extend({
  departmentName: z.string(),
  zone: z.string(),
  content: ruleCardContent,
  publishedAt: instant.nullable(),
  /** Who changed it last, told to its department only. */
  edited: z.object({ by: z.string(), at: instant }).nullish(),
});
export type RuleCard = z.infer<typeof ruleCard>;

export const closure = z.object({
  id,
  date: localDate,
  from: clockTime.nullable(),
  to: clockTime.nullable(),
  why: z.string(),
});
export type Closure = z.infer<typeof closure>;

export const department = z.object({
  id,
  name: z.string(),
  phone: z.string().nullable(),
  zone: z.string(),
  elevationFt: z.number(),
  /** An outside department is not on Holdwater: what it says is logged as reported. */
  isOutside: z.boolean(),
  ruleCard: ruleCardBrief.nullable(),
});
export type Department = z.infer<typeof department>;

const departmentAbilities = z.object({ canEditRuleCards: z.boolean(), canClose: z.boolean() });

export const listDepartments = route({
  method: 'GET',
  path: '/api/departments',
  summary: 'Every department with the rule card in force',
  status: 200,
  answer: z.object({ items: z.array(department) }),
});

export const readDepartment = route({
  method: 'GET',
  path: '/api/departments/:departmentId',
  summary: 'A department, its rule cards and closures',
  status: 200,
  params: z.object({ departmentId: id }),
  answer: z.object({
    department,
    ruleCards: z.array(ruleCardBrief),
    closures: z.array(closure),
    abilities: departmentAbilities,
  }),
});

export const readRuleCard = route({
  method: 'GET',
  path: '/api/rule-cards/:ruleCardId',
  summary: 'One version of a rule card; drafts only to the department',
  status: 200,
  params: z.object({ ruleCardId: id }),
  answer: ruleCard,
});

export const listPublicRuleCards = route({
  method: 'GET',
  path: '/api/public/rule-cards',
  summary: 'The rule cards in force, for anyone',
  status: 200,
  answer: z.object({ items: z.array(department) }),
});

export const readPublicRuleCard = route({
  method: 'GET',
  path: '/api/public/rule-cards/:ruleCardId',
  summary: 'A published rule card, for anyone',
  status: 200,
  params: z.object({ ruleCardId: id }),
  answer: ruleCard,
});

export const draftRuleCard = route({
  method: 'POST',
  path: '/api/departments/:departmentId/rule-cards',
  summary: 'Desk: start a draft from the newest version',
  status: 201,
  params: z.object({ departmentId: id }),
  body: z.strictObject({}),
  answer: ruleCard,
});

export const editRuleCard = route({
  method: 'PUT',
  path: '/api/rule-cards/:ruleCardId',
  summary: 'Desk: replace the content of a draft',
  status: 200,
  params: z.object({ ruleCardId: id }),
  body: z.strictObject({ content: ruleCardContent }),
  answer: ruleCard,
});

export const publishRuleCard = route({
  method: 'POST',
  path: '/api/rule-cards/:ruleCardId/publish',
  summary: 'Desk: publish a draft from a day on; it is never edited again and ends the version before',
  status: 200,
  params: z.object({ ruleCardId: id }),
  body: z.strictObject({ effectiveFrom: localDate }),
  answer: ruleCard,
});

export const deleteRuleCardDraft = route({
  method: 'DELETE',
  path: '/api/rule-cards/:ruleCardId',
  summary: 'Desk: throw a draft away; a published version stays for good',
  status: 200,
  params: z.object({ ruleCardId: id }),
  answer: done,
});

/** What of a test plan a version does not take any more. */
export const unfitReasons = ['method', 'medium', 'pressure', 'level'] as const;

export const ruleCardTouches = z.object({
  /** Open visits keep the version they were booked or requested under. */
  keptVisits: z.object({ booked: z.number().int(), requested: z.number().int(), versions: z.array(z.number().int()) }),
  /** Lots of the department without an open visit: their next one is planned on the new version. */
  lotsWithoutVisit: z.number().int(),
  /** Who is told when it is published: those with an open visit, and the department itself. */
  told: z.array(z.object({ organizationId: id, name: z.string(), people: z.number().int() })),
  /** Test plans of lots without an open visit at their stage that the new version does not take. */
  unfitPlans: z.array(
    z.object({
      lotId: id,
      lotNumber: z.string(),
      tractName: z.string().nullable(),
      stageCode: z.string(),
      system: z.enum(systems),
      reason: z.enum(unfitReasons),
    }),
  ),
});
export type RuleCardTouches = z.infer<typeof ruleCardTouches>;

export const readRuleCardTouches = route({
  method: 'GET',
  path: '/api/rule-cards/:ruleCardId/touches',
  summary: 'Department: what a draft will touch once it is in force, and who is told',
  status: 200,
  params: z.object({ ruleCardId: id }),
  answer: ruleCardTouches,
});

export const addClosure = route({
  method: 'POST',
  path: '/api/departments/:departmentId/closures',
  summary: 'Desk: close a day or a span of it; open visits inside it are freed',
  status: 201,
  params: z.object({ departmentId: id }),
  body: z
    .strictObject({ date: localDate, from: clockTime.nullable(), to: clockTime.nullable(), why: line(120) })
    .refine((c) => (c.from === null) === (c.to === null), { message: 'both-or-neither', path: ['to'] })
    .refine((c) => c.from === null || c.to === null || c.to > c.from, {
      message: 'ends-before-it-starts',
      path: ['to'],
    }),
  answer: closure,
});

export const removeClosure = route({
  method: 'DELETE',
  path: '/api/departments/:departmentId/closures/:closureId',
  summary: 'Desk: take a closure back',
  status: 200,
  params: z.object({ departmentId: id, closureId: id }),
  answer: done,
});
