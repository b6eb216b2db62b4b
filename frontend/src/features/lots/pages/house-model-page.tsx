import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { Lines } from '../../../components/lines';
import { Failed } from '../../../lib/query-state';
import { houseModelQuery } from '../api/house-models';
import { HouseModelSheet } from '../components/house-model-sheet';
import '../lots.css';
import '../house-form.css';
import '../house-models.css';

/** One house model: drawn, with its versions and the lots that use it. */
export function HouseModelPage(): ReactNode {
  const { houseModelId = '' } = useParams();
  const model = useQuery(houseModelQuery(houseModelId));
  if (model.data !== undefined) return <HouseModelSheet model={model.data} />;
  if (model.isPending) return <Lines rows={8} />;
  return <Failed error={model.error} level={1} onRetry={() => void model.refetch()} />;
}
