import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { EventEmitter2 } from '@nestjs/event-emitter';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { OutboxEventModel } from './outbox-event.model.js';
import type { OutboxPayloads } from './outbox.kinds.js';

export const OUTBOX_WRITTEN = 'outbox.written';

export interface OutboxSubject {
  lotId?: string | null;
  visitId?: string | null;
  actorId: string | null;
}

/** Writes what happened, in the transaction of the change; notices and mail are made of it after the commit. */
@Injectable()
export class Outbox {
  /** True while past events are made for the demo: nobody is told of them. */
  isMuted = false;

  constructor(
    @InjectModel(OutboxEventModel) private readonly events: typeof OutboxEventModel,
    private readonly clock: Clock,
    private readonly unitOfWork: UnitOfWork,
    private readonly emitter: EventEmitter2,
  ) {}

  async add<K extends keyof OutboxPayloads>(
    kind: K,
    subject: OutboxSubject,
    payload: OutboxPayloads[K],
  ): Promise<void> {
    await this.unitOfWork.run(async () => {
      const at = this.clock.now();
      await this.events.create({
        id: randomUUID(),
        kind,
        lotId: subject.lotId ?? null,
        visitId: subject.visitId ?? null,
        actorId: subject.actorId,
        payload,
        at,
        isMuted: this.isMuted,
        processedAt: this.isMuted ? at : null,
        nextAttemptAt: at,
      });
      this.unitOfWork.afterCommit(() => this.emitter.emit(OUTBOX_WRITTEN));
    });
  }
}
