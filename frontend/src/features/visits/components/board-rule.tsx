import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import type { DayBoard } from '../api/day-board';
import { shareOf, standRequests, type BoardHours, type StandingRequest } from '../board-model';
import { hoursOn } from '../calendar-model';
import type { GridKeys } from './use-grid-keys';

export interface BoardRuleProps {
  board: DayBoard;
  hours: BoardHours;
  keys: GridKeys;
  chosenVisitId: string | null;
  onOpenVisit: (visitId: string) => void;
}

const requestPx = 62;
const percent = (share: number): string => `${share * 100}%`;

/** The day's own rule: hours ticked, windows as brackets with their room, and each request standing on the window it wants. */
export function BoardRule(props: BoardRuleProps): ReactNode {
  const { board, hours } = props;
  const { t } = useTranslation('visits');
  const standing = standRequests(board);
  const levels = Math.max(1, ...standing.map(({ level }) => level + 1));
  const all = Array.from({ length: hours.to - hours.from + 1 }, (_, index) => hours.from + index);
  return (
    <div className="board-row board-rule" role="row" aria-label={t('board.requestsRow', { count: standing.length })}>
      <div className="board-who" role="rowheader">
        <div className="h3">{t('board.requests')}</div>
        <div className="xs mut">{standing.length === 0 ? t('board.noRequests') : t('board.requestsHint')}</div>
      </div>
      <div className="board-lane" role="gridcell" data-lane="requests" style={{ height: levels * requestPx + 54 }}>
        {standing.map((one) => (
          <RequestVessel key={one.visit.id} {...props} standing={one} />
        ))}
        {board.day.windows.map((window) => {
          const left = shareOf(hoursOn(board.date, window.startAt, board.zone), hours);
          const right = shareOf(hoursOn(board.date, window.endAt, board.zone), hours);
          return (
            <span
              key={window.label}
              className={`board-bracket xs ${window.isTakeable ? '' : 'shut'}`}
              style={{ left: percent(left), width: percent(right - left) }}
            >
              <Numeral text={window.roomLeft === 0 ? t('window.full') : t('window.room', { count: window.roomLeft })} />
            </span>
          );
        })}
        {all.map((hour) => (
          <span
            key={hour}
            className="board-hour xs mid"
            style={{ left: percent(shareOf(hour, hours)) }}
            aria-hidden="true"
          >
            <span className="n">{((hour + 11) % 12) + 1}:00</span>
          </span>
        ))}
      </div>
    </div>
  );
}

function RequestVessel({
  standing,
  hours,
  board,
  keys,
  chosenVisitId,
  onOpenVisit,
}: BoardRuleProps & { standing: StandingRequest }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const locale = useLocale();
  const { visit, fromHour, toHour, level } = standing;
  const left = shareOf(fromHour, hours);
  const isOn = visit.id === chosenVisitId;
  const lot = t('common.lot', { number: visit.lotNumber });
  const place = visit.tractName ?? visit.address;
  return (
    <div
      className="board-request"
      data-item={visit.id}
      data-hour={fromHour}
      style={{
        left: percent(left),
        width: percent(shareOf(toHour, hours) - left),
        bottom: 50 + level * requestPx,
        height: requestPx - 4,
      }}
    >
      <button
        type="button"
        className={isOn ? 'on' : ''}
        aria-pressed={isOn}
        tabIndex={keys.tabIndexOf(visit.id)}
        onClick={() => onOpenVisit(visit.id)}
      >
        <Mark name={visit.neededBy === null ? 'requested' : 'waits-on-you'} />
        <span>
          <span className="b">
            <Numeral text={lot} />
          </span>
          <span className="s">{`, ${place}`}</span>
          <span className="xs mid line">
            {visit.neededBy !== null ? (
              <span className="t-brass b">
                <Numeral text={t('board.neededBy', { at: words.dayClock(visit.neededBy, board.zone) })} />
              </span>
            ) : visit.hasFirstPlace ? (
              t('word.firstInLine')
            ) : visit.isRetest ? (
              t('visit.retest')
            ) : (
              localName(visit.stageName, locale)
            )}
          </span>
        </span>
      </button>
    </div>
  );
}
