import type { INestApplication } from '@nestjs/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { Logger } from 'nestjs-pino';
import { SocketAdapter } from './realtime/socket-adapter.js';
import { openRequestContext } from './common/request/request-context.middleware.js';
import { servePage } from './common/page/page.js';
import type { Environment } from './config/environment.js';

/** Longest body taken: a CSV of lots. Everything longer is refused before it is read whole. */
const bodyLimit = '3mb';

/** Options every way of making the application shares. */
export const appOptions = { bufferLogs: true, bodyParser: false } as const;

/** Puts what surrounds the routes in place: logs, headers, body limits, the request's context, the page. */
export function furnish(app: INestApplication, environment: Environment): void {
  const express = app as NestExpressApplication;
  app.useLogger(app.get(Logger));
  express.disable('x-powered-by');
  express.set('trust proxy', environment.TRUSTED_PROXIES);
  servePage(app, environment.STATIC_DIR, environment.APP_URL.startsWith('https:'));
  express.useBodyParser('json', { limit: bodyLimit });
  app.use(openRequestContext);
  app.useWebSocketAdapter(new SocketAdapter(app, environment.DATABASE_URL));
  app.enableShutdownHooks();
}
