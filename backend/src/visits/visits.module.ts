import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { ClearancesModule } from '../clearances/clearances.module.js';
import { DepartmentsModule } from '../departments/departments.module.js';
import { LotsModule } from '../lots/lots.module.js';
import { BookingQueries } from './booking.queries.js';
import { Booking } from './booking.service.js';
import { CalendarEntries } from './calendar-entries.service.js';
import { CalendarController } from './calendar.controller.js';
import { Calendars } from './calendars.service.js';
import { DepartmentWindows } from './department-windows.queries.js';
import { EndVisit } from './end-visit.service.js';
import { FreeByClosure } from './free-by-closure.service.js';
import { FreeNotUp } from './free-not-up.service.js';
import { FullWindows } from './full-windows.service.js';
import { Lanes } from './lanes.service.js';
import { Offers } from './offers.service.js';
import { PlaceVisit } from './place-visit.service.js';
import { ReadVisits } from './read-visits.service.js';
import { RequestVisits } from './request-visits.service.js';
import { RequestedLotsQueries } from './requested-lots.queries.js';
import { RequestedLots } from './requested-lots.service.js';
import { RestoreFreed } from './restore-freed.service.js';
import { RestoredSeat } from './restored-seat.service.js';
import { RunStops } from './run-stops.service.js';
import { Runs } from './runs.service.js';
import { VisitEvents } from './visit-events.service.js';
import { VisitMovesController } from './visit-moves.controller.js';
import { VisitMoves } from './visit-moves.service.js';
import { VisitModel } from './visit.model.js';
import { VisitsController } from './visits.controller.js';
import { VisitsPresenter } from './visits.presenter.js';
import { VisitsQueries } from './visits.queries.js';
import { WaitingQueries } from './waiting.queries.js';
import { Waiting } from './waiting.service.js';

/** Requests, offers, booking and moves of visits; the calendar, runs and the day board that show them. */
@Module({
  imports: [SequelizeModule.forFeature([VisitModel]), DepartmentsModule, LotsModule, ClearancesModule],
  controllers: [VisitsController, VisitMovesController, CalendarController],
  providers: [
    BookingQueries,
    Booking,
    CalendarEntries,
    Calendars,
    DepartmentWindows,
    EndVisit,
    FreeByClosure,
    FreeNotUp,
    FullWindows,
    Lanes,
    Offers,
    PlaceVisit,
    ReadVisits,
    RequestVisits,
    RequestedLotsQueries,
    RequestedLots,
    RestoreFreed,
    RestoredSeat,
    RunStops,
    Runs,
    VisitEvents,
    VisitMoves,
    VisitsPresenter,
    VisitsQueries,
    WaitingQueries,
    Waiting,
  ],
  exports: [CalendarEntries, VisitEvents, VisitMoves, VisitsPresenter, VisitsQueries, FreeNotUp, RestoreFreed],
})
export class VisitsModule {}
