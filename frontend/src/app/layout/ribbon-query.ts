import { readCalendar } from '@holdwater/shared-types/visits/calendar.contract.js';
import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '../../lib/api';
import { queryKeys } from '../../lib/query-keys';
import { useOrganization } from '../../lib/session-context';
import type { Calendar } from './ribbon-days';

/** Days, windows and visits from one date to another; the key is shared with the calendar page. */
export function calendarQuery(range: { from: string; to: string; organizationId: string | undefined }) {
  return queryOptions({
    queryKey: [...queryKeys.calendar, range],
    queryFn: ({ signal }) => call(readCalendar, { query: range }, { signal }),
  });
}

/** The two weeks shown; while others are read the last known stay, and without an answer the days stand empty. */
export function useRibbonCalendar(dates: readonly string[]): { calendar: Calendar | undefined } {
  const organizationId = useOrganization()?.organization.id;
  const range = { from: dates[0] ?? '', to: dates[dates.length - 1] ?? '', organizationId };
  const { data } = useQuery({
    ...calendarQuery(range),
    enabled: organizationId !== undefined,
    placeholderData: keepPreviousData,
  });
  return { calendar: data };
}
