import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { Lines } from '../../../components/lines';
import { Failed } from '../../../lib/query-state';
import { useLotLive } from '../../../lib/realtime';
import { lotQuery } from '../api/lot';
import { LotSheet } from '../components/lot-sheet';
import '../lots.css';

/** The file of one house. */
export function LotSheetPage(): ReactNode {
  const { lotId = '' } = useParams();
  const lot = useQuery(lotQuery(lotId));
  useLotLive(lotId);
  if (lot.data !== undefined) return <LotSheet lot={lot.data} />;
  if (lot.isPending) return <Lines rows={10} />;
  return <Failed error={lot.error} level={1} onRetry={() => void lot.refetch()} />;
}
