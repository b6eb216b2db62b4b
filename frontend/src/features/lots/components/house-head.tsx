import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Head, PhoneHead, type HeadCell } from '../../../components/head';
import { useSheetWidth } from '../../../components/use-sheet-width';

export interface HouseHeadProps {
  title: string;
  backTo: string;
  cells?: readonly HeadCell[];
  acts?: ReactNode;
}

/** The head of a page about house models, with the way back. */
export function HouseHead({ title, backTo, cells, acts }: HouseHeadProps): ReactNode {
  const { t } = useTranslation(['houses', 'common']);
  const isPhone = useSheetWidth() === 'phone';
  if (isPhone) {
    return (
      <>
        <PhoneHead backTo={backTo} label={t('page.label')} title={title} />
        {acts ? <div className="phone-choices house-acts">{acts}</div> : null}
      </>
    );
  }
  return (
    <Head
      label={t('page.label')}
      title={title}
      cells={cells}
      acts={
        <>
          {acts}
          <Act to={backTo}>{t('common.back')}</Act>
        </>
      }
    />
  );
}
