import { id, instant } from '@holdwater/shared-types/common/fields.js';
import { z } from 'zod';
import { refuse } from '../errors/app-error.js';

/** Packs the sort keys of the last row of a page; opaque to the reader. */
export function toCursor(keys: readonly (string | number)[]): string {
  return Buffer.from(JSON.stringify(keys)).toString('base64url');
}

/** Unpacks a cursor of `count` keys. Throws `bad-input` when it was not made by `toCursor`. */
export function fromCursor(cursor: string, count: number): Array<string | number> {
  try {
    const keys: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    const isKeys =
      Array.isArray(keys) &&
      keys.length === count &&
      keys.every((key) => typeof key === 'string' || typeof key === 'number');
    if (isKeys) return keys;
  } catch {
    // falls through to the refusal: a cursor is ours or it is nothing
  }
  return refuse('bad-input', {}, { cursor: 'not-a-cursor' });
}

const instantAndId = z.tuple([instant, id]);
const integer = z.tuple([z.coerce.number().int()]);

/** A cursor of an instant and an id, as lists by time have it; both null without one. Throws `bad-input`. */
export function fromInstantCursor(cursor: string | undefined): [string, string] | [null, null] {
  return cursor === undefined ? [null, null] : keysOf(instantAndId, fromCursor(cursor, 2));
}

/** A cursor of one whole number, as numbered lists have it; null without one. Throws `bad-input`. */
export function fromNumberCursor(cursor: string | undefined): number | null {
  return cursor === undefined ? null : keysOf(integer, fromCursor(cursor, 1))[0];
}

function keysOf<T>(schema: z.ZodType<T>, keys: unknown): T {
  const parsed = schema.safeParse(keys);
  return parsed.success ? parsed.data : refuse('bad-input', {}, { cursor: 'not-a-cursor' });
}

/** Cuts a list of `limit + 1` rows to a page. */
export function toPage<Row>(rows: readonly Row[], limit: number, keysOf: (row: Row) => readonly (string | number)[]) {
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last !== undefined ? toCursor(keysOf(last)) : null };
}
