import { Inject, Injectable, type OnApplicationBootstrap, type OnApplicationShutdown } from '@nestjs/common';
import { OnEvent } from '@nestjs/event-emitter';
import { Interval } from '@nestjs/schedule';
import { PinoLogger } from 'nestjs-pino';
import PgBoss from 'pg-boss';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { outboxQueue, queueSchema } from '../database/queue.js';
import { OUTBOX_WRITTEN } from './outbox.service.js';
import { OutboxWorker } from './outbox-worker.service.js';

/** Nothing waits longer than this, even when every wake was lost. */
const sweepMs = 5_000;

/**
 * Wakes the outbox after a commit, in whichever process works it. The queue carries no data: what is due stands in our own tables, so a
 * lost or repeated wake does no harm.
 */
@Injectable()
export class OutboxWake implements OnApplicationBootstrap, OnApplicationShutdown {
  private readonly boss: PgBoss;
  private isOpen = false;

  constructor(
    @Inject(ENVIRONMENT) private readonly environment: Environment,
    private readonly worker: OutboxWorker,
    private readonly logger: PinoLogger,
  ) {
    this.boss = new PgBoss({
      connectionString: environment.DATABASE_URL,
      schema: queueSchema,
      migrate: false,
      supervise: this.isWorker,
      schedule: false,
      max: 2,
      application_name: 'holdwater queue',
    });
    this.boss.on('error', (error) => this.logger.warn({ err: error }, 'the queue is away; the sweep goes on'));
  }

  private get isWorker(): boolean {
    return this.environment.ROLE !== 'web';
  }

  async onApplicationBootstrap(): Promise<void> {
    await this.boss.start();
    this.isOpen = true;
    if (!this.isWorker) return;
    await this.boss.work(outboxQueue, { pollingIntervalSeconds: 1 }, () => this.worker.drain());
    this.drain();
  }

  async onApplicationShutdown(): Promise<void> {
    this.isOpen = false;
    await this.boss.stop({ graceful: true, wait: true, timeout: 5_000 });
  }

  @OnEvent(OUTBOX_WRITTEN)
  wake(): void {
    if (!this.isOpen) return;
    if (this.isWorker) this.drain();
    else
      void this.boss
        .send(outboxQueue, {})
        .catch((error: unknown) => this.logger.warn({ err: error }, 'wake was not sent'));
  }

  @Interval(sweepMs)
  sweep(): void {
    if (this.isOpen && this.isWorker) this.drain();
  }

  private drain(): void {
    void this.worker
      .drain()
      .catch((error: unknown) => this.logger.warn({ err: error }, 'the outbox waits for the database'));
  }
}
