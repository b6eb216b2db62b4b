import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { EnvironmentError, readEnvironment } from './config/environment.js';
import { joinTransactionsByContext } from './common/unit-of-work/transaction-context.js';
import { appOptions, furnish } from './app.factory.js';
import { AppModule } from './app.module.js';

joinTransactionsByContext();

try {
  const environment = readEnvironment(process.env);
  const app = await NestFactory.create(AppModule.of(environment), appOptions);
  furnish(app, environment);
  await app.listen(environment.PORT, environment.HOST);
  console.log(`Holdwater answers at ${environment.APP_URL}`);
} catch (error) {
  console.error(error instanceof EnvironmentError ? error.message : error);
  process.exit(1);
}
