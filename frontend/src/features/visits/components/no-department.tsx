import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Plain } from '../../../components/plain';

/** A page of a department's, opened by somebody who works for none now. */
export function NoDepartment(): ReactNode {
  const { t } = useTranslation('visits');
  return (
    <Plain kind="none" level={1} title={t('none.departmentTitle')}>
      {t('none.departmentText')}
    </Plain>
  );
}
