import { Global, Module } from '@nestjs/common';
import { DiscoveryModule } from '@nestjs/core';
import { AccessCheck } from './access/access.check.js';
import { Changes } from './changes/changes.js';
import { Clock, SystemClock } from './time/clock.js';
import { UnitOfWork } from './unit-of-work/unit-of-work.js';

/** What every module uses and what knows no domain word. */
@Global()
@Module({
  imports: [DiscoveryModule],
  providers: [{ provide: Clock, useClass: SystemClock }, UnitOfWork, Changes, AccessCheck],
  exports: [Clock, UnitOfWork, Changes, AccessCheck],
})
export class CommonModule {}
