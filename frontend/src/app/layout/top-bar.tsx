import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link, useLocation } from 'react-router-dom';
import { BrandMark } from '../../components/brand-mark';
import { Count } from '../../components/count';
import { Daub } from '../../components/daub';
import { Icon } from '../../components/icon';
import { sheetsFor, type Sheet } from '../sheets';
import { useWorker } from '../use-worker';
import { useCurrentSheet } from './current-sheet';
import { FindBox } from './find-box';
import { NameMenu } from './name-menu';
import { useSheetCounts, useUnreadNotices } from './counts';

/** The top bar is an index of sheets: the number beside each is the key that opens it. */
export function TopBar(): ReactNode {
  const { t } = useTranslation('app');
  const worker = useWorker();
  const current = useCurrentSheet();
  const counts = useSheetCounts();
  return (
    <header className="top">
      <Link className="brand" to="/" aria-label="Holdwater">
        <BrandMark size={26} />
        <span className="brand-word">Holdwater</span>
      </Link>
      <nav className="nav" aria-label={t('sheetsName')}>
        <ul>
          {sheetsFor(worker).map((sheet, index) => (
            <li key={sheet.id}>
              <SheetLink
                sheet={sheet}
                number={index + 1}
                isHere={sheet.id === current?.id}
                count={counts[sheet.id] ?? 0}
              />
            </li>
          ))}
        </ul>
      </nav>
      {worker.isOperatorFrame ? null : <FindBox />}
      <NoticesCell />
      <NameMenu />
    </header>
  );
}

function SheetLink(props: { sheet: Sheet; number: number; isHere: boolean; count: number }): ReactNode {
  const { sheet, number, isHere, count } = props;
  const { t } = useTranslation('app');
  return (
    <Link to={sheet.path} aria-current={isHere ? 'page' : undefined} aria-keyshortcuts={String(number)}>
      <span className="no" aria-hidden="true">
        {number}
      </span>
      {t(`sheets.${sheet.id}`)} <Count value={count} label={t(`counts.${sheet.id}`, { count })} />
      {isHere ? <Daub /> : null}
    </Link>
  );
}

function NoticesCell(): ReactNode {
  const { t } = useTranslation('app');
  const unread = useUnreadNotices();
  const { pathname } = useLocation();
  return (
    <Link className="cell" to="/notices" aria-current={pathname === '/notices' ? 'page' : undefined}>
      <Icon name="notices" />
      <span className="notices-word">{t('noticesWord')}</span>{' '}
      <Count value={unread} label={t('unread', { count: unread })} />
    </Link>
  );
}
