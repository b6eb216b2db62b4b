/** An instant as answered: ISO 8601 in `Z`, with milliseconds only where there are any. */
export const instantOf = (atMs: number): string => new Date(atMs).toISOString().replace('.000Z', 'Z');

export const instantOrNull = (atMs: number | null): string | null => (atMs === null ? null : instantOf(atMs));
