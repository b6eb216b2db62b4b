import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { windowSays, type CalendarDay } from './calendar-model';
import { windowKey } from './offer-reasons';

/** A window of a day with the visits that stand in it. */
export interface AgendaWindow {
  readonly key: string;
  readonly departmentId: string;
  readonly zone: string;
  readonly startAt: string;
  readonly endAt: string;
  readonly says: ReturnType<typeof windowSays>;
  readonly roomLeft: number;
  readonly visits: readonly VisitSummary[];
}

export interface AgendaClosure {
  readonly departmentId: string;
  readonly from: string | null;
  readonly why: string;
}

/**
 * A day as a list: windows in order of time, those that are over or full only where a visit of the reader's stands in them. A visit whose
 * window the rule card no longer has keeps a bracket of its own.
 */
export function agendaOf({ cells }: CalendarDay, now: Date): { windows: AgendaWindow[]; closed: AgendaClosure[] } {
  const windows = cells.flatMap(({ lane, day, visits }) => {
    const base = { departmentId: lane.departmentId, zone: lane.zone };
    const known = (day?.windows ?? []).map((window): AgendaWindow => ({
      ...base,
      key: `${lane.departmentId} ${window.label}`,
      startAt: window.startAt,
      endAt: window.endAt,
      says: windowSays(window, now.getTime()),
      roomLeft: window.roomLeft,
      visits: visits.filter((visit) => windowKey(visit.window) === windowKey(window)),
    }));
    const stray = visits.filter((visit) => !known.some((window) => window.visits.includes(visit)));
    return [
      ...known.filter((window) => window.visits.length > 0 || window.says === 'room' || window.says === 'shut'),
      ...stray.map((visit): AgendaWindow => ({
        ...base,
        key: visit.id,
        startAt: visit.window.startAt,
        endAt: visit.window.endAt,
        says: 'over',
        roomLeft: 0,
        visits: [visit],
      })),
    ];
  });
  const closed = cells.flatMap(({ lane, day }) =>
    (day?.closed ?? []).map(({ from, why }) => ({ departmentId: lane.departmentId, from, why })),
  );
  return { windows: windows.sort((a, b) => Date.parse(a.startAt) - Date.parse(b.startAt)), closed };
}
