import type { QueryKey } from '@tanstack/react-query';
import { queryKeys } from './query-keys';

/** What the server says has changed on a watched lot. */
export const lotTopics = ['thread', 'visits', 'plans', 'holds', 'outcomes', 'lot', 'ledger'] as const;
export type LotTopic = (typeof lotTopics)[number];

/** What the server tells a person wherever they are. */
export const personTopics = ['waiting', 'notices'] as const;
export type PersonTopic = (typeof personTopics)[number];

const boards: QueryKey[] = [
  queryKeys.calendar,
  queryKeys.run,
  queryKeys.dayBoard,
  queryKeys.requests,
  queryKeys.visits,
  queryKeys.waiting,
  queryKeys.lots,
  queryKeys.offers,
];

const part = queryKeys.lotPart;

/** Which queries each topic of a lot makes stale. */
const staleByLotTopic: Record<LotTopic, (lotId: string) => QueryKey[]> = {
  thread: (lotId) => [part(lotId, 'thread'), part(lotId, 'ledger')],
  visits: (lotId) => [
    part(lotId, 'visits'),
    part(lotId, 'detail'),
    part(lotId, 'clearance'),
    part(lotId, 'ledger'),
    ...boards,
  ],
  plans: (lotId) => [part(lotId, 'plans'), part(lotId, 'ledger')],
  holds: (lotId) => [
    part(lotId, 'holds'),
    part(lotId, 'visits'),
    part(lotId, 'detail'),
    part(lotId, 'ledger'),
    ...boards,
  ],
  outcomes: (lotId) => [
    part(lotId, 'outcomes'),
    part(lotId, 'corrections'),
    part(lotId, 'clearance'),
    part(lotId, 'visits'),
    part(lotId, 'detail'),
    part(lotId, 'ledger'),
    queryKeys.corrections,
    ...boards,
  ],
  lot: (lotId) => [queryKeys.lot(lotId), queryKeys.lots, queryKeys.search, queryKeys.consents, queryKeys.waiting],
  ledger: (lotId) => [part(lotId, 'ledger')],
};

/** Which queries each topic of a person makes stale. */
const staleByPersonTopic: Record<PersonTopic, QueryKey[]> = {
  waiting: [...boards, queryKeys.consents, queryKeys.corrections],
  notices: [queryKeys.notices],
};

/** Query keys made stale by topics of a lot; an unknown topic makes the whole lot stale, so that a newer server is never ignored. */
export function staleOnLot(lotId: string, topics: readonly string[]): QueryKey[] {
  return topics.flatMap((topic) => {
    const known = lotTopics.find((one) => one === topic);
    return known ? staleByLotTopic[known](lotId) : [queryKeys.lot(lotId)];
  });
}

export function staleForPerson(topic: PersonTopic): QueryKey[] {
  return staleByPersonTopic[topic];
}
