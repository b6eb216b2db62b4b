import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { readLotLedger, verifyLotLedger } from '@holdwater/shared-types/ledger/ledger.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { LedgerQueries } from './ledger.queries.js';
import { type ChainVerdict, LedgerVerifier } from './ledger.verifier.js';

@Controller()
export class LedgerController {
  constructor(
    private readonly lots: LotsQueries,
    private readonly queries: LedgerQueries,
    private readonly verifier: LedgerVerifier,
  ) {}

  @ContractRoute(readLotLedger, signedIn('lots.canReadLot'))
  async list(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof readLotLedger>) {
    const lot = await this.lots.getLotFor(actor, input.params.lotId);
    return this.queries.listOfLot(lot.id, input.query);
  }

  @ContractRoute(verifyLotLedger, signedIn('lots.canReadLot'))
  async verify(
    @CurrentActor() actor: Actor,
    @Input() input: RouteInput<typeof verifyLotLedger>,
  ): Promise<ChainVerdict> {
    const lot = await this.lots.getLotFor(actor, input.params.lotId);
    return this.verifier.verify(`lot:${lot.id}`);
  }
}
