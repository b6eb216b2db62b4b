import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Head, PhoneHead } from '../../../components/head';
import { Lines } from '../../../components/lines';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { useNow } from '../../../lib/clock';
import { localDateOf, nextWeekdayAfter } from '../../../lib/local-days';
import { QueryState } from '../../../lib/query-state';
import { useCoversDates, useShownDate } from '../../../lib/shown-date';
import { useTimeWords } from '../../../lib/time';
import { useIsPhone } from '../../../lib/use-media';
import { dayBoardQuery, type DayBoard } from '../api/day-board';
import { boardCounts, notUpYet } from '../board-model';
import { useCalendarAddress } from '../calendar-address';
import { DayBoardView } from '../components/day-board';
import { NoDepartment } from '../components/no-department';
import { NotUpList } from '../components/not-up-list';
import { PhoneBoard } from '../components/phone-board';
import { StaleStrip } from '../components/stale-strip';
import { VisitPanel } from '../components/visit-panel';
import { useOwnDepartment } from '../use-own-department';
import '../side-panel.css';
import '../board.css';

const deviceZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** The desk's day: the next working day unless the ribbon says another. */
export function DayBoardPage(): ReactNode {
  const department = useOwnDepartment();
  return department === null ? <NoDepartment /> : <Board key={department.id} departmentId={department.id} />;
}

function Board({ departmentId }: { departmentId: string }): ReactNode {
  const isPhone = useIsPhone();
  const now = useNow();
  const { panel, openVisit, close } = useCalendarAddress();
  const [shownDate] = useShownDate();
  const date = shownDate ?? nextWeekdayAfter(localDateOf(now, deviceZone));
  useCoversDates(date, date);
  const query = useQuery(dayBoardQuery(departmentId, date));
  const picked = panel.kind === 'visit' ? panel.visitId : null;
  const notUp = query.data === undefined ? [] : notUpYet(query.data);
  const waiting = <NotUpList visits={notUp} now={now} onOpenVisit={openVisit} />;
  const panelOf =
    picked === null ? null : (
      <VisitPanel key={picked} visitId={picked} placeDate={date} onClose={close}>
        {isPhone ? null : waiting}
      </VisitPanel>
    );
  if (isPhone && panelOf !== null) return panelOf;
  const shown = { now, chosenVisitId: picked, onOpenVisit: openVisit };
  return (
    <div className={isPhone ? '' : 'with-side board-page'}>
      <div className="side-main">
        <BoardHead date={date} board={query.data} isPhone={isPhone} now={now} />
        <StaleStrip
          error={query.data === undefined ? null : query.error}
          readAtMs={query.dataUpdatedAt}
          zone={query.data?.zone ?? 'UTC'}
        />
        <QueryState query={query} loading={<Lines rows={8} hasVessel />}>
          {(board) => (
            <>
              <Unstaffed board={board} />
              {isPhone ? <PhoneBoard {...shown} board={board} /> : <DayBoardView {...shown} board={board} />}
            </>
          )}
        </QueryState>
      </div>
      {isPhone ? null : (panelOf ?? <aside className="side quiet">{waiting}</aside>)}
    </div>
  );
}

interface BoardHeadProps {
  date: string;
  board: DayBoard | undefined;
  isPhone: boolean;
  now: Date;
}

function BoardHead({ date, board, isPhone, now }: BoardHeadProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const near = words.nearDay(date, localDateOf(now, board?.zone ?? deviceZone));
  const label = near === null ? t('board.title') : `${t('board.title')}, ${near}`;
  if (isPhone) return <PhoneHead label={label} title={<Numeral text={words.date(date)} />} />;
  const counts = board === undefined ? null : boardCounts(board);
  return (
    <Head
      label={label}
      title={<Numeral text={words.dateYear(date)} />}
      cells={
        board === undefined || counts === null
          ? []
          : [
              {
                label: t('cal.legend'),
                value: <Numeral text={t('board.of', { some: counts.visits, all: counts.room })} />,
              },
              {
                label: t('board.upNow'),
                value: <Numeral text={t('board.of', { some: counts.up, all: counts.open })} />,
              },
              { label: t('cal.zone'), value: words.zone(board.zone, now) },
            ]
      }
      acts={<Act to="/requests">{t('board.allRequests')}</Act>}
    />
  );
}

/** Nobody can be sent: the people of the department say who inspects. */
function Unstaffed({ board }: { board: DayBoard }): ReactNode {
  const { t } = useTranslation('visits');
  if (board.inspectors.length > 0) return null;
  return (
    <Plain kind="empty" title={t('board.nobodyTitle')} acts={<Act to="/people">{t('board.toPeople')}</Act>}>
      {t('board.nobodyText')}
    </Plain>
  );
}
