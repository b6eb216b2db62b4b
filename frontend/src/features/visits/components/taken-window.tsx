import { offeredWindow, type OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { z } from 'zod';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { isApiError } from '../../../lib/api-error';
import { useErrorWords } from '../../../lib/errors';
import { Failed } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { lotsNamed } from '../requested-lots';
import '../offers.css';

const nextBest = z.object({ offers: z.array(offeredWindow) });

/** The next best windows that a refusal carries; none when it is another refusal. */
export function offersIn(error: unknown): OfferedWindow[] {
  if (!isApiError(error, 'window-full')) return [];
  const parsed = nextBest.safeParse(error.params);
  return parsed.success ? parsed.data.offers : [];
}

export interface TakenWindowProps {
  error: unknown;
  zone: string;
  /** The act's words: "Book this". */
  actWord: string;
  busy: boolean;
  onTake: (window: OfferedWindow) => void;
}

/** Why a window was not got; when somebody else was quicker, the next best stands there at once, with an act of its own. */
export function TakenWindow({ error, zone, actWord, busy, onTake }: TakenWindowProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const said = useErrorWords(error);
  if (error === null || error === undefined) return null;
  if (!isApiError(error, 'window-full')) return <RefusedLots error={error} />;
  const [best, ...others] = offersIn(error);
  return (
    <div role="alert" className="taken">
      <Plain kind="taken" level={3} title={said?.title}>
        {said?.safe} {best === undefined ? t('taken.none') : t('taken.best')}
      </Plain>
      {best === undefined ? null : (
        <div className="taken-best">
          <span className="b">
            <Numeral text={words.dayWindow(best.startAt, best.endAt, zone)} />
          </span>
          <Act kind="first" size="sm" busy={busy} onClick={() => onTake(best)}>
            {actWord}
          </Act>
        </div>
      )}
      {others.map((window) => (
        <div key={`${window.date} ${window.label}`} className="taken-other">
          <span>
            <Numeral text={words.dayWindow(window.startAt, window.endAt, zone)} />
          </span>
          <Act size="sm" busy={busy} onClick={() => onTake(window)}>
            {actWord}
          </Act>
        </div>
      ))}
    </div>
  );
}

/** A refusal that names the lots it is about. */
function RefusedLots({ error }: { error: unknown }): ReactNode {
  const { t } = useTranslation('visits');
  const lots = isApiError(error) ? lotsNamed(error.params) : [];
  return (
    <div className="taken">
      <Failed error={error} level={3} />
      {lots.length > 0 ? (
        <p className="s">
          <Numeral text={t('req.namedLots', { lots: lots.join(', '), count: lots.length })} />
        </p>
      ) : null}
    </div>
  );
}
