import { Injectable } from '@nestjs/common';
import { AppError } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { spanOf } from '../common/time/ranges.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import type { LotParties } from '../lots/lots.policy.js';
import { BookingQueries } from './booking.queries.js';
import { Booking, partyIdsOf, type TakenSeat } from './booking.service.js';
import { type DayWindow, DepartmentWindows, keyOf, stageOf } from './department-windows.queries.js';
import type { VisitModel } from './visit.model.js';

/** Whether the window of a freed visit can still be kept, and by whom. Inside a unit of work; locks the department's day. */
@Injectable()
export class RestoredSeat {
  constructor(
    private readonly queries: BookingQueries,
    private readonly booking: Booking,
    private readonly windows: DepartmentWindows,
    private readonly ruleCards: RuleCardsQueries,
    private readonly clock: Clock,
  ) {}

  /** The visit's own place and inspector where both are still free, else any other of its window; null where there is none or it is closed. */
  async find(freed: VisitModel, lot: LotParties): Promise<TakenSeat | null> {
    const { departmentId, windowDate, windowLabel } = freed;
    await this.queries.lockDay(departmentId, windowDate);
    const window = await this.windows.find(departmentId, windowDate, windowLabel);
    if (window === null || window.isClosed) return null;
    return (await this.findOwn(freed, window, lot)) ?? this.findOther(freed, window, lot);
  }

  private async findOwn(freed: VisitModel, window: DayWindow, lot: LotParties): Promise<TakenSeat | null> {
    const { place, inspectorId, planned } = freed;
    if (place === null || inspectorId === null || planned === null || place > window.room) return null;
    const { startAt, endAt } = spanOf(planned);
    if (startAt < this.clock.now() || !(await this.mayBeSent(freed, inspectorId, lot))) return null;
    const taken = await this.queries.listTaken(freed.departmentId, window.date, window.date);
    const isTaken = taken.some((other) => keyOf(other) === keyOf(window) && other.place === place);
    const busy = await this.queries.listBusy([inspectorId], startAt, endAt);
    return isTaken || busy.length > 0 ? null : { place, inspectorId, planned: [startAt, endAt] };
  }

  private async mayBeSent(freed: VisitModel, inspectorId: string, lot: LotParties): Promise<boolean> {
    const inspector = (await this.queries.listInspectors(freed.departmentId)).find(({ id }) => id === inspectorId);
    return inspector !== undefined && !inspector.organizationIds.some((id) => partyIdsOf(lot).includes(id));
  }

  /** Of a window already open only the rest counts. */
  private async findOther(freed: VisitModel, window: DayWindow, lot: LotParties): Promise<TakenSeat | null> {
    const stage = stageOf(await this.ruleCards.getRuleCard(freed.ruleCardId), freed.stageCode);
    if (stage === null) return null;
    const startAt = new Date(Math.max(this.clock.now().getTime(), Date.parse(window.startAt))).toISOString();
    try {
      const [seat] = await this.booking.takeSeats({
        departmentId: freed.departmentId,
        window: { ...window, startAt },
        minutes: stage.minutesPerVisit,
        lots: [lot],
        likedInspectorId: freed.inspectorId,
      });
      return seat ?? null;
    } catch (error) {
      if (error instanceof AppError && error.code === 'window-full') return null;
      throw error;
    }
  }
}
