import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link, useLocation } from 'react-router-dom';
import { Count } from '../../components/count';
import { Daub } from '../../components/daub';
import { Icon, type IconName } from '../../components/icon';
import { phoneSheetsFor } from '../sheets';
import { useWorker } from '../use-worker';
import { useSheetCounts, useUnreadNotices } from './counts';
import { useCurrentSheet } from './current-sheet';

interface BarLink {
  readonly to: string;
  readonly icon: IconName;
  readonly word: string;
  readonly count: number;
  readonly countWords: string;
  readonly isHere: boolean;
}

/** The bar at the thumb: the landing page, the next two, and Notices. */
export function PhoneBar(): ReactNode {
  const { t } = useTranslation('app');
  const worker = useWorker();
  const here = useCurrentSheet();
  const counts = useSheetCounts();
  const unread = useUnreadNotices();
  const { pathname } = useLocation();
  const links: BarLink[] = phoneSheetsFor(worker).map((sheet) => ({
    to: sheet.path,
    icon: sheet.icon,
    word: t([`phoneSheets.${sheet.id}`, `sheets.${sheet.id}`]),
    count: counts[sheet.id] ?? 0,
    countWords: t(`counts.${sheet.id}`, { count: counts[sheet.id] ?? 0 }),
    isHere: sheet.id === here?.id,
  }));
  links.push({
    to: '/notices',
    icon: 'notices',
    word: t('noticesWord'),
    count: unread,
    countWords: t('unread', { count: unread }),
    isHere: pathname === '/notices',
  });
  return (
    <nav className="pbar" aria-label={t('sheetsName')}>
      <ul>
        {links.map((link) => (
          <li key={link.to}>
            <Link to={link.to} aria-current={link.isHere ? 'page' : undefined}>
              {link.isHere ? <Daub /> : null}
              <Icon name={link.icon} size={24} />
              <span>{link.word}</span> <Count value={link.count} label={link.countWords} />
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
