import { Module } from '@nestjs/common';
import { LotsModule } from '../lots/lots.module.js';
import { LedgerAnchorsQueries } from './ledger-anchors.queries.js';
import { LedgerAnchors } from './ledger-anchors.service.js';
import { LedgerController } from './ledger.controller.js';
import { LedgerQueries } from './ledger.queries.js';
import { LedgerVerifier } from './ledger.verifier.js';

/** Reading and checking the ledger; writing it is `LedgerModule`, which everything uses. */
@Module({
  imports: [LotsModule],
  controllers: [LedgerController],
  providers: [LedgerAnchors, LedgerAnchorsQueries, LedgerQueries, LedgerVerifier],
  exports: [LedgerAnchors, LedgerQueries, LedgerVerifier],
})
export class LedgerReadingModule {}
