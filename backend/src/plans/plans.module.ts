import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { DepartmentsModule } from '../departments/departments.module.js';
import { LotsModule } from '../lots/lots.module.js';
import { CalcController } from './calc.controller.js';
import { ChoosePlan } from './choose-plan.service.js';
import { PlanGrounds } from './plan-ground.service.js';
import { PlansController } from './plans.controller.js';
import { PlansPresenter } from './plans.presenter.js';
import { PlansQueries } from './plans.queries.js';
import { ReadPlans } from './read-plans.service.js';
import { TestPlanModel } from './test-plan.model.js';

/** What is computed of a house and a rule card, and the method chosen for each test. */
@Module({
  imports: [SequelizeModule.forFeature([TestPlanModel]), DepartmentsModule, LotsModule],
  controllers: [CalcController, PlansController],
  providers: [PlansQueries, PlanGrounds, PlansPresenter, ReadPlans, ChoosePlan],
  exports: [PlansQueries],
})
export class PlansModule {}
