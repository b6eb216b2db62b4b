import { Injectable } from '@nestjs/common';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { OfferedWindow, readOffers } from '@holdwater/shared-types/visits/visit.contract.js';
import { Temporal } from 'temporal-polyfill';
import type { Actor } from '../common/access/actor.js';
import { Clock } from '../common/time/clock.js';
import { WorkingTimeQueries } from '../departments/working-time.queries.js';
import type { LotParties } from '../lots/lots.policy.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { BookingQueries, type TakenPlace } from './booking.queries.js';
import { partyIdsOf } from './booking.service.js';
import { type DayWindow, DepartmentWindows, keyOf, stageOf } from './department-windows.queries.js';
import { type BusySpan, type Candidate, seatAll } from './planned-span.js';
import { isRetestOf } from './request.rules.js';
import { RequestedLots } from './requested-lots.service.js';
import { type OpenDays, type WhyNot, whyNotByTime } from './why-not.js';

type OffersAnswer = RouteAnswer<typeof readOffers>;
export type OffersWish = RouteInput<typeof readOffers>['body'];

/** What the windows of some days are judged by. */
interface OfferFacts {
  readonly now: Date;
  readonly openDays: OpenDays;
  readonly stageCode: string;
  readonly lots: readonly LotParties[];
  readonly taken: readonly TakenPlace[];
  /** Null where the desk finds the inspector later. */
  readonly inspectors: readonly Candidate[] | null;
  readonly busy: readonly BusySpan[];
}

/** How many of the next windows a person is told who came too late. */
const nextBestCount = 3;

/** Which windows can be asked for, and why not the others. Books nothing. */
@Injectable()
export class Offers {
  constructor(
    private readonly requested: RequestedLots,
    private readonly windows: DepartmentWindows,
    private readonly workingTime: WorkingTimeQueries,
    private readonly queries: BookingQueries,
    private readonly clock: Clock,
  ) {}

  /** From today to the end of the week the horizon falls in. Throws what `RequestedLots.getAsked` throws. */
  async read(actor: Actor, wish: OffersWish): Promise<OffersAnswer> {
    const now = this.clock.now();
    const { department, ruleCard, records } = await this.requested.getAsked(actor, wish.lots, wish.stageCode);
    const notice = await this.workingTime.noticeFor(department.id, now);
    const isRetest = (await this.requested.listFacts(records, wish.lots, wish.stageCode)).some(isRetestOf);
    const [fromDate, toDate] = [localDateOf(now, department.zone), endOfWeek(notice.lastDate)];
    const windows = (await this.windows.list(department.id, fromDate, toDate)).filter((window) =>
      isForVisit(window, wish.stageCode, isRetest),
    );
    const { asking, readiness } = ruleCard.content;
    const facts = await this.readFacts(department.id, windows, {
      now,
      openDays: notice,
      stageCode: wish.stageCode,
      lots: records,
    });
    return {
      departmentId: department.id,
      departmentName: department.name,
      departmentPhone: department.phone,
      zone: department.zone,
      booking: asking.booking,
      ruleCardVersion: ruleCard.version,
      lotsPerRequest: asking.lotsPerRequest,
      firstDate: notice.firstDate,
      lastDate: notice.lastDate,
      cutoffAt: notice.cutoffAt,
      now: now.toISOString(),
      upByFor: readiness.upBy.kind,
      windows: windows.map((window) => offerOf(window, facts)),
    };
  }

  /** The next windows that still can be taken for the same lots, for whoever came too late. */
  async nextBest(actor: Actor, wish: OffersWish): Promise<OfferedWindow[]> {
    return (await this.read(actor, wish)).windows.filter(({ isTakeable }) => isTakeable).slice(0, nextBestCount);
  }

  private async readFacts(
    departmentId: string,
    windows: readonly DayWindow[],
    base: Pick<OfferFacts, 'now' | 'openDays' | 'stageCode' | 'lots'>,
  ): Promise<OfferFacts> {
    const [first, last] = [windows.at(0), windows.at(-1)];
    if (!first || !last) return { ...base, taken: [], inspectors: null, busy: [] };
    const taken = await this.queries.listTaken(departmentId, first.date, last.date);
    const inspectors = await this.queries.listInspectors(departmentId);
    const busy = await this.queries.listBusy(
      inspectors.map(({ id }) => id),
      new Date(first.startAt),
      new Date(last.endAt),
    );
    return { ...base, taken, inspectors, busy };
  }
}

/** A re-inspection may be kept to some windows, and a version of a later day may not know the stage. */
export function isForVisit(
  { label, ruleCard }: Pick<DayWindow, 'label' | 'ruleCard'>,
  stageCode: string,
  isRetest: boolean,
): boolean {
  const { reinspectionWindows } = ruleCard.content.asking;
  return (
    stageOf(ruleCard, stageCode) !== null &&
    (!isRetest || reinspectionWindows === null || reinspectionWindows.includes(label))
  );
}

function offerOf(window: DayWindow, facts: OfferFacts): OfferedWindow {
  const { date, label, startAt, endAt } = window;
  const roomLeft = roomLeftOf(window, facts.taken);
  const whyNot = whyNotByTime(window, facts.openDays, facts.now) ?? whyNoSeat(window, facts, roomLeft);
  return { date, label, startAt, endAt, roomLeft, isTakeable: whyNot === null, whyNot };
}

export function roomLeftOf(window: DayWindow, taken: readonly TakenPlace[]): number {
  return Math.max(0, window.room - taken.filter((place) => keyOf(place) === keyOf(window)).length);
}

function whyNoSeat(
  window: DayWindow,
  { lots, inspectors, busy, stageCode }: OfferFacts,
  roomLeft: number,
): WhyNot | null {
  if (roomLeft < lots.length) return 'full';
  const minutes = stageOf(window.ruleCard, stageCode)?.minutesPerVisit;
  if (inspectors === null || minutes === undefined || window.ruleCard.content.asking.booking === 'desk') return null;
  const span = { startAt: new Date(window.startAt), endAt: new Date(window.endAt) };
  const near = busy.filter(({ startAt, endAt }) => startAt < span.endAt && endAt > span.startAt);
  return seatAll(span, inspectors, near, minutes, lots.map(partyIdsOf)) ? null : 'no-inspector';
}

function endOfWeek(date: string): string {
  const day = Temporal.PlainDate.from(date);
  return day.add({ days: 7 - day.dayOfWeek }).toString();
}
