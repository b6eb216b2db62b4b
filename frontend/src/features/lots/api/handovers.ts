import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import {
  answerHandover,
  askHandover,
  listPastLots,
  readPastLot,
  readPastLotLedger,
  withdrawHandover,
} from '@holdwater/shared-types/lots/handover.contract.js';
import type { HandoverKind } from '@holdwater/shared-types/lots/lot.contract.js';
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { useFieldMutation } from '../../../lib/field-mutation';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Builder: asks another plumber or builder to take a lot over. */
export function useAskHandover(lotId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof askHandover>['body'], options) =>
      call(askHandover, { params: { lotId }, body }, options),
    invalidates: () => [queryKeys.lot(lotId), queryKeys.waiting],
  });
}

/** Builder: takes an asking back. */
export function useWithdrawHandover(lotId: string) {
  return useIdempotentMutation({
    mutationFn: (kind: HandoverKind, options) => call(withdrawHandover, { params: { lotId, kind } }, options),
    invalidates: () => [queryKeys.lot(lotId), queryKeys.waiting],
  });
}

export interface HandoverAnswer {
  readonly organizationId: string;
  readonly isJoining: boolean;
  readonly why?: string;
  /** The tests taken over, each with what it reads now. */
  readonly takeOver: ReadonlyArray<{ holdId: string; isLevel: boolean; value: number }>;
}

/** Takes a lot over, with the tests that are read anew, or refuses to. */
export function useAnswerHandover(lotId: string) {
  return useFieldMutation({
    mutationFn: ({ takeOver, ...answer }: HandoverAnswer, { madeAt, idOf }, options) => {
      const readings = takeOver.map(({ holdId, isLevel, value }) => ({
        holdId,
        reading: {
          ...{ clientId: idOf(holdId), madeAt },
          ...(isLevel ? { levelIn: value } : { pressurePsi: value, gaugeValve: 'open' as const }),
        },
      }));
      return call(answerHandover, { params: { lotId }, body: { ...answer, takeOver: readings } }, options);
    },
    invalidates: () => [
      ...[queryKeys.consents, queryKeys.lots, queryKeys.tracts, queryKeys.waiting, queryKeys.search],
      queryKeys.lot(lotId),
    ],
  });
}

/** Lots handed over from an organization of the reader. */
export function pastLotsQuery() {
  return queryOptions({
    queryKey: [...queryKeys.lots, 'past'],
    queryFn: ({ signal }) => call(listPastLots, {}, { signal }),
  });
}

/** A lot handed over, as it stood then. */
export function pastLotQuery(lotId: string) {
  return queryOptions({
    queryKey: [...queryKeys.lots, 'past', lotId],
    queryFn: ({ signal }) => call(readPastLot, { params: { lotId } }, { signal }),
  });
}

/** What changed on it until then, newest first, some at a time. */
export function pastLotLedgerQuery(lotId: string) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.lots, 'past', lotId, 'changes'],
    queryFn: ({ pageParam, signal }) =>
      call(readPastLotLedger, { params: { lotId }, query: { limit: 20, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });
}
