import { z } from 'zod';
import { id, instant } from '../common/fields.js';
import { pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';

export const ledgerEntry = z.object({
  sequence: z.number().int(),
  at: instant,
  kind: z.string(),
  actorName: z.string().nullable(),
  actorRole: z.string().nullable(),
  payload: z.record(z.string(), z.unknown()),
  hash: z.string(),
});
export type LedgerEntry = z.infer<typeof ledgerEntry>;

export const readLotLedger = route({
  method: 'GET',
  path: '/api/lots/:lotId/ledger',
  summary: 'Everything that changed on a lot, newest first',
  status: 200,
  params: z.object({ lotId: id }),
  query: z.object(pageQuery),
  answer: pageOf(ledgerEntry).extend({ total: z.number().int() }),
});

export const chainVerdict = z.object({
  isWhole: z.boolean(),
  entries: z.number().int(),
  /** First entry that does not fit; null when all do. One past the last when the tail was cut. */
  firstBroken: z.number().int().nullable(),
});

export const verifyLotLedger = route({
  method: 'GET',
  path: '/api/lots/:lotId/ledger/check',
  summary: 'Recompute the chain of a lot',
  status: 200,
  params: z.object({ lotId: id }),
  answer: chainVerdict,
});
