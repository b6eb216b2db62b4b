import { type DynamicModule, Global, Module } from '@nestjs/common';
import { DiscoveryModule } from '@nestjs/core';
import { AccessCheck } from './access/access.check.js';
import { Changes } from './changes/changes.js';
import { Clock, SystemClock } from './time/clock.js';
import { UnitOfWork } from './unit-of-work/unit-of-work.js';

/** What every module uses and what knows no domain word. */
@Global()
@Module({})
export class CommonModule {
  /** `clock` is another than the system's where the past is told (demo) or the present is set (tests). */
  static with(clock: Clock = new SystemClock()): DynamicModule {
    return {
      module: CommonModule,
      imports: [DiscoveryModule],
      providers: [{ provide: Clock, useValue: clock }, UnitOfWork, Changes, AccessCheck],
      exports: [Clock, UnitOfWork, Changes, AccessCheck],
    };
  }
}
