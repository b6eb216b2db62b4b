import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';

export const calendarViews = ['week', 'two', 'list'] as const;
export type CalendarView = (typeof calendarViews)[number];

/** What is open beside the calendar. */
export type CalendarPanel =
  | { readonly kind: 'none' }
  | { readonly kind: 'request'; readonly lotIds: readonly string[]; readonly stageCode: string | null }
  | { readonly kind: 'visit'; readonly visitId: string };

export interface CalendarAddress {
  readonly view: CalendarView;
  readonly panel: CalendarPanel;
  readonly setView: (view: CalendarView) => void;
  readonly close: () => void;
  readonly openVisit: (visitId: string) => void;
  /** `?request=` with the lots chosen, so that a link can bring some along and a reload loses none. */
  readonly openRequest: (lotIds?: readonly string[]) => void;
  readonly setStage: (stageCode: string) => void;
}

const idPattern = /^[0-9a-f-]{36}$/i;

function panelOf(search: URLSearchParams): CalendarPanel {
  const visitId = search.get('visit');
  if (visitId !== null && idPattern.test(visitId)) return { kind: 'visit', visitId };
  const asked = search.get('request');
  if (asked === null) return { kind: 'none' };
  const lotIds = [...new Set(asked.split(',').filter((one) => idPattern.test(one)))];
  return { kind: 'request', lotIds, stageCode: search.get('stage') };
}

/** The calendar's view and panel live in the address: the back key closes what was opened. */
export function useCalendarAddress(): CalendarAddress {
  const [search, setSearch] = useSearchParams();
  const change = useCallback(
    (set: Record<string, string | null>, isReplacing = false) =>
      setSearch(
        (before) => {
          const after = new URLSearchParams(before);
          for (const [name, value] of Object.entries(set)) {
            if (value === null) after.delete(name);
            else after.set(name, value);
          }
          return after;
        },
        { replace: isReplacing },
      ),
    [setSearch],
  );
  return useMemo(
    () => ({
      view: calendarViews.find((one) => one === search.get('view')) ?? 'week',
      panel: panelOf(search),
      setView: (view) => change({ view: view === 'week' ? null : view }),
      close: () => change({ visit: null, request: null, stage: null }),
      openVisit: (visitId) => change({ visit: visitId, request: null, stage: null }),
      openRequest: (lotIds = []) => change({ visit: null, request: lotIds.join(',') }, search.has('request')),
      setStage: (stageCode) => change({ stage: stageCode }, true),
    }),
    [search, change],
  );
}
