import { Module } from '@nestjs/common';
import { ClearFactsQueries } from './clear-facts.queries.js';
import { ClearancesQueries } from './clearances.queries.js';
import { ClearancesService } from './clearances.service.js';

/** Plumbing clear: computed from tests, outcomes and corrections. */
@Module({
  providers: [ClearFactsQueries, ClearancesQueries, ClearancesService],
  exports: [ClearancesQueries, ClearancesService],
})
export class ClearancesModule {}
