import { useMemo, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useLocation, useNavigate } from 'react-router-dom';
import { WeekRibbon } from '../../drawings/week-ribbon';
import { useNow } from '../../lib/clock';
import { addDays, hoursOfDay, localDateOf, workingMondayOf, twoWorkWeeksOf } from '../../lib/local-days';
import { useShownDate, useShownSpan } from '../../lib/shown-date';
import { useTimeWords } from '../../lib/time';
import { useIsPhone } from '../../lib/use-media';
import { sheetsFor } from '../sheets';
import { useWorker } from '../use-worker';
import { ribbonDays, ribbonHours } from './ribbon-days';
import { useRibbonCalendar } from './ribbon-query';
import { WaitingEnd } from './waiting-end';

const deviceZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** The two working weeks over every page, and the only date control. */
export function Ribbon(): ReactNode {
  const { t } = useTranslation('app');
  const words = useTimeWords();
  const isPhone = useIsPhone();
  const now = useNow();
  const span = useShownSpan();
  const [shownDate] = useShownDate();
  const [weeks, setWeeks] = useState({ of: '', moved: 0 });
  const first = workingMondayOf(shownDate ?? localDateOf(now, deviceZone));
  // Weeks walked count from the date shown; another date starts afresh.
  const moved = weeks.of === first ? weeks.moved : 0;
  const dates = useMemo(() => twoWorkWeeksOf(addDays(first, moved * 7)), [first, moved]);
  const { calendar } = useRibbonCalendar(dates);
  const zone = calendar?.zone ?? deviceZone;
  const today = localDateOf(now, zone);
  const hours = ribbonHours(calendar);
  const pick = usePick(span !== null);
  const [from, to] = [dates[0] ?? first, dates[9] ?? first];
  const range = spanWords(from, to, words.dateRange);
  return (
    <nav aria-label={t('weeksName')}>
      <WeekRibbon
        form={isPhone ? 'phone' : 'desk'}
        days={ribbonDays({ dates, calendar, span: span ?? dayOf(shownDate), today, labelOf: words.date })}
        hours={hours}
        nowFraction={fraction(hoursOfDay(now, zone), hours)}
        over={range.over}
        span={range.span}
        end={<WaitingEnd calendar={calendar} />}
        onPick={pick}
        onMove={(by) => setWeeks({ of: first, moved: moved + by })}
      />
    </nav>
  );
}

function dayOf(date: string | null): { from: string; to: string } | null {
  return date === null ? null : { from: date, to: date };
}

function fraction(hour: number, hours: { from: number; to: number }): number | undefined {
  const part = (hour - hours.from) / (hours.to - hours.from);
  return part >= 0 && part <= 1 ? part : undefined;
}

/** The range as the locale writes it, the month over the days where it is one month: "Apr" over "13–24". The place is narrow: no "de". */
function spanWords(
  from: string,
  to: string,
  range: (from: string, to: string) => string,
): { over: string; span: string } {
  const whole = range(from, to).replace(/ de (?=\p{L})/gu, ' ');
  const days = /\d+–\d+/.exec(whole)?.[0];
  if (days !== undefined) return { over: whole.replace(days, '').trim(), span: days };
  const [first = whole, second = ''] = whole.split('–');
  return { over: `${first.trim()}–`, span: second.trim() };
}

/** A day goes to the page below when it is about dates, else to the calendar. */
function usePick(isPageDated: boolean): (date: string) => void {
  const [, show] = useShownDate();
  const navigate = useNavigate();
  const { pathname } = useLocation();
  const sheets = sheetsFor(useWorker());
  return (date) => {
    if (isPageDated || pathname === '/calendar') return show(date);
    const calendar = sheets.find((sheet) => sheet.id === 'calendar');
    if (calendar !== undefined) void navigate(`${calendar.path}?date=${date}`);
  };
}
