import { Controller, Get, Header, HttpStatus, Res, SetMetadata } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  health,
  listDeliveries,
  ready,
  retryDelivery,
  verifyLedger,
} from '@holdwater/shared-types/operations/operations.contract.js';
import type { Response } from 'express';
import { ACCESS, anyone, operatorOnly } from '../common/access/access.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { LedgerVerifier } from '../ledger/ledger.verifier.js';
import { DeliveriesQueries } from './deliveries.queries.js';
import { docsPage } from './docs-page.js';
import { OpenApi } from './openapi.js';
import { Readiness } from './readiness.js';

@Controller()
export class OperationsController {
  constructor(
    private readonly readiness: Readiness,
    private readonly openApi: OpenApi,
    private readonly deliveries: DeliveriesQueries,
    private readonly verifier: LedgerVerifier,
  ) {}

  @ContractRoute(health, anyone)
  health(): { status: 'ok' } {
    return { status: 'ok' };
  }

  @ContractRoute(ready, anyone)
  async ready(@Res({ passthrough: true }) response: Response) {
    const answer = await this.readiness.check();
    if (answer.status !== 'ready') response.status(HttpStatus.SERVICE_UNAVAILABLE);
    return answer;
  }

  @Get('/api/openapi.json')
  @SetMetadata(ACCESS, anyone)
  document() {
    return this.openApi.build();
  }

  @Get('/api/docs')
  @SetMetadata(ACCESS, anyone)
  @Header('Content-Type', 'text/html; charset=utf-8')
  docs(@Res({ passthrough: true }) response: Response): string {
    return docsPage(this.openApi.routes(), String(response.locals.nonce));
  }

  @ContractRoute(listDeliveries, operatorOnly)
  listDeliveries(@Input() input: RouteInput<typeof listDeliveries>) {
    return this.deliveries.list(input.query);
  }

  @ContractRoute(retryDelivery, operatorOnly)
  retryDelivery(@Input() input: RouteInput<typeof retryDelivery>) {
    return this.deliveries.retry(input.params.deliveryId);
  }

  @ContractRoute(verifyLedger, operatorOnly)
  verifyLedger() {
    return this.verifier.verifyAll();
  }
}
