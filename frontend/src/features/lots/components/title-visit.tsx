import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { useNow } from '../../../lib/clock';
import { localDateOf } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import { VisitActs } from '../../visits/components/visit-acts';
import { useVisitLook } from '../../visits/visit-look';
import type { LotView } from '../lot-view';

export interface TitleVisitProps {
  lot: LotDetail;
  view: LotView;
  /** The open visit of the stage looked at; null for none. */
  visit: VisitSummary | null;
}

/** The visit with its acts; without one, the act that asks for it or why it cannot be asked for. */
export function TitleVisit({ lot, view, visit }: TitleVisitProps): ReactNode {
  const { t } = useTranslation('lots');
  if (visit !== null) return <StandingVisit visit={visit} />;
  const isDone = view.stage?.state === 'clear' || view.stage?.state === 'put-back-due';
  return (
    <div className="title-cell">
      <div className="lab">{t('title.visit')}</div>
      <p className="mid">{t(isDone ? 'title.noVisitNeeded' : 'title.noVisit')}</p>
      {lot.abilities.canRequest && view.stage !== null && !isDone ? (
        <div className="title-acts">
          <Act
            kind="first"
            to={`/calendar?request=${lot.id}&stage=${view.stage.code}`}
            cannotYet={
              lot.openCorrections > 0 ? t('stands.openCorrections', { count: lot.openCorrections }) : undefined
            }
          >
            {t('acts.requestOne')}
          </Act>
        </div>
      ) : null}
    </div>
  );
}

function StandingVisit({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const navigate = useNavigate();
  const now = useNow();
  const look = useVisitLook()(visit, now);
  const { window, zone, inspector, plannedStartAt } = visit;
  const near = words.nearDay(localDateOf(window.startAt, zone), localDateOf(now, zone));
  const span = words.window(window.startAt, window.endAt, zone);
  const who = [
    inspector?.name ?? null,
    plannedStartAt === null ? null : t('title.aboutTime', { time: words.clock(plannedStartAt, zone) }),
  ].filter((one) => one !== null);
  return (
    <div className={`title-visit ${visit.state === 'ready' || visit.state === 'underway' ? 'wash-water' : ''}`}>
      <div className="title-cell">
        <div className="spread">
          <span className="lab">{t(visit.state === 'requested' ? 'title.wished' : 'title.visit')}</span>
          <StateWord state={look.mark} word={look.word} tone={look.tone} />
        </div>
        <div className="h2 visit-when">
          <Numeral
            text={near === null ? words.dayWindow(window.startAt, window.endAt, zone) : `${capital(near)}, ${span}`}
          />
        </div>
        <div className="s mid">
          {who.length > 0 ? <Numeral text={`${who.join(', ')}. `} /> : null}
          {words.zone(zone, window.startAt)}
        </div>
        {visit.upBy !== null && visit.state === 'booked' ? (
          <div className={`s b t-${look.tone ?? 'ink2'}`}>
            <Numeral text={t('title.upBy', { time: words.dayClock(visit.upBy, zone) })} />
          </div>
        ) : null}
        {visit.upSince === null ? null : (
          <div className="s t-water b">
            <Numeral text={t('title.upSince', { time: words.dayClock(visit.upSince, zone) })} />
          </div>
        )}
      </div>
      <VisitActs visit={visit} onMove={() => void navigate(`/calendar?visit=${visit.id}&date=${window.date}`)} />
    </div>
  );
}

const capital = (word: string): string => word.charAt(0).toLocaleUpperCase() + word.slice(1);
