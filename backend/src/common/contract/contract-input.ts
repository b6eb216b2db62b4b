import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { RouteContract } from '@holdwater/shared-types/common/route.js';
import type { Request } from 'express';
import { z } from 'zod';
import { AppError } from '../errors/app-error.js';
import { fieldsOf } from '../errors/error-body.js';
import { CONTRACT } from './contract-route.js';
import { codeOfIssue } from './issue-code.js';

/** Faults leave as codes, never as the words of a library. */
const inCodes = { error: codeOfIssue };

/**
 * What the request brought, parsed by the contract of the handler: `{ params, query, body }`. Every fault of the three is told at once;
 * a path that cannot be an address of anything is simply not found.
 */
export const Input = createParamDecorator((_data: unknown, context: ExecutionContext) => {
  const contract = Reflect.getMetadata(CONTRACT, context.getHandler()) as RouteContract;
  const request = context.switchToHttp().getRequest<Request>();
  const params = contract.params?.safeParse(request.params);
  if (params && !params.success) throw new AppError('not-found');
  const query = contract.query?.safeParse(request.query, inCodes);
  const body = contract.body?.safeParse(request.body ?? {}, inCodes);
  const fields = { ...faultsOf(query), ...faultsOf(body) };
  if (Object.keys(fields).length > 0) throw new AppError('bad-input', {}, fields);
  return { params: params?.data, query: query?.data, body: body?.data };
});

function faultsOf(result: z.ZodSafeParseResult<unknown> | undefined): Record<string, string> {
  return result && !result.success ? fieldsOf(result.error) : {};
}
