import { addReading } from '@holdwater/shared-types/holds/hold.contract.js';
import { call } from '../../../lib/api';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';
import type { TypedReading } from '../typed-reading';

export interface ReadingOfHold {
  readonly holdId: string;
  readonly reading: TypedReading;
}

/** Adds a reading to a test that stands. */
export function useAddReading(lotId: string) {
  return useFieldMutation({
    mutationFn: ({ holdId, reading }: ReadingOfHold, { clientId, madeAt }, options) =>
      call(addReading, { params: { holdId }, body: { ...reading, clientId, madeAt } }, options),
    invalidates: () => staleOnLot(lotId, ['holds']),
  });
}
