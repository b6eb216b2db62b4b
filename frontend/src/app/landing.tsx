import { readRun } from '@holdwater/shared-types/visits/calendar.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Navigate } from 'react-router-dom';
import { Lines } from '../components/lines';
import { call } from '../lib/api';
import { queryKeys } from '../lib/query-keys';
import { landingsFor } from './sheets';
import { useWorker } from './use-worker';

/** `/`: the page this person starts on. Of several, the first with something due today; a run without stops has nothing due. */
export function Landing(): ReactNode {
  const worker = useWorker();
  const [first = '/rule-cards', second] = landingsFor(worker);
  const mustAsk = first === '/run' && second !== undefined;
  const run = useQuery({
    queryKey: [...queryKeys.run, 'landing'],
    queryFn: ({ signal }) => call(readRun, { query: {} }, { signal }),
    enabled: mustAsk,
    retry: false,
  });
  if (!mustAsk) return <Navigate replace to={first} />;
  if (run.isPending) return <Lines />;
  const hasStops = (run.data?.stops.length ?? 0) > 0;
  return <Navigate replace to={hasStops ? first : second} />;
}
