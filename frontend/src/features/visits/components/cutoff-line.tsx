import { useEffect, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Dim } from '../../../components/dim';
import { Numeral } from '../../../components/numeral';
import { useNow } from '../../../lib/clock';
import { localDateOf, minutesBetween } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import type { Offers } from '../api/offers';
import '../request.css';

export interface CutoffLineProps {
  offers: Offers;
  /** When the answer came by the clock of this device, ms: the server's clock counts. */
  readAtMs: number;
  /** The cut-off has passed while it was looked at; told once per cut-off, so keep it the same function. */
  onPassed: () => unknown;
}

/** Under a day it waits on the reader. */
const nearMinutes = 24 * 60;
/** When the time left is read aloud, minutes. */
const toldAt = [2, 10, 30] as const;

/** Until when a request counts for the first day still open: the time left, dimensioned. */
export function CutoffLine({ offers, readAtMs, onPassed }: CutoffLineProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const now = serverNow(useNow(5_000), offers.now, readAtMs);
  const { firstDate, cutoffAt, zone } = offers;
  const left = minutesBetween(now, cutoffAt);
  const isPassed = now.getTime() >= Date.parse(cutoffAt);
  useEffect(() => {
    if (isPassed) onPassed();
  }, [isPassed, cutoffAt, onPassed]);
  const today = localDateOf(now, zone);
  const closeDate = localDateOf(cutoffAt, zone);
  const when =
    closeDate === today
      ? t('cutoff.today', { day: words.date(firstDate), time: words.clock(cutoffAt, zone) })
      : t('cutoff.onDay', { day: words.date(firstDate), at: words.dayClock(cutoffAt, zone) });
  const told = toldAt.find((minutes) => left <= minutes);
  return (
    <div className={`cutoff ${left <= nearMinutes ? 'wash-brass' : ''}`}>
      <div className="spread s">
        <span className={left <= nearMinutes ? 'b t-brass' : 'b'}>
          <Numeral text={when} />
        </span>
        <span className="mid nw">
          <Numeral text={t('cutoff.now', { time: words.clock(now, zone) })} />
        </span>
      </div>
      <Dim>{t('cutoff.left', { time: words.duration(left) })}</Dim>
      <span className="hidden-words" aria-live="polite">
        {told === undefined || isPassed ? '' : t('cutoff.told', { time: words.duration(told) })}
      </span>
    </div>
  );
}

/** The server's clock now: what it said when it answered, and the time since. */
export function serverNow(now: Date, said: string, readAtMs: number): Date {
  const sinceMs = Math.max(0, now.getTime() - readAtMs);
  return new Date(Date.parse(said) + sinceMs);
}
