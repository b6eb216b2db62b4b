import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { requestVisits } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import type { LotRecord } from '../lots/lot-record.js';
import { Booking, type TakenSeat } from './booking.service.js';
import { type DayWindow, stageOf } from './department-windows.queries.js';
import { FullWindows } from './full-windows.service.js';
import { isForVisit } from './offers.service.js';
import { isRetestOf, type LotAsked, refusalOf, unitsOf } from './request.rules.js';
import { type AskedLots, RequestedLots, roleOfSide } from './requested-lots.service.js';
import { VisitEvents } from './visit-events.service.js';
import { VisitModel } from './visit.model.js';
import { VisitMoves } from './visit-moves.service.js';
import { VisitsPresenter } from './visits.presenter.js';

type Answer = RouteAnswer<typeof requestVisits>;
type Wish = RouteInput<typeof requestVisits>['body'];

/** Asks for one window for one or several lots: all of them or none. */
@Injectable()
export class RequestVisits {
  constructor(
    @InjectModel(VisitModel) private readonly visits: typeof VisitModel,
    private readonly requested: RequestedLots,
    private readonly booking: Booking,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly presenter: VisitsPresenter,
    private readonly fullWindows: FullWindows,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  /**
   * Throws what `RequestedLots.getAsked` and `Booking` throw, and of the lots `permit-not-issued`, `corrections-open`, `stage-passed`,
   * `open-visit-exists`. A full window tells the next ones that are not.
   */
  async request(actor: Actor, wish: Wish): Promise<Answer> {
    const offersWish = { lots: wish.lots, stageCode: wish.stageCode };
    return this.fullWindows.telling(actor, offersWish, () => this.unitOfWork.run(() => this.ask(actor, wish)));
  }

  private async ask(actor: Actor, wish: Wish): Promise<Answer> {
    const isForCaller = wish.callerName !== undefined;
    const asked = await this.requested.getAsked(actor, wish.lots, wish.stageCode, { isForCaller, isLocking: true });
    if (asked.side === 'desk' && !isForCaller) refuse('bad-input', {}, { callerName: 'required' });
    const facts = await this.requested.listFacts(asked.records, wish.lots, wish.stageCode);
    const refusal = refusalOf(facts, asked.stage, asked.ruleCard.content);
    if (refusal) refuse(refusal.code, refusal.params);
    const window = await this.booking.lockWindow(asked.department.id, wish.date, wish.label, false);
    if (!isForVisit(window, wish.stageCode, facts.some(isRetestOf)))
      refuse('window-unknown', { label: wish.label }, { label: 'not-for-this-visit' });
    const seats = await this.seatsFor(asked, window);
    const ids: string[] = [];
    for (const [index, lot] of facts.entries()) {
      const record = asked.records[index];
      if (record) ids.push(await this.write(actor, wish, asked, { lot, record, window, seat: seats?.[index] ?? null }));
    }
    return { visits: await this.presenter.presentAll(actor, ids) };
  }

  /** Null where the desk will place them; even then nobody asks for a window that is full. */
  private async seatsFor(
    { department, ruleCard, stage, records }: AskedLots,
    window: DayWindow,
  ): Promise<TakenSeat[] | null> {
    const minutes = (stageOf(window.ruleCard, stage.code) ?? stage).minutesPerVisit;
    const wish = { departmentId: department.id, window, minutes, lots: records };
    if (ruleCard.content.asking.booking === 'self') return this.booking.takeSeats(wish);
    await this.booking.requireRoom(wish);
    return null;
  }

  private async write(
    actor: Actor,
    wish: Wish,
    asked: AskedLots,
    { lot, record, window, seat }: { lot: LotAsked; record: LotRecord; window: DayWindow; seat: TakenSeat | null },
  ): Promise<string> {
    const now = this.clock.now();
    const visit = await this.visits.create({
      id: randomUUID(),
      lotId: record.id,
      departmentId: asked.department.id,
      ruleCardId: window.ruleCard.id,
      stageCode: asked.stage.code,
      unitNumbers: unitsOf(lot),
      state: seat ? 'booked' : 'requested',
      version: 0,
      windowDate: window.date,
      windowLabel: window.label,
      window: [new Date(window.startAt), new Date(window.endAt)],
      ...(seat ?? { place: null, inspectorId: null, planned: null }),
      requestedBy: actor.personId,
      requestingSide: asked.side,
      callerName: wish.callerName ?? null,
      requestedAt: now,
      neededBy: wish.neededBy === undefined ? null : new Date(wish.neededBy),
      note: wish.note ?? null,
      hasFirstPlace: false,
      isRetest: isRetestOf(lot),
      calendarUid: randomUUID(),
      calendarSequence: 0,
      createdAt: now,
    });
    await this.events.requested(visit, { personId: actor.personId, role: roleOfSide(asked.side) });
    await this.moves.afterChange(visit);
    return visit.id;
  }
}
