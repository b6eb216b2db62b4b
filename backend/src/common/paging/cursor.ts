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

/** Cuts a list of `limit + 1` rows to a page. */
export function toPage<Row>(rows: readonly Row[], limit: number, keysOf: (row: Row) => readonly (string | number)[]) {
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last !== undefined ? toCursor(keysOf(last)) : null };
}
