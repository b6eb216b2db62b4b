import type { Department } from '@holdwater/shared-types/departments/departments.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Plain } from '../../../components/plain';

/** A department without a rule card in force: whom to call. */
export function NoRuleCard({ department }: { department: Department | undefined }): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <Plain kind="empty" level={1} title={t('noCard.title', { department: department?.name ?? '' })}>
      {t(department?.isOutside ? 'noCard.outside' : 'noCard.text')} {department?.phone ?? ''}
    </Plain>
  );
}

export function NoDepartments(): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <Plain kind="empty" level={1} title={t('noneTitle')}>
      {t('noneText')}
    </Plain>
  );
}
