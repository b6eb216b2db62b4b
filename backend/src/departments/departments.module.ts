import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { ClosureEffects } from './closure-effects.js';
import { ClosureModel } from './closure.model.js';
import { ClosuresController } from './closures.controller.js';
import { ClosuresQueries } from './closures.queries.js';
import { ClosuresService } from './closures.service.js';
import { DepartmentsController } from './departments.controller.js';
import { DepartmentsQueries } from './departments.queries.js';
import { PublishRuleCardService } from './publish-rule-card.service.js';
import { ReadDepartmentsService } from './read-departments.service.js';
import { RuleCardDraftsService } from './rule-card-drafts.service.js';
import { RuleCardTouchesQueries } from './rule-card-touches.queries.js';
import { RuleCardTouchesService } from './rule-card-touches.service.js';
import { RuleCardModel } from './rule-card.model.js';
import { RuleCardsController } from './rule-cards.controller.js';
import { RuleCardsQueries } from './rule-cards.queries.js';
import { WorkingTimeQueries } from './working-time.queries.js';

/** Departments, their rule cards and closures, and the working time that follows from both. */
@Module({
  imports: [SequelizeModule.forFeature([RuleCardModel, ClosureModel])],
  controllers: [DepartmentsController, RuleCardsController, ClosuresController],
  providers: [
    DepartmentsQueries,
    RuleCardsQueries,
    ClosuresQueries,
    WorkingTimeQueries,
    ClosureEffects,
    ReadDepartmentsService,
    RuleCardDraftsService,
    PublishRuleCardService,
    RuleCardTouchesQueries,
    RuleCardTouchesService,
    ClosuresService,
  ],
  exports: [DepartmentsQueries, RuleCardsQueries, ClosuresQueries, WorkingTimeQueries, ClosureEffects],
})
export class DepartmentsModule {}
