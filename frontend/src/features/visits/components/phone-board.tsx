import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { useTimeWords } from '../../../lib/time';
import { byTime } from '../calendar-model';
import { isGone } from '../visit-look';
import type { DayBoardViewProps } from './day-board';
import { VisitSlip } from './visit-slip';
import '../visit.css';

/** The day board of a phone: requests first, then inspector by inspector. */
export function PhoneBoard({ board, now, onOpenVisit }: DayBoardViewProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  return (
    <>
      <Panel title={t('board.requests')}>
        <div className="slip-stack">
          {board.requests.length === 0 ? <p className="mid">{t('board.noRequests')}</p> : null}
          {board.requests.map((visit) => (
            <VisitSlip
              key={visit.id}
              visit={visit}
              now={now}
              form="phone"
              isFull
              also={words.window(visit.window.startAt, visit.window.endAt, visit.zone)}
              onOpen={onOpenVisit}
            />
          ))}
        </div>
        <ul className="phone-windows s mid">
          {board.day.windows.map((window) => (
            <li key={window.label} className="spread">
              <span>
                <Numeral text={words.window(window.startAt, window.endAt, board.zone)} />
              </span>
              <span>{window.roomLeft === 0 ? t('window.full') : t('window.room', { count: window.roomLeft })}</span>
            </li>
          ))}
        </ul>
      </Panel>
      {board.inspectors.map((inspector) => {
        const visits = inspector.visits.filter((visit) => !isGone(visit)).sort(byTime);
        return (
          <Panel key={inspector.id} title={inspector.name} side={t('board.visits', { count: visits.length })}>
            <div className="slip-stack">
              {visits.length === 0 ? <p className="mid">{t('board.free')}</p> : null}
              {visits.map((visit) => (
                <VisitSlip key={visit.id} visit={visit} now={now} form="phone" isFull onOpen={onOpenVisit} />
              ))}
            </div>
          </Panel>
        );
      })}
    </>
  );
}
