import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { ClearancesModule } from '../clearances/clearances.module.js';
import { DepartmentsModule } from '../departments/departments.module.js';
import { HoldsModule } from '../holds/holds.module.js';
import { LotsModule } from '../lots/lots.module.js';
import { VisitsModule } from '../visits/visits.module.js';
import { BeginVisit } from './begin-visit.service.js';
import { CorrectionModel } from './correction.model.js';
import { CorrectionMoves } from './correction-moves.service.js';
import { CorrectionsController } from './corrections.controller.js';
import { CorrectionsQueries } from './corrections.queries.js';
import { Corrections } from './corrections.service.js';
import { NewCorrections } from './new-corrections.service.js';
import { OutcomeModel } from './outcome.model.js';
import { OutcomeSystemModel } from './outcome-system.model.js';
import { OutcomeWorkModel } from './outcome-work.model.js';
import { OutcomeWriter } from './outcome-writer.service.js';
import { OutcomesController } from './outcomes.controller.js';
import { OutcomesQueries } from './outcomes.queries.js';
import { ReadOutcome } from './read-outcome.service.js';
import { RecordOutcome } from './record-outcome.service.js';

/** What visits find, and the corrections that come of it. */
@Module({
  imports: [
    SequelizeModule.forFeature([OutcomeModel, OutcomeSystemModel, OutcomeWorkModel, CorrectionModel]),
    AccountsModule,
    DepartmentsModule,
    LotsModule,
    ClearancesModule,
    VisitsModule,
    HoldsModule,
  ],
  controllers: [OutcomesController, CorrectionsController],
  providers: [
    BeginVisit,
    RecordOutcome,
    ReadOutcome,
    OutcomeWriter,
    OutcomesQueries,
    NewCorrections,
    CorrectionMoves,
    Corrections,
    CorrectionsQueries,
  ],
  exports: [CorrectionsQueries, OutcomesQueries],
})
export class OutcomesModule {}
