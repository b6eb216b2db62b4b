export interface Span {
  readonly startAt: Date;
  readonly endAt: Date;
}

export interface BusySpan extends Span {
  readonly inspectorId: string;
}

/** Who could come: in the order they are asked. `organizationIds`: everything they belong to. */
export interface Candidate {
  readonly id: string;
  readonly organizationIds: readonly string[];
}

export interface Seat {
  readonly inspectorId: string;
  readonly planned: Span;
}

/** The earliest span of so many minutes inside a window that touches nothing busy; half-open spans, so that one may end as the next begins. */
export function earliestGap(window: Span, busy: readonly Span[], minutes: number): Span | null {
  const lengthMs = minutes * 60_000;
  const inOrder = [...busy].sort((a, b) => a.startAt.getTime() - b.startAt.getTime());
  let startMs = window.startAt.getTime();
  for (const span of inOrder) {
    if (span.startAt.getTime() >= startMs + lengthMs) break;
    startMs = Math.max(startMs, span.endAt.getTime());
  }
  const endMs = startMs + lengthMs;
  return endMs <= window.endAt.getTime() ? { startAt: new Date(startMs), endAt: new Date(endMs) } : null;
}

/** The first candidate with a gap in the window, and the gap. Nobody is sent to a lot of an organization they belong to. */
export function firstFreeSeat(
  window: Span,
  candidates: readonly Candidate[],
  busy: readonly BusySpan[],
  minutes: number,
  partyIds: ReadonlyArray<string | null>,
): Seat | null {
  for (const candidate of candidates) {
    if (candidate.organizationIds.some((id) => partyIds.includes(id))) continue;
    const planned = earliestGap(
      window,
      busy.filter((span) => span.inspectorId === candidate.id),
      minutes,
    );
    if (planned) return { inspectorId: candidate.id, planned };
  }
  return null;
}

/** A seat for each lot, one after the other; null when any of them finds none. `lots` are the parties of each. */
export function seatAll(
  window: Span,
  candidates: readonly Candidate[],
  busy: readonly BusySpan[],
  minutes: number,
  lots: ReadonlyArray<ReadonlyArray<string | null>>,
): Seat[] | null {
  const seats: Seat[] = [];
  for (const partyIds of lots) {
    const taken = seats.map(({ inspectorId, planned }) => ({ inspectorId, ...planned }));
    const seat = firstFreeSeat(window, candidates, [...busy, ...taken], minutes, partyIds);
    if (!seat) return null;
    seats.push(seat);
  }
  return seats;
}

/** The smallest places of 1 to `room` not yet taken, as many as are wanted; null when there are too few. */
export function freePlaces(room: number, taken: readonly number[], wanted: number): number[] | null {
  const free: number[] = [];
  for (let place = 1; place <= room && free.length < wanted; place += 1) if (!taken.includes(place)) free.push(place);
  return free.length === wanted ? free : null;
}
