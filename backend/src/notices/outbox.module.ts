import { Global, Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { OutboxEventModel } from './outbox-event.model.js';
import { Outbox } from './outbox.service.js';

/** Where events are written; every module that changes something writes here. */
@Global()
@Module({ imports: [SequelizeModule.forFeature([OutboxEventModel])], providers: [Outbox], exports: [Outbox] })
export class OutboxModule {}
