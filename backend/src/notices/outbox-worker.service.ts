import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { PinoLogger } from 'nestjs-pino';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { DeliveryWorker } from './deliver/delivery-worker.service.js';
import { nextAttemptAt } from './deliver/retry.rules.js';
import { ExpandEvent } from './expand/expand-event.service.js';
import { OutboxEventModel } from './outbox-event.model.js';

/**
 * Works what the outbox holds: events become notices and deliveries, due deliveries are sent. Any number of processes may do so at once;
 * each row is one process's at a time.
 */
@Injectable()
export class OutboxWorker {
  private running: Promise<void> | null = null;
  private isAsked = false;

  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    @InjectModel(OutboxEventModel) private readonly events: typeof OutboxEventModel,
    private readonly expanding: ExpandEvent,
    private readonly deliveries: DeliveryWorker,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly logger: PinoLogger,
  ) {}

  /** Works until nothing is due. Asked while it works, it looks once more at the end. */
  drain(): Promise<void> {
    this.isAsked = true;
    this.running ??= this.work().finally(() => {
      this.running = null;
    });
    return this.running;
  }

  private async work(): Promise<void> {
    while (this.isAsked) {
      this.isAsked = false;
      while (await this.expandNext());
      await this.deliveries.drain();
    }
  }

  private async expandNext(): Promise<boolean> {
    let eventId: string | null = null;
    try {
      return await this.unitOfWork.run(async () => {
        eventId = await this.lockNext();
        if (eventId === null) return false;
        const event = await this.events.findByPk(eventId, { rejectOnEmpty: true });
        await this.expanding.expand(event);
        await event.update({ processedAt: this.clock.now() });
        return true;
      });
    } catch (error) {
      this.logger.error({ err: error, event: eventId }, 'an event could not be told yet');
      if (eventId === null) return false;
      await this.postpone(eventId, error);
      return true;
    }
  }

  private async lockNext(): Promise<string | null> {
    const [row] = await this.sequelize.query<{ id: string }>(
      `SELECT id FROM outbox_events WHERE processed_at IS NULL AND next_attempt_at <= :now
       ORDER BY position LIMIT 1 FOR UPDATE SKIP LOCKED`,
      { replacements: { now: this.clock.now() }, type: QueryTypes.SELECT },
    );
    return row?.id ?? null;
  }

  private async postpone(id: string, error: unknown): Promise<void> {
    const event = await this.events.findByPk(id, { rejectOnEmpty: true });
    const attempts = event.attempts + 1;
    const lastError = (error instanceof Error ? error.message : String(error)).slice(0, 500);
    await event.update({ attempts, lastError, nextAttemptAt: nextAttemptAt(this.clock.now(), attempts) });
  }
}
