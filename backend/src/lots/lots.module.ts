import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { ClearancesModule } from '../clearances/clearances.module.js';
import { DepartmentsModule } from '../departments/departments.module.js';
import { AddLotsService } from './add-lots.service.js';
import { AnswerConsentsService } from './answer-consents.service.js';
import { AskPartiesService } from './ask-parties.service.js';
import { ConsentsController } from './consents.controller.js';
import { ConsentsQueries } from './consents.queries.js';
import { CreateLotService } from './create-lot.service.js';
import { ApplyHouseModelService } from './houses/apply-house-model.service.js';
import { HouseModelVersionModel } from './houses/house-model-version.model.js';
import { HouseModelModel } from './houses/house-model.model.js';
import { HouseModelsController } from './houses/house-models.controller.js';
import { HouseModelsPresenter } from './houses/house-models.presenter.js';
import { HouseModelsQueries } from './houses/house-models.queries.js';
import { HouseModelsService } from './houses/house-models.service.js';
import { RemoveHouseModelService } from './houses/remove-house-model.service.js';
import { UnitHousesQueries } from './houses/unit-houses.queries.js';
import { ImportLotsController } from './import/import-lots.controller.js';
import { ImportLotsService } from './import/import-lots.service.js';
import { LotConsentModel } from './lot-consent.model.js';
import { LotDetailPresenter } from './lot-detail.presenter.js';
import { LotFollowers } from './lot-followers.js';
import { LotListQueries } from './lot-list.queries.js';
import { LotPartiesPresenter } from './lot-parties.presenter.js';
import { LotPartiesQueries } from './lot-parties.queries.js';
import { LotPeopleQueries } from './lot-people.queries.js';
import { LotProgressQueries } from './lot-progress.queries.js';
import { LotUnitModel } from './lot-unit.model.js';
import { LotModel } from './lot.model.js';
import { LotsController } from './lots.controller.js';
import { LotsPresenter } from './lots.presenter.js';
import { LotsQueries } from './lots.queries.js';
import { ReadLotsService } from './read-lots.service.js';
import { TractModel } from './tract.model.js';
import { TractsController } from './tracts.controller.js';
import { TractsQueries } from './tracts.queries.js';
import { TractsService } from './tracts.service.js';
import { UpdateLotService } from './update-lot.service.js';

/** Tracts and lots, the house on each, its parties and their consent. */
@Module({
  imports: [
    SequelizeModule.forFeature([
      LotModel,
      LotUnitModel,
      LotConsentModel,
      TractModel,
      HouseModelModel,
      HouseModelVersionModel,
    ]),
    DepartmentsModule,
    ClearancesModule,
  ],
  controllers: [LotsController, ConsentsController, TractsController, ImportLotsController, HouseModelsController],
  providers: [
    LotsQueries,
    LotFollowers,
    LotListQueries,
    LotPeopleQueries,
    LotPartiesQueries,
    LotProgressQueries,
    ConsentsQueries,
    TractsQueries,
    LotsPresenter,
    LotPartiesPresenter,
    LotDetailPresenter,
    ReadLotsService,
    AddLotsService,
    AskPartiesService,
    AnswerConsentsService,
    CreateLotService,
    UpdateLotService,
    TractsService,
    ImportLotsService,
    HouseModelsQueries,
    UnitHousesQueries,
    HouseModelsPresenter,
    HouseModelsService,
    RemoveHouseModelService,
    ApplyHouseModelService,
  ],
  exports: [ConsentsQueries, LotDetailPresenter, LotFollowers, LotPartiesQueries, LotPeopleQueries, LotsQueries],
})
export class LotsModule {}
