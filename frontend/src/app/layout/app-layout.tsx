import { Suspense, useEffect, useRef, type ReactNode, type RefObject } from 'react';
import { useTranslation } from 'react-i18next';
import { Outlet, useLocation, useMatches } from 'react-router-dom';
import { DoneLine } from '../../components/done-line';
import { Lines } from '../../components/lines';
import { useIsPhone } from '../../lib/use-media';
import type { RouteHandle } from '../route-handle';
import { useCurrentSheet } from './current-sheet';
import { PhoneBar } from './phone-bar';
import { PhoneTop } from './phone-top';
import { Ribbon } from './ribbon';
import { Shortcuts } from './shortcuts';
import { TopBar } from './top-bar';
import { useWorker } from '../use-worker';

/** The frame of every signed-in page: index of sheets, week ribbon, page, and on a phone the bar at the thumb. */
export function AppLayout(): ReactNode {
  const { t } = useTranslation('app');
  const isPhone = useIsPhone();
  const isTask = useIsTask();
  const { isOperatorFrame } = useWorker();
  const main = useRef<HTMLElement>(null);
  useFocusOnMove(main);
  const isBare = isPhone && isTask;
  return (
    <div className={isBare ? 'sheet framed bare' : 'sheet framed'}>
      <SheetTitle />
      <a className="skip btn" href="#page">
        {t('skip')}
      </a>
      {isBare ? null : isPhone ? <PhoneTop /> : <TopBar />}
      {isBare || isOperatorFrame ? null : <Ribbon />}
      <main id="page" tabIndex={-1} ref={main}>
        <Suspense fallback={<Lines />}>
          <Outlet />
        </Suspense>
      </main>
      {isPhone && !isTask ? <PhoneBar /> : null}
      <DoneLine />
      <Shortcuts />
    </div>
  );
}

function useIsTask(): boolean {
  return useMatches().some((match) => (match.handle as RouteHandle | undefined)?.isTask === true);
}

/** The window's title names the sheet; a page may say more with a `<title>` of its own. */
function SheetTitle(): ReactNode {
  const { t } = useTranslation('app');
  const sheet = useCurrentSheet();
  return <title>{sheet === null ? 'Holdwater' : `${t(`sheets.${sheet.id}`)} · Holdwater`}</title>;
}

/** After a move to another page reading goes on at its beginning, as it would with a whole new page. */
function useFocusOnMove(main: RefObject<HTMLElement | null>): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    main.current?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [pathname, main]);
}
