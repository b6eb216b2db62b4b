import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import { RequestMethod } from '@nestjs/common';
import type { Params } from 'nestjs-pino';
import { errorForLog } from './error-for-log.js';
import type { Environment } from '../../config/environment.js';

/** Structured logs, one line a request, without tokens, cookies or secrets. */
export function loggingParams(environment: Environment): Params {
  return {
    forRoutes: [{ path: '{*path}', method: RequestMethod.ALL }],
    pinoHttp: {
      level: environment.LOG_LEVEL,
      genReqId: () => randomUUID(),
      autoLogging: {
        ignore: (request: IncomingMessage) => request.url === '/api/health' || request.url === '/api/ready',
      },
      redact: {
        paths: [
          'req.headers.authorization',
          'req.headers.cookie',
          'res.headers["set-cookie"]',
          'password',
          '*.password',
          'token',
          '*.token',
          'accessToken',
          '*.accessToken',
          'sealedToken',
          '*.sealedToken',
        ],
        censor: '[redacted]',
      },
      serializers: {
        req: (request: { id: string; method: string; url: string }) => ({
          id: request.id,
          method: request.method,
          // what follows a question mark may hold words of a person
          path: request.url.split('?')[0],
        }),
        err: errorForLog,
        res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      },
    },
  };
}
