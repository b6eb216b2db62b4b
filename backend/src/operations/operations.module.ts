import { Module } from '@nestjs/common';
import { DiscoveryModule } from '@nestjs/core';
import { LedgerReadingModule } from '../ledger/ledger-reading.module.js';
import { DeliveriesQueries } from './deliveries.queries.js';
import { OpenApi } from './openapi.js';
import { OperationsController } from './operations.controller.js';
import { Readiness } from './readiness.js';

/** What an operator and a machine ask: health, readiness, the API's own description, deliveries, the ledger. */
@Module({
  imports: [DiscoveryModule, LedgerReadingModule],
  controllers: [OperationsController],
  providers: [DeliveriesQueries, OpenApi, Readiness],
})
export class OperationsModule {}
