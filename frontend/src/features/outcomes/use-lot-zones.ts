import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useQueries } from '@tanstack/react-query';
import { lotQuery } from '../lots/api/lot';
import { zoneOf } from '../lots/lot-view';

/** A department does not move: what is known of a lot's zone stays true. */
const known = { staleTime: Infinity } as const;

/**
 * The zone of each lot's department, in which its days are told; null while it is read. A correction does not carry its zone, so the lot is
 * asked, once for all of its corrections.
 */
export function useLotZones(corrections: readonly Pick<Correction, 'lotId'>[]): (lotId: string) => string | null {
  const lotIds = [...new Set(corrections.map(({ lotId }) => lotId))];
  const lots = useQueries({ queries: lotIds.map((lotId) => ({ ...lotQuery(lotId), ...known })) });
  return (lotId) => {
    const lot = lots[lotIds.indexOf(lotId)];
    if (lot === undefined || lot.isPending) return null;
    return zoneOf(lot.data ?? { zone: null });
  };
}
