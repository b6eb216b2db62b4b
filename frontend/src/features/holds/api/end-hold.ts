import { endHold, type Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { call } from '../../../lib/api';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';

export interface HoldEnd {
  readonly holdId: string;
  readonly reason: 'taken-down' | 'lost';
}

/** Plumber: ends a test with its reason; a visit whose tests were up is then booked, not up. */
export function useEndHold(lotId: string, onDone: (hold: Hold, end: HoldEnd) => void) {
  return useFieldMutation({
    mutationFn: ({ holdId, reason }: HoldEnd, { clientId, madeAt }, options) =>
      call(endHold, { params: { holdId }, body: { reason, clientId, madeAt } }, options),
    onDone,
    invalidates: () => staleOnLot(lotId, ['holds', 'visits']),
  });
}
