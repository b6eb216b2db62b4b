import type { OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { hoursOfDay, minutesOfDay } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import { hoursOn, startOf, type LaneCell } from '../calendar-model';
import { layOutLane, type Placed } from '../lane-layout';
import type { HourScale } from './hour-edge';
import { LaneClosures } from './lane-closures';
import { LaneWindows } from './lane-windows';
import type { GridKeys } from './use-grid-keys';
import { VisitSlip } from './visit-slip';

/** A window on offer, with its place in the list. */
export interface LaneOffer {
  readonly departmentId: string;
  readonly number: number;
  readonly window: OfferedWindow;
  readonly isChosen: boolean;
  readonly onChoose: () => void;
}

export interface LaneCellProps {
  cell: LaneCell;
  date: string;
  isFirst: boolean;
  scale: HourScale;
  /** The page's: lanes of another are drawn at the same instants. */
  zone: string;
  today: string;
  now: Date;
  keys: GridKeys;
  chosenVisitId: string | null;
  offers: readonly LaneOffer[];
  onOpenVisit: (visitId: string) => void;
}

/** A slip keeps two lines of words, px. */
const leastSlipPx = 36;
/** A visit that is not planned yet is drawn this long, hours. */
const unplannedHours = 0.5;

/** One department on one day: windows as brackets, closures hatched, offers dashed, visits as slips at their planned time. */
export function LaneCellView(props: LaneCellProps): ReactNode {
  const { cell, date, scale, zone, today, now } = props;
  const { t } = useTranslation('visits');
  const nowHour = date === today ? minutesOfDay(now, zone) / 60 : null;
  const isNowShown = nowHour !== null && nowHour >= scale.from && nowHour <= scale.to;
  const placed = placeVisits(cell, date, zone, scale);
  return (
    <div
      className="cal-lane"
      role="gridcell"
      data-lane={cell.lane.departmentId}
      aria-label={t('cal.lane', { department: cell.lane.name, count: cell.visits.length })}
      style={{
        height: (scale.to - scale.from) * scale.pxPerHour,
        backgroundSize: `100% ${scale.pxPerHour}px`,
      }}
    >
      {isNowShown ? <div className="cal-gone" style={{ height: (nowHour - scale.from) * scale.pxPerHour }} /> : null}
      <LaneClosures cell={cell} date={date} zone={zone} scale={scale} />
      <LaneWindows cell={cell} date={date} zone={zone} scale={scale} now={now} placed={placed} />
      {cell.lane.zone === zone ? null : <OwnHours {...props} />}
      {props.offers.map((offer) => (
        <OfferBox key={offer.number} offer={offer} {...props} />
      ))}
      <Visits {...props} placed={placed} />
      {isNowShown ? (
        <div
          className={`cal-now ${props.isFirst ? 'first' : ''}`}
          style={{ top: (nowHour - scale.from) * scale.pxPerHour }}
          aria-hidden="true"
        />
      ) : null}
    </div>
  );
}

function placeVisits({ visits }: LaneCell, date: string, zone: string, scale: HourScale): Placed[] {
  const spans = visits.map((visit) => {
    const fromHour = hoursOn(date, startOf(visit), zone);
    const toHour = visit.plannedEndAt === null ? fromHour + unplannedHours : hoursOn(date, visit.plannedEndAt, zone);
    return { id: visit.id, fromHour, toHour };
  });
  return layOutLane(spans, { fromHour: scale.from, pxPerHour: scale.pxPerHour, leastPx: leastSlipPx });
}

function Visits(props: LaneCellProps & { placed: readonly Placed[] }): ReactNode {
  const { cell, date, zone, now, keys, placed, chosenVisitId, onOpenVisit } = props;
  return cell.visits.map((visit) => {
    const box = placed.find((one) => one.id === visit.id);
    if (box === undefined) return null;
    return (
      <div
        key={visit.id}
        className="cal-item"
        data-item={visit.id}
        data-hour={hoursOn(date, startOf(visit), zone)}
        style={{
          top: box.topPx + 1,
          height: box.heightPx,
          left: `calc(4px + (100% - 8px) * ${box.track / box.tracks})`,
          width: `calc((100% - 8px) / ${box.tracks})`,
        }}
      >
        <VisitSlip
          visit={visit}
          now={now}
          isChosen={visit.id === chosenVisitId}
          tabIndex={keys.tabIndexOf(visit.id)}
          onOpen={onOpenVisit}
        />
      </div>
    );
  });
}

function OfferBox({ offer, date, zone, scale }: LaneCellProps & { offer: LaneOffer }): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const from = hoursOn(date, offer.window.startAt, zone);
  const to = hoursOn(date, offer.window.endAt, zone);
  const clock = words.window(offer.window.startAt, offer.window.endAt, zone);
  return (
    <button
      type="button"
      className={`cal-offer ${offer.isChosen ? 'on' : ''}`}
      aria-pressed={offer.isChosen}
      aria-label={t('offer.named', { number: offer.number, day: words.date(date), time: clock })}
      style={{ top: (from - scale.from) * scale.pxPerHour + 18, height: (to - from) * scale.pxPerHour - 24 }}
      onClick={offer.onChoose}
    >
      <span className="b">
        <Numeral text={t('offer.number', { number: offer.number })} />
      </span>
      <span className="xs mid">
        <Numeral text={t('offer.room', { count: offer.window.roomLeft })} />
      </span>
    </button>
  );
}

/** A lane of another zone prints its own hours inside its left edge. */
function OwnHours({ cell, date, scale, zone }: LaneCellProps): ReactNode {
  const ahead = cell.day?.windows[0];
  if (ahead === undefined) return null;
  // Both clocks show the same instant; whole hours between zones of the States.
  const offset = hoursOfDay(ahead.startAt, cell.lane.zone) - hoursOn(date, ahead.startAt, zone);
  return Array.from({ length: scale.to - scale.from }, (_, index) => scale.from + index).map((hour) => (
    <span
      key={hour}
      className="cal-own-hour xs mut"
      style={{ top: (hour - scale.from) * scale.pxPerHour }}
      aria-hidden="true"
    >
      <span className="n">{((hour + offset + 11) % 12) + 1}:00</span>
    </span>
  ));
}
