import { useMemo } from 'react';
import { useSession } from '../lib/session-context';
import type { Worker } from './sheets';

/** Who works now: the roles of the chosen organization, or the operator's frame. */
export function useWorker(): Worker {
  const { chosen, isOperatorFrame } = useSession();
  return useMemo(() => ({ roles: chosen?.roles ?? [], isOperatorFrame }), [chosen, isOperatorFrame]);
}
