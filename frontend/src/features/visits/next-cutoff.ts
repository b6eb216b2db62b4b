import type { CalendarDay } from './calendar-model';

/** The next time at which a day's windows close for requests. */
export interface NextCutoff {
  readonly date: string;
  readonly departmentId: string;
  readonly zone: string;
  readonly at: string;
}

/** The first cut-off still to come of a window that can be taken, and its day; null where none can. Own windows of a department never close to it. */
export function nextCutoff(days: readonly CalendarDay[], now: Date): NextCutoff | null {
  const all = days.flatMap(({ date, cells }) =>
    cells.flatMap(({ lane, day }) =>
      (lane.isOwn ? [] : (day?.windows ?? [])).flatMap(({ isTakeable, cutoffAt }): NextCutoff[] =>
        !isTakeable || cutoffAt === null || Date.parse(cutoffAt) <= now.getTime()
          ? []
          : [{ date, departmentId: lane.departmentId, zone: lane.zone, at: cutoffAt }],
      ),
    ),
  );
  return all.reduce<NextCutoff | null>(
    (first, one) => (first === null || Date.parse(one.at) < Date.parse(first.at) ? one : first),
    null,
  );
}
