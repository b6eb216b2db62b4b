import { randomUUID } from 'node:crypto';
import { type ArgumentsHost, Catch, type ExceptionFilter } from '@nestjs/common';
import type { Request, Response } from 'express';
import { PinoLogger } from 'nestjs-pino';
import { errorBodyOf } from './error-body.js';

/** Every error leaves in the one shape; what nobody foresaw is logged whole and told by its entry number only. */
@Catch()
export class ErrorFilter implements ExceptionFilter {
  constructor(private readonly logger: PinoLogger) {}

  catch(error: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    const request = http.getRequest<Request & { id?: string }>();
    const response = http.getResponse<Response>();
    const { status, body } = errorBodyOf(error, entryOf(request));
    if (status >= 500) this.logger.error({ err: error, entry: body.entry }, 'request failed');
    if (response.headersSent) return;
    if (body.code === 'sign-in-throttled')
      response.setHeader('Retry-After', `${(body.params?.retryAfterSeconds as number | undefined) ?? 60}`);
    response.status(status).json(body);
  }
}

/** The beginning of the request's id in the log; what failed before it got one, as a body that is no JSON, gets its own. */
function entryOf({ id }: { id?: string }): string {
  return (id ?? randomUUID()).slice(0, 8);
}
