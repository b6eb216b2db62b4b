import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { isApiError } from '../../../lib/api-error';
import { useTimeWords } from '../../../lib/time';
import '../side-panel.css';

export interface StaleStripProps {
  /** Of the query shown. */
  error: unknown;
  /** When the last known was read, ms. */
  readAtMs: number;
  zone: string;
  /** What cannot be done meanwhile. */
  children?: ReactNode;
}

/** Over a page whose last reading failed: since when what is shown is known. Nothing when all is well. */
export function StaleStrip({ error, readAtMs, zone, children }: StaleStripProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  if (error === null || error === undefined || readAtMs === 0) return null;
  const time = words.clock(new Date(readAtMs), zone);
  const isOffline = isApiError(error, 'offline');
  return (
    <div className="stale-strip wash-brass" role="status">
      <Mark name={isOffline ? 'no-signal' : 'past-time'} size={24} />
      <div>
        <span className="b">
          <Numeral text={t(isOffline ? 'stale.offline' : 'stale.failed', { time })} />
        </span>
        {children ? <div className="s mid">{children}</div> : null}
      </div>
    </div>
  );
}
