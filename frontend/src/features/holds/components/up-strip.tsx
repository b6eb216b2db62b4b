import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Dim } from '../../../components/dim';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useNow } from '../../../lib/clock';
import { minutesBetween } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';

/** The window the tests are for, and how long is left until they must be up. */
export function UpStrip({ visit }: { visit: VisitSummary | null }): ReactNode {
  const { t } = useTranslation('holds');
  const time = useTimeWords();
  const now = useNow();
  if (visit === null) return null;
  const window = time.dayWindow(visit.window.startAt, visit.window.endAt, visit.zone);
  if (visit.state === 'ready' || visit.state === 'underway') {
    const since = visit.upSince === null ? '' : time.dayClock(visit.upSince, visit.zone);
    return (
      <div className="up-strip wash-water row">
        <Mark name={visit.state} size={24} />
        <span>
          <Numeral text={t(`strip.${visit.state}`, { since, window })} />
        </span>
      </div>
    );
  }
  const left = visit.upBy === null ? null : minutesBetween(now, visit.upBy);
  return (
    <div className="up-strip">
      <span>
        <Numeral text={t(visit.state === 'requested' ? 'strip.requested' : 'strip.booked', { window })} />
      </span>
      {visit.upBy === null || left === null ? null : left >= 0 ? (
        <Dim tone={left < 120 ? 'brass' : 'ink'}>
          {t('strip.left', { length: time.duration(left), at: time.clock(visit.upBy, visit.zone) })}
        </Dim>
      ) : (
        <span className="row t-red b">
          <Mark name="past-time" />
          <Numeral text={t('strip.past', { at: time.dayClock(visit.upBy, visit.zone) })} />
        </span>
      )}
    </div>
  );
}
