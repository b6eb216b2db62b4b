import { z } from 'zod';

/** Lists answer pages; `cursor` is opaque and good for the same query only. */
export const pageQuery = {
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
};

/** A page of `item`s; `nextCursor` is null on the last page. */
export function pageOf<T extends z.ZodType>(item: T) {
  return z.object({ items: z.array(item), nextCursor: z.string().nullable() });
}

/** Bare acknowledgement of an act that changes something but shows nothing. */
export const done = z.object({ done: z.literal(true) });
