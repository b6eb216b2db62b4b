import { type CallHandler, type ExecutionContext, Injectable, type NestInterceptor } from '@nestjs/common';
import type { RouteContract } from '@holdwater/shared-types/common/route.js';
import { map, type Observable } from 'rxjs';
import { CONTRACT } from './contract-route.js';

/** Answers leave parsed and stripped by their contract: what it does not name never leaves the server. */
@Injectable()
export class ContractInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    if (context.getType() !== 'http') return next.handle();
    const contract = Reflect.getMetadata(CONTRACT, context.getHandler()) as RouteContract | undefined;
    if (contract === undefined) return next.handle();
    return next.handle().pipe(map((answer) => answerOf(contract, answer)));
  }
}

/** A fault here is ours, not the reader's: it must not look like bad input. */
function answerOf(contract: RouteContract, answer: unknown): unknown {
  const parsed = contract.answer.safeParse(answer);
  if (!parsed.success)
    throw new Error(`${contract.method} ${contract.path} answered against its contract: ${parsed.error.message}`);
  return parsed.data;
}
