import { useQueryErrorResetBoundary } from '@tanstack/react-query';
import { useEffect, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useRouteError } from 'react-router-dom';
import { Act } from '../components/act';
import { Plain } from '../components/plain';
import { isApiError } from '../lib/api-error';
import { useErrorWords } from '../lib/errors';
import { NotFoundPage } from './not-found-page';

/** A page file that is gone: a newer version was put out while this page stood open. */
function isGoneFile(error: unknown): boolean {
  return error instanceof Error && /dynamically imported module|module script failed|preload/i.test(error.message);
}

/** What a page shows when it fails as a whole: what happened, what is safe, what to do next. */
export function RouteError(): ReactNode {
  const error = useRouteError();
  const { t } = useTranslation(['common', 'app']);
  const words = useErrorWords(error);
  const { reset } = useQueryErrorResetBoundary();
  useEffect(() => reset(), [reset]);
  if (isApiError(error, 'not-found')) return <NotFoundPage />;
  const isNewer = isGoneFile(error);
  return (
    <Plain
      kind={isNewer ? 'taken' : 'error'}
      level={1}
      title={isNewer ? t('app.newer.title') : words?.title}
      entry={words?.entry ?? undefined}
      acts={
        <Act kind="first" onClick={() => window.location.reload()}>
          {t('loadAgain')}
        </Act>
      }
    >
      {isNewer ? t('app.newer.text') : `${words?.safe ?? ''} ${words?.next ?? ''}`}
    </Plain>
  );
}
