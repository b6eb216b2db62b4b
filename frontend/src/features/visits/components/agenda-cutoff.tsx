import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Dim } from '../../../components/dim';
import { Numeral } from '../../../components/numeral';
import { localDateOf, minutesBetween } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import type { NextCutoff } from '../next-cutoff';

export interface AgendaCutoffProps {
  cutoff: NextCutoff;
  now: Date;
  /** Whose windows they are, where the agenda shows those of several departments. */
  also: string | undefined;
}

/** Under a day it waits on the reader. */
const nearMinutes = 24 * 60;

/** "closes today 3:00 pm", at the right end of the day's head. */
export function AgendaCloses({ cutoff, now, also }: AgendaCutoffProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const { at, zone } = cutoff;
  const isToday = localDateOf(at, zone) === localDateOf(now, zone);
  const when = isToday
    ? t('agenda.closesToday', { time: words.clock(at, zone) })
    : t('agenda.closes', { at: words.dayClock(at, zone) });
  const isNear = minutesBetween(now, at) <= nearMinutes;
  return (
    <span className={isNear ? 's b t-brass' : 's mid'}>
      <Numeral text={[when, also].filter((part) => part !== undefined).join(', ')} />
    </span>
  );
}

/** The time left to ask for a window of the day, dimensioned. */
export function AgendaTimeLeft({ cutoff, now }: Omit<AgendaCutoffProps, 'also'>): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  return (
    <div className="agenda-left">
      <Dim>{t('cutoff.told', { time: words.duration(minutesBetween(now, cutoff.at)) })}</Dim>
    </div>
  );
}
