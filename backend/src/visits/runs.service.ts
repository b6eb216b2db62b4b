import { Injectable } from '@nestjs/common';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { readDayBoard, readRun } from '@holdwater/shared-types/visits/calendar.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { type Actor, hasRole, isMember } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { DepartmentsQueries } from '../departments/departments.queries.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { BookingQueries } from './booking.queries.js';
import { Lanes } from './lanes.service.js';
import { requireDesk } from './read-visits.service.js';
import { RunStops } from './run-stops.service.js';
import { canReadRun } from './visits.policy.js';
import { VisitsPresenter } from './visits.presenter.js';
import { VisitsQueries } from './visits.queries.js';

type Run = RouteAnswer<typeof readRun>;
type DayBoard = RouteAnswer<typeof readDayBoard>;
type BoardInspector = DayBoard['inspectors'][number];

/** A day as the inspector drives it, and as the desk fills it. */
@Injectable()
export class Runs {
  constructor(
    private readonly departments: DepartmentsQueries,
    private readonly booking: BookingQueries,
    private readonly queries: VisitsQueries,
    private readonly presenter: VisitsPresenter,
    private readonly stops: RunStops,
    private readonly lanes: Lanes,
    private readonly clock: Clock,
  ) {}

  /**
   * The own run of today unless asked for another; a desk that drives none begins with the first inspector's. Throws `not-found` to whoever
   * belongs to no department, or for a person who is no inspector of it, `not-allowed` for a colleague's run unless the desk asks.
   */
  async read(actor: Actor, query: RouteInput<typeof readRun>['query']): Promise<Run> {
    const departmentId = departmentOf(actor, query.departmentId);
    if (!canReadRun(actor, departmentId, query.inspectorId ?? actor.personId)) refuse('not-allowed');
    const inspectors = await this.booking.listInspectors(departmentId);
    const own = inspectors.find(({ id }) => id === (query.inspectorId ?? actor.personId));
    const inspector = own ?? (query.inspectorId === undefined ? inspectors[0] : undefined) ?? refuse('not-found');
    const { zone } = await this.departments.getDepartment(departmentId);
    const now = this.clock.now();
    const today = localDateOf(now, zone);
    const date = query.date ?? today;
    const rows = await this.queries.listRun(departmentId, inspector.id, date);
    const stops = await this.stops.present(actor, rows, date === today);
    return { date, now: now.toISOString(), zone, inspector: { id: inspector.id, name: inspector.name }, stops };
  }

  /** Throws as `requireDesk`. */
  async readDayBoard(actor: Actor, departmentId: string, date: string): Promise<DayBoard> {
    requireDesk(actor, departmentId);
    const { zone } = await this.departments.getDepartment(departmentId);
    const [day] = await this.lanes.readDays(departmentId, { fromDate: date, toDate: date }, true, true);
    const visits = this.presenter.presentRows(actor, await this.queries.listDay(departmentId, date));
    const inspectors = boardOf(await this.booking.listInspectors(departmentId), visits);
    const requests = this.presenter.presentRows(actor, await this.queries.listRequests(departmentId, date));
    return {
      date,
      now: this.clock.now().toISOString(),
      zone,
      day: day ?? { date, isWorkingDay: false, closed: [], windows: [] },
      inspectors,
      requests,
    };
  }
}

function departmentOf(actor: Actor, departmentId: string | undefined): string {
  if (departmentId !== undefined) return isMember(actor, departmentId) ? departmentId : refuse('not-found');
  const own = actor.memberships
    .filter(({ kind }) => kind === 'department')
    .map((membership) => membership.organizationId);
  return (
    own.find((id) => hasRole(actor, id, 'inspector')) ??
    own.find((id) => hasRole(actor, id, 'desk')) ??
    own[0] ??
    refuse('not-found')
  );
}

/** Everyone who can be sent, with or without visits; and who has visits but left since. */
function boardOf(
  inspectors: ReadonlyArray<Omit<BoardInspector, 'visits'>>,
  visits: readonly VisitSummary[],
): BoardInspector[] {
  const left = visits.flatMap(({ inspector }) =>
    inspector && !inspectors.some(({ id }) => id === inspector.id) ? [inspector] : [],
  );
  const former = left.filter(({ id }, index) => left.findIndex((other) => other.id === id) === index);
  return [...inspectors, ...former].map(({ id, name, phone }) => ({
    id,
    name,
    phone,
    visits: visits.filter(({ inspector }) => inspector?.id === id),
  }));
}
