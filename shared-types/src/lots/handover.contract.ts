import { z } from 'zod';
import { id, instant, words } from '../common/fields.js';
import { done, pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';
import { hold, readingFields } from '../holds/hold.contract.js';
import { ledgerEntry } from '../ledger/ledger.contract.js';
import { handoverKinds, lotDetail } from './lot.contract.js';

const lotParams = z.object({ lotId: id });

export const askHandover = route({
  method: 'POST',
  path: '/api/lots/:lotId/handovers',
  summary: 'Builder: ask another plumber or builder to take a lot over; the present one stays until they agree',
  status: 200,
  params: lotParams,
  body: z.strictObject({ kind: z.enum(handoverKinds), organizationId: id }),
  answer: lotDetail,
});

export const withdrawHandover = route({
  method: 'DELETE',
  path: '/api/lots/:lotId/handovers/:kind',
  summary: 'Builder: take an asking back that is not answered yet',
  status: 200,
  params: lotParams.extend({ kind: z.enum(handoverKinds) }),
  answer: lotDetail,
});

export const answerHandover = route({
  method: 'POST',
  path: '/api/lots/:lotId/handovers/answer',
  summary:
    'Take a lot over, or refuse to. Tests that stand are ended as handed over; those named are taken over as new tests with a fresh reading',
  status: 200,
  params: lotParams,
  body: z.strictObject({
    organizationId: id,
    isJoining: z.boolean(),
    why: words(500).optional(),
    takeOver: z
      .array(z.strictObject({ holdId: id, reading: z.strictObject(readingFields) }))
      .max(48)
      .optional(),
  }),
  answer: done,
});

/** A lot that an organization of the reader's was on, under the name it had then. */
export const pastLot = z.object({
  lotId: id,
  lotNumber: z.string(),
  tractName: z.string().nullable(),
  address: z.string(),
  kind: z.enum(handoverKinds),
  organizationName: z.string(),
  replacedByName: z.string(),
  until: instant,
  /** The department's; null where none was on the lot. */
  zone: z.string().nullable(),
});
export type PastLot = z.infer<typeof pastLot>;

export const listPastLots = route({
  method: 'GET',
  path: '/api/past-lots',
  summary: 'Lots that were handed over from an organization of the reader, the last first',
  status: 200,
  answer: z.object({ items: z.array(pastLot) }),
});

export const readPastLot = route({
  method: 'GET',
  path: '/api/past-lots/:lotId',
  summary: 'A lot handed over: its tests with their readings as they stood at that moment',
  status: 200,
  params: lotParams,
  answer: pastLot.extend({ holds: z.array(hold) }),
});

export const readPastLotLedger = route({
  method: 'GET',
  path: '/api/past-lots/:lotId/ledger',
  summary: 'What changed on a lot until it was handed over, newest first',
  status: 200,
  params: lotParams,
  query: z.object(pageQuery),
  answer: pageOf(ledgerEntry).extend({ total: z.number().int() }),
});
