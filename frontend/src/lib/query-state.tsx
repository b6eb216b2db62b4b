import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../components/act';
import { Lines } from '../components/lines';
import { Plain } from '../components/plain';
import { isApiError } from './api-error';
import { useErrorWords } from './errors';

/** An error as a panel or page shows it: what happened, what is safe, what to do next. */
export function Failed({
  error,
  onRetry,
  level,
}: {
  error: unknown;
  onRetry?: () => void;
  level?: 1 | 2 | 3;
}): ReactNode {
  const { t } = useTranslation('common');
  const words = useErrorWords(error);
  const isGone = isApiError(error, 'not-found');
  return (
    <Plain
      kind={isGone ? 'none' : 'error'}
      level={level}
      title={words?.title}
      entry={words?.entry ?? undefined}
      acts={
        onRetry === undefined || isGone ? undefined : (
          <Act kind="first" onClick={onRetry}>
            {t('tryAgain')}
          </Act>
        )
      }
    >
      {words?.safe} {words?.next}
    </Plain>
  );
}

export interface QueryStateProps<Data> {
  query: Pick<UseQueryResult<Data, unknown>, 'data' | 'error' | 'isPending' | 'refetch'>;
  /** Stands in while nothing is known. */
  loading?: ReactNode;
  children: (data: Data) => ReactNode;
}

/** The states of a panel: lines while it is read, why it is not there, or its content. The last known stays when a later read fails. */
export function QueryState<Data>({ query, loading, children }: QueryStateProps<Data>): ReactNode {
  if (query.data !== undefined) return children(query.data);
  if (query.isPending) return loading ?? <Lines />;
  return <Failed error={query.error} onRetry={() => void query.refetch()} />;
}
