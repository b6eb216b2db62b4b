import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { readCalendar } from '@holdwater/shared-types/visits/calendar.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Temporal } from 'temporal-polyfill';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { type DepartmentRecord, DepartmentsQueries } from '../departments/departments.queries.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { type Lane, Lanes } from './lanes.service.js';
import { readerIdsOf } from './reader.js';
import { VisitsPresenter } from './visits.presenter.js';
import { type DaySpan, VisitsQueries } from './visits.queries.js';

type Calendar = RouteAnswer<typeof readCalendar>;
type Query = RouteInput<typeof readCalendar>['query'];

/** Two months at once, and no more. */
const mostDays = 62;

/** Days, windows and visits of every department the reader has to do with. Of strangers' lots only how much room they take. */
@Injectable()
export class Calendars {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly lanes: Lanes,
    private readonly queries: VisitsQueries,
    private readonly presenter: VisitsPresenter,
    private readonly clock: Clock,
  ) {}

  /** Throws `bad-input` for a span that is none or too long, `not-found` for an organization the reader does not belong to. */
  async read(actor: Actor, { from, to, organizationId }: Query): Promise<Calendar> {
    const span = spanFrom(from, to);
    const readerIds = readerIdsOf(actor, organizationId);
    const now = this.clock.now();
    const departments = await this.departmentsOf(readerIds);
    const inForce = await this.ruleCards.listInForce(
      departments.map(({ id }) => id),
      now,
    );
    const lanes: Lane[] = [];
    for (const department of departments) {
      lanes.push(
        await this.lanes.read(
          department,
          span,
          readerIds.includes(department.id),
          inForce.get(department.id)?.version ?? null,
        ),
      );
    }
    const visits = this.presenter.presentRows(actor, await this.queries.listInSpan(readerIds, span));
    const zone = lanes[0]?.zone ?? 'UTC';
    return { now: now.toISOString(), zone, today: localDateOf(now, zone), lanes, visits };
  }

  /** The own departments first, then those of the reader's lots, the one of most lots first. An outside department has no windows to show. */
  private async departmentsOf(readerIds: readonly string[]): Promise<DepartmentRecord[]> {
    const found = await this.sequelize.query<{ id: string; lots: number }>(
      `SELECT d.id, count(l.id)::int AS lots FROM departments d
       LEFT JOIN lots l ON l.department_id = d.id
         AND (l.builder_id = ANY (ARRAY[:readerIds]::uuid[]) OR l.plumber_id = ANY (ARRAY[:readerIds]::uuid[]))
       WHERE d.id = ANY (ARRAY[:readerIds]::uuid[]) OR l.id IS NOT NULL
       GROUP BY d.id`,
      { replacements: { readerIds: [...readerIds] }, type: QueryTypes.SELECT },
    );
    const isOther = ({ id }: DepartmentRecord) => Number(!readerIds.includes(id));
    const departments = await this.departments.getDepartments(found.map(({ id }) => id));
    const lotsOf = new Map(found.map(({ id, lots }) => [id, lots]));
    const fewerLots = (a: DepartmentRecord, b: DepartmentRecord) => (lotsOf.get(b.id) ?? 0) - (lotsOf.get(a.id) ?? 0);
    return [...departments.values()]
      .filter((department) => !department.isOutside || !isOther(department))
      .sort((a, b) => isOther(a) - isOther(b) || fewerLots(a, b) || a.name.localeCompare(b.name));
  }
}

function spanFrom(from: string, to: string): DaySpan {
  if (to < from) refuse('bad-input', {}, { to: 'ends-before-it-starts' });
  const { days } = Temporal.PlainDate.from(from).until(Temporal.PlainDate.from(to));
  if (days >= mostDays) refuse('bad-input', { mostDays }, { to: 'too-long' });
  return { fromDate: from, toDate: to };
}
