import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import type { DayBoard } from '../api/day-board';
import { shareOf, type BoardHours } from '../board-model';
import { byTime, hoursOn, startOf } from '../calendar-model';
import { isGone, isOpen, useVisitLook } from '../visit-look';
import type { GridKeys } from './use-grid-keys';
import { Phone } from './visit-facts';
import { useVisitName } from './visit-slip';

export interface BoardStripProps {
  inspector: DayBoard['inspectors'][number];
  board: DayBoard;
  hours: BoardHours;
  now: Date;
  keys: GridKeys;
  chosenVisitId: string | null;
  onOpenVisit: (visitId: string) => void;
}

const percent = (share: number): string => `${share * 100}%`;

/** An inspector's day: each visit a vessel as wide as its planned span, filled as its tests stand. */
export function BoardStrip(props: BoardStripProps): ReactNode {
  const { inspector, board, hours } = props;
  const { t } = useTranslation('visits');
  const visits = inspector.visits.filter((visit) => !isGone(visit)).sort(byTime);
  return (
    <div className="board-row" role="row" aria-label={inspector.name}>
      <div className="board-who" role="rowheader">
        <div className="h3">{inspector.name}</div>
        <div className="s mid">
          <Numeral text={t('board.visits', { count: visits.length })} />
        </div>
        <Phone number={inspector.phone} />
      </div>
      <div className="board-lane strip" role="gridcell" data-lane={inspector.id}>
        {board.day.windows.flatMap(({ startAt, endAt, label }) =>
          [startAt, endAt].map((at) => (
            <span
              key={`${label} ${at}`}
              className="board-edge"
              style={{ left: percent(shareOf(hoursOn(board.date, at, board.zone), hours)) }}
              aria-hidden="true"
            />
          )),
        )}
        <span className="board-ground" aria-hidden="true" />
        {visits.map((visit) => (
          <Vessel key={visit.id} {...props} visit={visit} />
        ))}
        {visits.length === 0 ? <span className="board-free s mid">{t('board.free')}</span> : null}
      </div>
    </div>
  );
}

function Vessel({
  visit,
  board,
  hours,
  now,
  keys,
  chosenVisitId,
  onOpenVisit,
}: BoardStripProps & { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation(['common', 'visits']);
  const look = useVisitLook()(visit, now);
  const name = useVisitName()(visit, look.word);
  const from = hoursOn(board.date, startOf(visit), board.zone);
  const to = hoursOn(board.date, visit.plannedEndAt ?? visit.window.endAt, board.zone);
  const left = shareOf(from, hours);
  const isFull = visit.state === 'ready' || visit.state === 'underway';
  return (
    <div
      className="board-visit"
      data-item={visit.id}
      data-hour={from}
      style={{ left: percent(left), width: percent(shareOf(to, hours) - left) }}
    >
      <button
        type="button"
        className={visit.id === chosenVisitId ? 'on' : ''}
        aria-pressed={visit.id === chosenVisitId}
        aria-label={name}
        tabIndex={keys.tabIndexOf(visit.id)}
        onClick={() => onOpenVisit(visit.id)}
      >
        <span className="board-name">
          <span className="b s">
            <Numeral text={t('lot', { number: visit.lotNumber })} />
          </span>
          <span className="xs mid n">{clockOf(from)}</span>
        </span>
        {isOpen(visit) ? (
          <span className={`vessel ${isFull ? 'full' : ''}`}>
            <i style={{ height: `${(isFull ? 1 : look.share) * 86}%` }} />
            {look.waits ? <Mark name={look.waits} size={16} /> : null}
          </span>
        ) : (
          <span className="vessel-tag">
            <Mark name={look.mark} size={28} />
          </span>
        )}
        <span className={`xs board-word t-${look.tone ?? (isFull ? 'water' : 'ink2')}`}>
          {look.mark === 'part-up' ? t('visits.word.partUp') : look.word}
        </span>
      </button>
    </div>
  );
}

/** "9:05": am and pm left out on the day's own rule. */
function clockOf(hour: number): string {
  const minutes = Math.round((hour % 1) * 60);
  return `${((Math.floor(hour) + 11) % 12) + 1}:${String(minutes).padStart(2, '0')}`;
}
