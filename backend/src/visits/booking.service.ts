import { Injectable } from '@nestjs/common';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { WorkingTimeQueries } from '../departments/working-time.queries.js';
import type { LotParties } from '../lots/lots.policy.js';
import { BookingQueries } from './booking.queries.js';
import { DepartmentWindows, type DayWindow } from './department-windows.queries.js';
import type { VisitChanges } from './move-consequences.js';
import { type Candidate, firstFreeSeat, freePlaces, type Seat } from './planned-span.js';
import { whyNotByTime } from './why-not.js';

export interface SeatWish {
  readonly departmentId: string;
  readonly window: DayWindow;
  readonly minutes: number;
  /** The parties of every lot that wants a seat, in order. */
  readonly lots: readonly LotParties[];
  /** This inspector and no other. */
  readonly inspectorId?: string;
  /** Asked first where free. */
  readonly likedInspectorId?: string | null;
  /** The visit that moves: its own place and span do not stand in its way. */
  readonly exceptVisitId?: string;
}

export type TakenSeat = Required<Pick<VisitChanges, 'place' | 'inspectorId' | 'planned'>>;

/** Takes places in a window. Inside a unit of work, after `lockWindow`, so that the last room is taken once. */
@Injectable()
export class Booking {
  constructor(
    private readonly queries: BookingQueries,
    private readonly windows: DepartmentWindows,
    private readonly workingTime: WorkingTimeQueries,
    private readonly clock: Clock,
  ) {}

  /**
   * Locks the day and gives the window. Throws `window-unknown`, `window-closed`, `window-past`, and for all but the desk
   * `cut-off-passed` and `beyond-horizon`. Closures are read after the lock: one that is being added waits or is seen.
   */
  async lockWindow(departmentId: string, date: string, label: string, isDesk: boolean): Promise<DayWindow> {
    await this.queries.lockDay(departmentId, date);
    const window =
      (await this.windows.find(departmentId, date, label)) ??
      refuse('window-unknown', { date, label }, { label: 'no-such-window' });
    const now = this.clock.now();
    const notice = isDesk ? null : await this.workingTime.noticeFor(departmentId, now);
    const why = whyNotByTime(window, notice, now);
    if (why === 'closed') refuse('window-closed', await this.closedParams(departmentId, date));
    if (why === 'past') refuse('window-past', { startAt: window.startAt });
    if (why === 'cut-off-passed')
      refuse('cut-off-passed', { firstDate: notice?.firstDate, cutoffAt: notice?.cutoffAt });
    if (why === 'beyond-horizon') refuse('beyond-horizon', { lastDate: notice?.lastDate });
    return window;
  }

  /** Whether the window has room for so many more. Throws `window-full`. */
  async requireRoom({ departmentId, window, lots, exceptVisitId }: SeatWish): Promise<number[]> {
    const taken = await this.queries.listTaken(departmentId, window.date, window.date, exceptVisitId);
    const places = taken.filter(({ label }) => label === window.label).map(({ place }) => place);
    return freePlaces(window.room, places, lots.length) ?? refuse('window-full', { why: 'full', room: window.room });
  }

  /** A place and an inspector's time for every lot. Throws `window-full`, and `bad-input` for an inspector who cannot be sent. */
  async takeSeats(wish: SeatWish): Promise<TakenSeat[]> {
    const places = await this.requireRoom(wish);
    const candidates = await this.candidatesFor(wish);
    const [fromAt, toAt] = [new Date(wish.window.startAt), new Date(wish.window.endAt)];
    const busy = await this.queries.listBusy(
      candidates.map(({ id }) => id),
      fromAt,
      toAt,
      wish.exceptVisitId,
    );
    return wish.lots.map((lot, index) => {
      const seat =
        seatOf(wish, candidates, busy, lot) ??
        refuse('window-full', { why: wish.inspectorId ? 'inspector-busy' : 'no-inspector' });
      busy.push({ inspectorId: seat.inspectorId, ...seat.planned });
      return {
        place: places[index] ?? null,
        inspectorId: seat.inspectorId,
        planned: [seat.planned.startAt, seat.planned.endAt],
      };
    });
  }

  private async candidatesFor(wish: SeatWish): Promise<Candidate[]> {
    const inspectors = await this.queries.listInspectors(wish.departmentId);
    if (wish.inspectorId === undefined) return likedFirst(inspectors, wish.likedInspectorId ?? null);
    const named = inspectors.filter(({ id }) => id === wish.inspectorId);
    const isPartial = named.some(({ organizationIds }) =>
      wish.lots.some((lot) => organizationIds.some((id) => partyIdsOf(lot).includes(id))),
    );
    if (named.length === 0 || isPartial)
      refuse('bad-input', {}, { inspectorId: isPartial ? 'belongs-to-a-party' : 'no-such-inspector' });
    return named;
  }

  private async closedParams(departmentId: string, date: string): Promise<Record<string, unknown>> {
    const { closed } = await this.workingTime.closedOn(departmentId, date);
    return { date, why: closed.map(({ why, holidayCode }) => why || holidayCode).find(Boolean) ?? null };
  }
}

function seatOf(
  wish: SeatWish,
  candidates: readonly Candidate[],
  busy: Parameters<typeof firstFreeSeat>[2],
  lot: LotParties,
): Seat | null {
  const span = { startAt: new Date(wish.window.startAt), endAt: new Date(wish.window.endAt) };
  return firstFreeSeat(span, candidates, busy, wish.minutes, partyIdsOf(lot));
}

/** An inspector who belongs to one of these is not sent. */
export function partyIdsOf({ builderId, plumberId }: LotParties): Array<string | null> {
  return [builderId, plumberId];
}

function likedFirst(inspectors: readonly Candidate[], likedId: string | null): Candidate[] {
  return [...inspectors.filter(({ id }) => id === likedId), ...inspectors.filter(({ id }) => id !== likedId)];
}
