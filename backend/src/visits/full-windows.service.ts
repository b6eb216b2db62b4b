import { Injectable } from '@nestjs/common';
import type { OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { AppError, refuse } from '../common/errors/app-error.js';
import { Offers, type OffersWish } from './offers.service.js';
import { bookTwice } from './seat-taken.js';

/** What happens when somebody else was quicker. */
@Injectable()
export class FullWindows {
  constructor(private readonly offers: Offers) {}

  /**
   * Runs a booking, its whole transaction inside `book`. A seat that another took in the same moment is tried for once more; a window that is
   * full is refused with the next best offers, read after the transaction is over so that nobody waits for them.
   */
  async telling<T>(actor: Actor, wish: OffersWish, book: () => Promise<T>): Promise<T> {
    try {
      return await bookTwice(book);
    } catch (error) {
      if (!(error instanceof AppError) || error.code !== 'window-full') throw error;
      return refuse('window-full', { ...error.params, offers: await this.nextBest(actor, wish) });
    }
  }

  /** Offers are a kindness: who may move a visit but ask for none is told of none. */
  private async nextBest(actor: Actor, wish: OffersWish): Promise<OfferedWindow[]> {
    try {
      return await this.offers.nextBest(actor, wish);
    } catch (error) {
      if (error instanceof AppError) return [];
      throw error;
    }
  }
}
