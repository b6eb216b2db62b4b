import { Injectable } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { moveVisit, placeVisit, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { VisitMove } from '@holdwater/shared-types/visits/visit.states.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { isDeskOf, type LotParties } from '../lots/lots.policy.js';
import { Booking, type SeatWish, type TakenSeat } from './booking.service.js';
import { type DayWindow, stageOf } from './department-windows.queries.js';
import { FullWindows } from './full-windows.service.js';
import { isForVisit } from './offers.service.js';
import { actingSide, requireMove } from './require-move.js';
import { beforeOf, VisitEvents } from './visit-events.service.js';
import type { VisitModel } from './visit.model.js';
import { type LockedVisit, VisitMoves } from './visit-moves.service.js';
import { VisitsPresenter } from './visits.presenter.js';
import { VisitsQueries } from './visits.queries.js';

type PlaceWish = RouteInput<typeof placeVisit>['body'];
type MoveWish = RouteInput<typeof moveVisit>['body'];

/** Puts a visit into a window: a request that is placed, a visit that moves. */
@Injectable()
export class PlaceVisit {
  constructor(
    private readonly moves: VisitMoves,
    private readonly booking: Booking,
    private readonly ruleCards: RuleCardsQueries,
    private readonly events: VisitEvents,
    private readonly presenter: VisitsPresenter,
    private readonly queries: VisitsQueries,
    private readonly fullWindows: FullWindows,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** Throws `not-found`, `not-allowed`, `stale-state`, and of the window what `Booking` throws; the desk is bound by no cut-off. */
  async place(actor: Actor, visitId: string, wish: PlaceWish): Promise<VisitSummary> {
    return this.telling(actor, visitId, async () => {
      const locked = await this.lock(actor, visitId, 'place', wish);
      const { visit } = locked;
      const window = await this.booking.lockWindow(visit.departmentId, wish.date, wish.label, true);
      // a request is tested by the version of the day it is placed on; one that was booked before keeps the version it was booked under
      const ruleCardId =
        visit.hasFirstPlace || stageOf(window.ruleCard, visit.stageCode) === null
          ? visit.ruleCardId
          : window.ruleCard.id;
      const seat = await this.seatFor(locked, window, wish);
      const changes = { ...windowChanges(window), ...seat, ruleCardId, endReason: null, endNote: null };
      await this.moves.apply(visit, 'place', { expectedVersion: wish.expectedVersion, changes });
      await this.events.booked(visit, { personId: actor.personId, role: 'desk' });
      return this.presenter.present(actor, visitId);
    });
  }

  /**
   * Another window, for a request another wish. Throws as `place`, and for the requesting side `cut-off-passed` and `beyond-horizon`;
   * `bad-input` where nothing would change or the requesting side names an inspector.
   */
  async move(actor: Actor, visitId: string, wish: MoveWish): Promise<VisitSummary> {
    return this.telling(actor, visitId, async () => {
      const locked = await this.lock(actor, visitId, 'move', wish);
      const { visit, lot } = locked;
      const isDesk = isDeskOf(actor, lot);
      if (wish.inspectorId !== undefined && (!isDesk || visit.state === 'requested'))
        refuse('bad-input', {}, { inspectorId: 'desk-places' });
      if (isSame(visit, wish)) refuse('bad-input', {}, { label: 'same-window' });
      const window = await this.booking.lockWindow(visit.departmentId, wish.date, wish.label, isDesk);
      const isOpenToIt = isDesk || isForVisit(window, visit.stageCode, visit.isRetest);
      if (!isOpenToIt) refuse('window-unknown', { label: wish.label }, { label: 'not-for-this-visit' });
      const before = beforeOf(visit);
      const seat =
        visit.state === 'requested' ? await this.wishFor(locked, window) : await this.seatFor(locked, window, wish);
      const changes = { ...windowChanges(window), ...seat };
      await this.moves.apply(visit, 'move', { expectedVersion: wish.expectedVersion, changes });
      await this.events.moved(visit, before, { personId: actor.personId, role: actingSide(actor, visit, lot) });
      return this.presenter.present(actor, visitId);
    });
  }

  private async lock(
    actor: Actor,
    visitId: string,
    move: VisitMove,
    { expectedVersion }: { expectedVersion: number },
  ): Promise<LockedVisit> {
    const locked = await this.moves.lockVisit(actor, visitId);
    requireMove(actor, move, locked);
    this.moves.requireCurrent(locked.visit, move, expectedVersion);
    return locked;
  }

  private async seatFor(
    { visit, lot }: LockedVisit,
    window: DayWindow,
    wish: { inspectorId?: string | undefined },
  ): Promise<TakenSeat> {
    const own = await this.ruleCards.getRuleCard(visit.ruleCardId);
    const stage = stageOf(own, visit.stageCode) ?? refuse('stage-unknown', { stageCode: visit.stageCode });
    const [seat] = await this.booking.takeSeats({
      ...seatWishOf(visit, lot, window),
      minutes: stage.minutesPerVisit,
      ...(wish.inspectorId !== undefined && { inspectorId: wish.inspectorId }),
      likedInspectorId: visit.inspectorId,
    });
    return seat ?? refuse('window-full', { why: 'full' });
  }

  /** A request takes no seat, but nobody wishes for a window that is full. */
  private async wishFor({ visit, lot }: LockedVisit, window: DayWindow): Promise<object> {
    await this.booking.requireRoom(seatWishOf(visit, lot, window));
    return {};
  }

  private async telling(actor: Actor, visitId: string, book: () => Promise<VisitSummary>): Promise<VisitSummary> {
    const { lotId, unitNumbers, stageCode } = await this.queries.getVisit(visitId);
    return this.fullWindows.telling(actor, { lots: [{ lotId, unitNumbers }], stageCode }, () =>
      this.unitOfWork.run(book),
    );
  }
}

function seatWishOf(visit: VisitModel, lot: LotParties, window: DayWindow): SeatWish {
  return { departmentId: visit.departmentId, window, minutes: 0, lots: [lot], exceptVisitId: visit.id };
}

function windowChanges({ date, label, startAt, endAt }: DayWindow) {
  return { windowDate: date, windowLabel: label, window: [new Date(startAt), new Date(endAt)] as [Date, Date] };
}

function isSame(visit: VisitModel, { date, label, inspectorId }: MoveWish): boolean {
  return (
    visit.windowDate === date &&
    visit.windowLabel === label &&
    (inspectorId === undefined || inspectorId === visit.inspectorId)
  );
}
