import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/access/actor.js';

/** What a later module does in the same unit of work when a lot changes. */
export interface LotFollower {
  /** Locks what is locked before a lot. Asked before the lot itself is locked. */
  lock(lotIds: readonly string[]): Promise<void>;
  /** The number, the address or the tract's name of these lots is another by now. */
  renamed(lotIds: readonly string[], actor: Actor): Promise<void>;
}

/** Those who follow: they register themselves, since lots know nothing of visits. */
@Injectable()
export class LotFollowers {
  private readonly followers: LotFollower[] = [];

  register(follower: LotFollower): void {
    this.followers.push(follower);
  }

  async lock(lotIds: readonly string[]): Promise<void> {
    for (const follower of this.followers) await follower.lock(lotIds);
  }

  async renamed(lotIds: readonly string[], actor: Actor): Promise<void> {
    for (const follower of this.followers) await follower.renamed(lotIds, actor);
  }
}
