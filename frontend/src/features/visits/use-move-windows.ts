import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery } from '@tanstack/react-query';
import { calendarQuery } from '../../app/layout/ribbon-query';
import { useNow } from '../../lib/clock';
import { addDays, localDateOf } from '../../lib/local-days';
import { useOrganization } from '../../lib/session-context';
import { offersQuery } from './api/offers';
import type { ChoosableWindow } from './components/window-choice';
import { windowKey } from './offer-reasons';

/** How far ahead the own department's windows are read; a request may go as far as the rule card lets it. */
const deskDays = 21;

interface MoveWindows {
  readonly data: ChoosableWindow[] | undefined;
  readonly error: unknown;
  readonly isPending: boolean;
  readonly refetch: ReturnType<typeof useQuery<ChoosableWindow[]>>['refetch'];
}

/**
 * The windows a visit may move to, in order. The requesting side has those on offer; the desk, which no cut-off binds, every window of its
 * own calendar with room.
 */
export function useMoveWindows(visit: VisitSummary): MoveWindows {
  const organizationId = useOrganization()?.organization.id;
  const isDesk = organizationId === visit.departmentId;
  const today = localDateOf(useNow(60_000), visit.zone);
  const { lotId, unitNumbers, stageCode } = visit;
  const isOther = (window: ChoosableWindow): boolean =>
    window.isTakeable && windowKey(window) !== windowKey(visit.window);
  const offered = useQuery({
    ...offersQuery({ lots: [{ lotId, unitNumbers }], stageCode }),
    enabled: !isDesk,
    select: ({ windows }): ChoosableWindow[] => windows.filter(isOther),
  });
  const own = useQuery({
    ...calendarQuery({ from: today, to: addDays(today, deskDays), organizationId }),
    enabled: isDesk,
    select: ({ lanes }): ChoosableWindow[] =>
      lanes
        .filter(({ departmentId }) => departmentId === visit.departmentId)
        .flatMap(({ days }) => days.flatMap(({ windows }) => windows.filter(isOther))),
  });
  return isDesk ? own : offered;
}
