import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { RunRoad } from '../../../drawings/run-road';
import { useTimeWords } from '../../../lib/time';
import type { Run } from '../api/run';
import { hoursOn, startOf } from '../calendar-model';
import { nextStop, runHours, runWindows } from '../run-model';
import { isGone, useVisitLook } from '../visit-look';

/** The day's stops hung on its road. No miles are known yet, so the edge measures hours. */
export function StopRoad({ run, now, onOpen }: { run: Run; now: Date; onOpen: (visitId: string) => void }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const lookOf = useVisitLook();
  const { date, zone, stops } = run;
  const hours = runHours(run);
  const next = nextStop(stops);
  const gone = Math.min(hours.length, Math.max(0, hoursOn(date, now.toISOString(), zone) - hours.from));
  return (
    <RunRoad
      miles={hours.length}
      drivenMiles={gone}
      clock={{
        fromHour: hours.from,
        name: t('run.road', { day: words.date(date) }),
        here: t('run.now', { time: words.clock(now, zone) }),
      }}
      stops={stops.map(({ visit }) => {
        const look = lookOf(visit, now);
        return {
          id: visit.id,
          atMile: Math.min(hours.length, Math.max(0, hoursOn(date, startOf(visit), zone) - hours.from)),
          mark: look.mark,
          name: t('common.lot', { number: visit.lotNumber }),
          // The next stop's place stands in its title block.
          place: visit.id === next?.visit.id ? undefined : (visit.tractName ?? undefined),
          detail: `${words.clock(startOf(visit), zone)}, ${look.word}`,
          isNext: visit.id === next?.visit.id,
          isStruck: isGone(visit),
        };
      })}
      windows={runWindows(stops).map(({ startAt, endAt, firstStop, lastStop }) => ({
        from: words.clock(startAt, zone),
        to: words.clock(endAt, zone),
        firstStop,
        lastStop,
      }))}
      onOpen={onOpen}
    />
  );
}
