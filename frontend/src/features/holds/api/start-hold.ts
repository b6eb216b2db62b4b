import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { startHold } from '@holdwater/shared-types/holds/hold.contract.js';
import { call } from '../../../lib/api';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';
import type { TypedReading } from '../typed-reading';

type Body = RouteCall<typeof startHold>['body'];
export type NewHold = Omit<Body, 'clientId' | 'madeAt' | 'firstReading'> & { readonly firstReading: TypedReading };

/** Plumber: starts a test with its first reading. */
export function useStartHold(lotId: string) {
  return useFieldMutation({
    mutationFn: ({ firstReading, ...test }: NewHold, { clientId, madeAt, idOf }, options) =>
      call(
        startHold,
        {
          params: { lotId },
          body: { ...test, clientId, madeAt, firstReading: { ...firstReading, clientId: idOf('reading'), madeAt } },
        },
        options,
      ),
    invalidates: () => staleOnLot(lotId, ['holds']),
  });
}
