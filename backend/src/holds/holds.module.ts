import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { ClearancesModule } from '../clearances/clearances.module.js';
import { DepartmentsModule } from '../departments/departments.module.js';
import { LotsModule } from '../lots/lots.module.js';
import { PlansModule } from '../plans/plans.module.js';
import { VisitsModule } from '../visits/visits.module.js';
import { HandedOverTests } from './handed-over-tests.service.js';
import { HoldEnd } from './hold-end.service.js';
import { HoldModel } from './hold.model.js';
import { HoldsController } from './holds.controller.js';
import { HoldsPresenter } from './holds.presenter.js';
import { HoldsQueries } from './holds.queries.js';
import { KeptReadings } from './kept-readings.service.js';
import { LateTestUp } from './late-test-up.service.js';
import { ReadingLog } from './reading-log.service.js';
import { ReadingModel } from './reading.model.js';
import { Readings } from './readings.service.js';
import { StartHold } from './start-hold.service.js';
import { TestDown } from './test-down.service.js';
import { TestUpController } from './test-up.controller.js';
import { TestUpModel } from './test-up.model.js';
import { TestUpStatements } from './test-up-statements.service.js';
import { TestUp } from './test-up.service.js';
import { TestedVisitQueries } from './tested-visit.queries.js';

/** Tests left standing, their readings, and the statement that they are up. */
@Module({
  imports: [
    SequelizeModule.forFeature([HoldModel, ReadingModel, TestUpModel]),
    DepartmentsModule,
    LotsModule,
    PlansModule,
    ClearancesModule,
    VisitsModule,
  ],
  controllers: [HoldsController, TestUpController],
  providers: [
    HoldsQueries,
    TestedVisitQueries,
    HoldsPresenter,
    ReadingLog,
    TestDown,
    HoldEnd,
    HandedOverTests,
    StartHold,
    Readings,
    TestUpStatements,
    KeptReadings,
    LateTestUp,
    TestUp,
  ],
  exports: [HandedOverTests, HoldsPresenter, HoldsQueries, ReadingLog],
})
export class HoldsModule {}
