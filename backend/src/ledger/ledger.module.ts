import { Global, Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { LedgerEntryModel } from './ledger-entry.model.js';
import { Ledger } from './ledger.service.js';

/** The append-only record; written from everywhere, so given to everyone. */
@Global()
@Module({
  imports: [SequelizeModule.forFeature([LedgerEntryModel])],
  providers: [Ledger],
  exports: [Ledger],
})
export class LedgerModule {}
