import { z } from 'zod';
import { id, instant, localDate } from '../common/fields.js';
import { done, pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';

export const health = route({
  method: 'GET',
  path: '/api/health',
  summary: 'The process lives',
  status: 200,
  answer: z.object({ status: z.literal('ok') }),
});

export const ready = route({
  method: 'GET',
  path: '/api/ready',
  summary: 'The process can serve: the database answers and its migrations are all there',
  status: 200,
  answer: z.object({ status: z.enum(['ready', 'not-ready']), checks: z.record(z.string(), z.string()) }),
});

export const delivery = z.object({
  id,
  channel: z.enum(['email']),
  to: z.string(),
  kind: z.string(),
  state: z.enum(['waiting', 'sent', 'given-up', 'dropped']),
  attempts: z.number().int(),
  lastError: z.string().nullable(),
  nextAttemptAt: instant.nullable(),
  createdAt: instant,
});

export const listDeliveries = route({
  method: 'GET',
  path: '/api/operations/deliveries',
  summary: 'Operator: deliveries that wait or were given up',
  status: 200,
  query: z.object({ ...pageQuery, state: z.enum(['waiting', 'given-up']).optional() }),
  answer: pageOf(delivery).extend({ waiting: z.number().int(), givenUp: z.number().int() }),
});

export const retryDelivery = route({
  method: 'POST',
  path: '/api/operations/deliveries/:deliveryId/retry',
  summary: 'Operator: try a given-up delivery again',
  status: 200,
  params: z.object({ deliveryId: id }),
  answer: done,
});

export const verifyLedger = route({
  method: 'GET',
  path: '/api/operations/ledger',
  summary: 'Operator: recompute every chain; the first that is broken',
  status: 200,
  answer: z.object({
    chains: z.number().int(),
    entries: z.number().int(),
    broken: z.array(z.object({ scope: z.string(), firstBroken: z.number().int() })),
    /** One anchor a day over all chains: the first day whose anchor does not fit; null when all do. */
    anchors: z.object({
      days: z.number().int(),
      lastDay: localDate.nullable(),
      firstBroken: localDate.nullable(),
    }),
  }),
});
