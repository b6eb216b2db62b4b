import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../components/act';
import { Plain } from '../components/plain';

/** Not yours, or not there: both look the same. */
export function NotFoundPage(): ReactNode {
  const { t } = useTranslation('app');
  return (
    <Plain
      kind="none"
      level={1}
      title={t('notYours.title')}
      acts={
        <Act kind="other" to="/">
          {t('notYours.back')}
        </Act>
      }
    >
      {t('notYours.text')}
    </Plain>
  );
}
