import 'reflect-metadata';
import { Test, type TestingModuleBuilder } from '@nestjs/testing';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { getConnectionToken } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize-typescript';
import { AppModule } from '../app.module.js';
import { appOptions, furnish } from '../app.factory.js';
import { Clock, SettableClock } from '../common/time/clock.js';
import { joinTransactionsByContext } from '../common/unit-of-work/transaction-context.js';
import { type Environment, readEnvironment } from '../config/environment.js';
import { cloneDatabase, type TestDatabase } from './test-database.js';

/** A Tuesday, 9:30 am in Denver: the present of a test unless it sets another. */
export const testNow = '2027-03-02T16:30:00Z';

export interface TestApp {
  app: NestExpressApplication;
  url: string;
  clock: SettableClock;
  db: Sequelize;
  database: TestDatabase;
  environment: Environment;
  get: NestExpressApplication['get'];
  close(): Promise<void>;
}

export interface TestAppOptions {
  /** Share the database of another server of the same test. */
  database?: TestDatabase;
  now?: string;
  environment?: Record<string, string>;
  override?: (builder: TestingModuleBuilder) => TestingModuleBuilder;
}

/** The whole server on a free port of loopback, on a fresh database, with a clock the test sets. */
export async function startTestApp(options: TestAppOptions = {}): Promise<TestApp> {
  joinTransactionsByContext();
  const database = options.database ?? (await cloneDatabase());
  const clock = new SettableClock(new Date(options.now ?? testNow));
  const environment = readEnvironment({
    NODE_ENV: 'test',
    HOLDWATER_MODE: 'demo',
    PORT: '0',
    APP_URL: 'http://127.0.0.1:4310',
    DATABASE_URL: database.appUrl,
    JWT_SECRET: 'a secret of the tests, of no use elsewhere',
    SMTP_URL: 'smtp://127.0.0.1:9',
    MAIL_FROM: 'visits@example.test',
    // the outbox is worked by the test itself, unless it asks for a worker
    ROLE: 'web',
    LOG_LEVEL: 'silent',
    ...options.environment,
  });
  const builder = Test.createTestingModule({ imports: [AppModule.of(environment)] })
    .overrideProvider(Clock)
    .useValue(clock);
  const module = await (options.override?.(builder) ?? builder).compile();
  const app = module.createNestApplication<NestExpressApplication>(appOptions);
  furnish(app, environment);
  await app.listen(0, '127.0.0.1');
  const url = (await app.getUrl()).replace('[::1]', '127.0.0.1');
  return {
    app,
    url,
    clock,
    db: app.get<Sequelize>(getConnectionToken()),
    database,
    environment,
    get: app.get.bind(app),
    close: async () => {
      await app.close();
      if (!options.database) await database.drop();
    },
  };
}
