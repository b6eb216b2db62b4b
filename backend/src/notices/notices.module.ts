import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { DeliveryWorker } from './deliver/delivery-worker.service.js';
import { StillConcerned } from './deliver/still-concerned.js';
import { DeliveryModel } from './delivery.model.js';
import { Audiences } from './expand/audiences.service.js';
import { RuleCardNewsQueries } from './expand/rule-card-news.js';
import { EventFactsQueries } from './expand/event-facts.queries.js';
import { ExpandEvent } from './expand/expand-event.service.js';
import { Mailer } from './mail/mailer.js';
import { NoticeModel } from './notice.model.js';
import { NoticesController } from './notices.controller.js';
import { Notices } from './notices.service.js';
import { OutboxEventModel } from './outbox-event.model.js';
import { OutboxWake } from './outbox-wake.service.js';
import { OutboxWorker } from './outbox-worker.service.js';

/** From what happened to who is told: notices on the page, mail with invites. */
@Module({
  imports: [SequelizeModule.forFeature([OutboxEventModel, NoticeModel, DeliveryModel])],
  controllers: [NoticesController],
  providers: [
    Audiences,
    RuleCardNewsQueries,
    DeliveryWorker,
    EventFactsQueries,
    ExpandEvent,
    Mailer,
    Notices,
    OutboxWake,
    OutboxWorker,
    StillConcerned,
  ],
  exports: [OutboxWorker],
})
export class NoticesModule {}
