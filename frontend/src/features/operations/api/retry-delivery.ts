import { retryDelivery } from '@holdwater/shared-types/operations/operations.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Tries a given-up delivery again. */
export function useRetryDelivery() {
  return useIdempotentMutation({
    mutationFn: (deliveryId: string, options) => call(retryDelivery, { params: { deliveryId } }, options),
    invalidates: () => [queryKeys.deliveries],
  });
}
