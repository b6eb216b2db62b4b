import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Count } from '../../../components/count';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { StateWord } from '../../../components/state-word';
import { useTimeWords } from '../../../lib/time';
import { useVisitLook } from '../visit-look';

export interface NotUpListProps {
  visits: readonly VisitSummary[];
  now: Date;
  onOpenVisit: (visitId: string) => void;
}

/** Booked visits of the day whose tests do not stand yet, and by when they must. */
export function NotUpList({ visits, now, onOpenVisit }: NotUpListProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const lookOf = useVisitLook();
  return (
    <Panel title={t('board.notUp')} side={<Count value={visits.length} />} isFlush>
      {visits.length === 0 ? <p className="side-part mid">{t('board.allUp')}</p> : null}
      <ul className="not-up">
        {visits.map((visit) => {
          const look = lookOf(visit, now);
          return (
            <li key={visit.id}>
              <button type="button" className="link-act" onClick={() => onOpenVisit(visit.id)}>
                <Numeral text={t('common.lot', { number: visit.lotNumber })} />
              </button>{' '}
              <StateWord state={look.waits ?? look.mark} word={look.word} tone={look.tone} />
              <div className="s mid">
                {[
                  visit.plumberName,
                  visit.upBy === null ? null : t('board.by', { at: words.dayClock(visit.upBy, visit.zone) }),
                ]
                  .filter((part) => part !== null)
                  .join(', ')}
              </div>
            </li>
          );
        })}
      </ul>
    </Panel>
  );
}
