import { type DynamicModule, Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_INTERCEPTOR } from '@nestjs/core';
import { EventEmitterModule } from '@nestjs/event-emitter';
import { ScheduleModule } from '@nestjs/schedule';
import { LoggerModule } from 'nestjs-pino';
import { AccessGuard } from './common/access/access.guard.js';
import { CommonModule } from './common/common.module.js';
import { type Clock } from './common/time/clock.js';
import { ContractInterceptor } from './common/contract/contract.interceptor.js';
import { ErrorFilter } from './common/errors/error.filter.js';
import { loggingParams } from './common/logging/logging.js';
import type { Environment } from './config/environment.js';
import { EnvironmentModule } from './config/environment.module.js';
import { DatabaseModule } from './database/database.module.js';
import { LedgerModule } from './ledger/ledger.module.js';
import { OutboxModule } from './notices/outbox.module.js';
import { features } from './features.js';

@Module({})
export class AppModule {
  static of(environment: Environment, clock?: Clock): DynamicModule {
    return {
      module: AppModule,
      imports: [
        EnvironmentModule.of(environment),
        LoggerModule.forRoot(loggingParams(environment)),
        EventEmitterModule.forRoot(),
        ScheduleModule.forRoot(),
        DatabaseModule,
        CommonModule.with(clock),
        LedgerModule,
        OutboxModule,
        ...features,
      ],
      providers: [
        { provide: APP_FILTER, useClass: ErrorFilter },
        { provide: APP_GUARD, useClass: AccessGuard },
        { provide: APP_INTERCEPTOR, useClass: ContractInterceptor },
      ],
    };
  }
}
