/** The name of the database constraint behind an error, or null. */
export function constraintOf(error: unknown): string | null {
  if (typeof error !== 'object' || error === null) return null;
  const inner: unknown = 'original' in error ? error.original : error;
  if (typeof inner !== 'object' || inner === null || !('constraint' in inner)) return null;
  return typeof inner.constraint === 'string' ? inner.constraint : null;
}
