import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { type Comment, listComments, writeComment } from '@holdwater/shared-types/threads/thread.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { CommentsQueries } from './comments.queries.js';
import { Comments } from './comments.service.js';

@Controller()
export class ThreadsController {
  constructor(
    private readonly lots: LotsQueries,
    private readonly queries: CommentsQueries,
    private readonly comments: Comments,
  ) {}

  @ContractRoute(listComments, signedIn('lots.canReadLot'))
  async list(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof listComments>) {
    const lot = await this.lots.getLotFor(actor, input.params.lotId);
    return this.queries.listComments(lot.id, input.query);
  }

  @ContractRoute(writeComment, signedIn('lots.canComment'))
  write(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof writeComment>): Promise<Comment> {
    return this.comments.write(actor, input.params.lotId, input.body);
  }
}
