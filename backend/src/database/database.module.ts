import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { models } from './models.js';
import { steadyPg } from './steady-pg.js';

/** Longest a statement may take; below the time-out of a request, so that a person gets an answer. */
const statementTimeoutMs = 15_000;

@Module({
  imports: [
    SequelizeModule.forRootAsync({
      inject: [ENVIRONMENT],
      useFactory: (environment: Environment) => ({
        dialect: 'postgres' as const,
        dialectModule: steadyPg,
        uri: environment.DATABASE_URL,
        models,
        logging: false,
        define: { timestamps: false, underscored: true },
        pool: { max: 12, min: 0, acquire: 20_000, idle: 10_000 },
        dialectOptions: { statement_timeout: statementTimeoutMs, application_name: 'holdwater' },
        retryAttempts: 10,
        retryDelay: 500,
      }),
    }),
  ],
})
export class DatabaseModule {}
