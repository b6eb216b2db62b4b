/** A half-open span of instants as Sequelize writes it and reads it back. */
export type InstantRange = [Date, Date] | [{ value: Date; inclusive: boolean }, { value: Date; inclusive: boolean }];

/** A half-open span of dates, `YYYY-MM-DD`; null ends are open. */
export type DateRange = Array<string | null | { value: string | null; inclusive: boolean }>;

/** Start and end of a span of instants, whichever way it came. */
export function spanOf(range: InstantRange): { startAt: Date; endAt: Date } {
  const [start, end] = range;
  return { startAt: instantOf(start), endAt: instantOf(end) };
}

function instantOf(bound: Date | { value: Date }): Date {
  return bound instanceof Date ? bound : new Date(bound.value);
}

/** First and last date of a half-open span of dates; null where it is open. */
export function datesOf(range: DateRange): { from: string | null; until: string | null } {
  const [from, until] = range.map((bound) => (typeof bound === 'object' && bound !== null ? bound.value : bound));
  return { from: from ?? null, until: until ?? null };
}
