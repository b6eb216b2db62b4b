import { type CallHandler, type ExecutionContext, Injectable, type NestInterceptor } from '@nestjs/common';
import type { RouteContract } from '@holdwater/shared-types/common/route.js';
import { missingThingOf } from '@holdwater/shared-types/errors/missing-things.js';
import { catchError, map, type Observable, throwError } from 'rxjs';
import { AppError } from '../errors/app-error.js';
import { CONTRACT } from './contract-route.js';

/**
 * Answers leave parsed and stripped by their contract: what it does not name never leaves the server. A 404 leaves with the name of what the
 * route is about, the same for what is missing and for what is another's.
 */
@Injectable()
export class ContractInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    if (context.getType() !== 'http') return next.handle();
    const contract = Reflect.getMetadata(CONTRACT, context.getHandler()) as RouteContract | undefined;
    if (contract === undefined) return next.handle();
    return next.handle().pipe(
      map((answer) => answerOf(contract, answer)),
      catchError((error: unknown) => throwError(() => named(contract, error))),
    );
  }
}

/** A fault here is ours, not the reader's: it must not look like bad input. */
function answerOf(contract: RouteContract, answer: unknown): unknown {
  const parsed = contract.answer.safeParse(answer);
  if (!parsed.success)
    throw new Error(`${contract.method} ${contract.path} answered against its contract: ${parsed.error.message}`);
  return parsed.data;
}

function named(contract: RouteContract, error: unknown): unknown {
  if (!(error instanceof AppError) || error.code !== 'not-found' || 'what' in error.params) return error;
  const what = missingThingOf(contract.path);
  return what === null ? error : new AppError('not-found', { what });
}
