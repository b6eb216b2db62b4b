import { applyDecorators, HttpCode, RequestMapping, RequestMethod, SetMetadata } from '@nestjs/common';
import type { RouteContract } from '@holdwater/shared-types/common/route.js';
import { ACCESS, type Access } from '../access/access.js';

export const CONTRACT = 'holdwater:contract';

/** Serves a route by its contract: method, path, status, validation in, stripping out, and who may reach it. */
export function ContractRoute(contract: RouteContract, access: Access): MethodDecorator {
  return applyDecorators(
    RequestMapping({ path: contract.path, method: RequestMethod[contract.method] }),
    HttpCode(contract.status),
    SetMetadata(CONTRACT, contract),
    SetMetadata(ACCESS, access),
  );
}
