import type { VisitSummary, withdrawReasons } from '@holdwater/shared-types/visits/visit.contract.js';
import { useDeclineVisit } from './api/decline-visit';
import { useFreeVisit } from './api/free-visit';
import { useNotReached } from './api/not-reached';
import { useWithdrawVisit } from './api/withdraw-visit';

export type EndMove = 'withdraw' | 'decline' | 'not-reached' | 'free-closure';

export interface EndWords {
  readonly reason: (typeof withdrawReasons)[number];
  readonly note: string;
}

export interface EndVisit {
  readonly end: (visit: VisitSummary, words: EndWords) => void;
  readonly isPending: boolean;
  readonly error: unknown;
}

/** Each way a visit ends or goes back to the requests, with the words it is sent with. */
export function useEndVisit(move: EndMove, onDone: () => void): EndVisit {
  const withdrawing = useWithdrawVisit(onDone);
  const declining = useDeclineVisit(onDone);
  const returning = useNotReached(onDone);
  const freeing = useFreeVisit(onDone);
  const of = { withdraw: withdrawing, decline: declining, 'not-reached': returning, 'free-closure': freeing };
  const end: EndVisit['end'] = ({ id, version }, { reason, note: typed }) => {
    const base = { visitId: id, expectedVersion: version };
    const note = typed.trim() === '' ? {} : { note: typed.trim() };
    if (move === 'withdraw') withdrawing.mutate({ ...base, reason, ...note });
    else if (move === 'decline') declining.mutate({ ...base, reason: typed.trim() });
    else if (move === 'free-closure') freeing.mutate({ ...base, reason: typed.trim() });
    else returning.mutate({ ...base, ...note });
  };
  return { end, isPending: of[move].isPending, error: of[move].error };
}
