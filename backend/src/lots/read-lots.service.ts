import { Injectable } from '@nestjs/common';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { listLots, searchLots } from '@holdwater/shared-types/lots/lot.contract.js';
import { type Actor, organizationIds } from '../common/access/actor.js';
import { Clock } from '../common/time/clock.js';
import { LotListQueries } from './lot-list.queries.js';
import { LotsPresenter } from './lots.presenter.js';

const mostFound = 12;

@Injectable()
export class ReadLotsService {
  constructor(
    private readonly lists: LotListQueries,
    private readonly presenter: LotsPresenter,
    private readonly clock: Clock,
  ) {}

  /** The lots the actor may read, by tract and number. */
  async list(actor: Actor, query: RouteInput<typeof listLots>['query']): Promise<RouteAnswer<typeof listLots>> {
    const page = await this.lists.pageLots({ ...query, readerIds: organizationIds(actor), now: this.clock.now() });
    return { items: await this.presenter.presentSummaries(page.items), nextCursor: page.nextCursor };
  }

  /** At most twelve lots of the actor's by number, permit or address. */
  async search(actor: Actor, words: string): Promise<RouteAnswer<typeof searchLots>> {
    const found = await this.lists.searchLots(organizationIds(actor), words, mostFound);
    return {
      items: found.map(({ id, number, tractName, address, permitNumber }) => ({
        id,
        number,
        tractName,
        address,
        permitNumber,
      })),
    };
  }
}
