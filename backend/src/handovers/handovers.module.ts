import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { HoldsModule } from '../holds/holds.module.js';
import { LedgerReadingModule } from '../ledger/ledger-reading.module.js';
import { LotConsentModel } from '../lots/lot-consent.model.js';
import { LotModel } from '../lots/lot.model.js';
import { LotsModule } from '../lots/lots.module.js';
import { VisitsModule } from '../visits/visits.module.js';
import { AnswerHandover } from './answer-handover.service.js';
import { AskHandover } from './ask-handover.service.js';
import { HandOver } from './hand-over.service.js';
import { HandoversController } from './handovers.controller.js';
import { PastLots } from './past-lots.service.js';
import { PastPartyModel } from './past-party.model.js';

/** One plumber or builder of a lot in the place of another, and what the one replaced keeps to read. */
@Module({
  imports: [
    SequelizeModule.forFeature([LotConsentModel, LotModel, PastPartyModel]),
    LotsModule,
    VisitsModule,
    HoldsModule,
    LedgerReadingModule,
  ],
  controllers: [HandoversController],
  providers: [AnswerHandover, AskHandover, HandOver, PastLots],
})
export class HandoversModule {}
