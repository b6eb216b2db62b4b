import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { readCalendar, readDayBoard, readRun, readWaiting } from '@holdwater/shared-types/visits/calendar.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { Calendars } from './calendars.service.js';
import { Runs } from './runs.service.js';
import { Waiting } from './waiting.service.js';

/** What a person looks at in the morning: the calendar, what waits, the run, the day board. */
@Controller()
export class CalendarController {
  constructor(
    private readonly calendars: Calendars,
    private readonly waiting: Waiting,
    private readonly runs: Runs,
  ) {}

  @ContractRoute(readCalendar, signedIn('own'))
  async readCalendar(@Input() { query }: RouteInput<typeof readCalendar>, @CurrentActor() actor: Actor) {
    return this.calendars.read(actor, query);
  }

  @ContractRoute(readWaiting, signedIn('own'))
  async readWaiting(@Input() { query }: RouteInput<typeof readWaiting>, @CurrentActor() actor: Actor) {
    return this.waiting.read(actor, query.organizationId);
  }

  @ContractRoute(readRun, signedIn('visits.canReadRun'))
  async readRun(@Input() { query }: RouteInput<typeof readRun>, @CurrentActor() actor: Actor) {
    return this.runs.read(actor, query);
  }

  @ContractRoute(readDayBoard, signedIn('visits.canWorkRequests'))
  async readDayBoard(@Input() { params, query }: RouteInput<typeof readDayBoard>, @CurrentActor() actor: Actor) {
    return this.runs.readDayBoard(actor, params.departmentId, query.date);
  }
}
