import { Injectable } from '@nestjs/common';
import { EventEmitter2 } from '@nestjs/event-emitter';
import { UnitOfWork } from '../unit-of-work/unit-of-work.js';

export const changeTopics = ['thread', 'visits', 'plans', 'holds', 'outcomes', 'lot', 'ledger'] as const;
export type ChangeTopic = (typeof changeTopics)[number];

/** What pages that look at a lot should fetch anew. */
export interface LotChange {
  readonly lotId: string;
  readonly topics: readonly ChangeTopic[];
}

export const LOT_CHANGED = 'lot.changed';

/** A person has something new to fetch. */
export interface PersonTold {
  readonly personId: string;
  readonly what: 'notices';
}

export const PERSON_TOLD = 'person.told';

/** What somebody may has changed: a session ended, a membership or its roles are others. */
export type AccessChange = { readonly personId: string } | { readonly sessionId: string };

export const ACCESS_CHANGED = 'access.changed';

/** Tells, once a change is there to stay, whoever listens inside this process; the sockets carry it on. */
@Injectable()
export class Changes {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly events: EventEmitter2,
  ) {}

  lot(lotId: string, ...topics: ChangeTopic[]): void {
    this.unitOfWork.afterCommit(() => this.events.emit(LOT_CHANGED, { lotId, topics } satisfies LotChange));
  }

  access(change: AccessChange): void {
    this.unitOfWork.afterCommit(() => this.events.emit(ACCESS_CHANGED, change));
  }

  person(personId: string, what: PersonTold['what']): void {
    this.unitOfWork.afterCommit(() => this.events.emit(PERSON_TOLD, { personId, what } satisfies PersonTold));
  }
}
