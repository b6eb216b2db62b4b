import { AsyncLocalStorage } from 'node:async_hooks';
import { setTimeout as wait } from 'node:timers/promises';
import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { AppError } from '../errors/app-error.js';
import { sqlStateOf } from '../errors/error-body.js';
import { currentRequest, type RequestContext, requestContext } from '../request/request-context.js';
import { Clock } from '../time/clock.js';

/** Serialization failure and deadlock: the whole work is done again. */
const retriedStates = ['40001', '40P01'];
const mostTries = 5;

interface Running {
  afterCommit: Array<() => void>;
}

type Idempotency = NonNullable<RequestContext['idempotency']>;

/** Carries the stored answer of an earlier, equal request out of the transaction. */
class StoredAnswer extends Error {
  constructor(readonly answer: unknown) {
    super('answered before');
  }
}

/**
 * One transaction: the change, its ledger entry and its event. Everything inside joins it, nested runs too. The work may be done more than
 * once, so it must not mail, queue, write files or talk to sockets: that is for `afterCommit`.
 *
 * Where the request carries an idempotency key, the first answer is stored in the same transaction and given again to an equal request.
 */
@Injectable()
export class UnitOfWork {
  private readonly running = new AsyncLocalStorage<Running>();

  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly clock: Clock,
  ) {}

  async run<T>(work: () => Promise<T>): Promise<T> {
    if (this.running.getStore()) return work();
    for (let tries = 1; ; tries += 1) {
      try {
        return await this.once(work);
      } catch (error) {
        if (error instanceof StoredAnswer) return error.answer as T;
        if (tries >= mostTries || !retriedStates.includes(sqlStateOf(error) ?? '')) throw error;
        await wait(10 * 2 ** tries * Math.random());
      }
    }
  }

  /** Runs once the transaction is there to stay; at once where there is none. */
  afterCommit(work: () => void): void {
    const running = this.running.getStore();
    if (running) running.afterCommit.push(work);
    else requestContext.exit(work);
  }

  private async once<T>(work: () => Promise<T>): Promise<T> {
    const running: Running = { afterCommit: [] };
    const result = await this.running.run(running, () =>
      this.sequelize.transaction(async () => {
        const request = currentRequest();
        const personId = request?.actor?.personId;
        if (!request?.idempotency || !personId) return work();
        await this.claim(personId, request.idempotency);
        const answer = await work();
        await this.store(personId, request.idempotency, answer);
        return answer;
      }),
    );
    // what it wakes outlives the request and is none of it: inside its context, work would be taken for the request sent again
    requestContext.exit(() => {
      for (const act of running.afterCommit) act();
    });
    return result;
  }

  /** Claims the key; an equal request that runs at the same moment waits here for the first one to commit. */
  private async claim(personId: string, { route, key, bodyHash }: Idempotency): Promise<void> {
    const claimed = await this.sequelize.query(
      `INSERT INTO idempotent_answers (person_id, route, key, body_hash, created_at) VALUES (:personId, :route, :key, :bodyHash, :now)
       ON CONFLICT DO NOTHING RETURNING 1`,
      { replacements: { personId, route, key, bodyHash, now: this.clock.now() }, type: QueryTypes.SELECT },
    );
    if (claimed.length > 0) return;
    const [earlier] = await this.sequelize.query<{ body_hash: string; answer: unknown }>(
      'SELECT body_hash, answer FROM idempotent_answers WHERE person_id = :personId AND route = :route AND key = :key',
      { replacements: { personId, route, key }, type: QueryTypes.SELECT },
    );
    if (earlier?.body_hash !== bodyHash) throw new AppError('idempotency-key-reused');
    throw new StoredAnswer(earlier.answer);
  }

  private async store(personId: string, { route, key }: Idempotency, answer: unknown): Promise<void> {
    await this.sequelize.query(
      'UPDATE idempotent_answers SET answer = :answer WHERE person_id = :personId AND route = :route AND key = :key',
      { replacements: { personId, route, key, answer: JSON.stringify(answer ?? null) }, type: QueryTypes.UPDATE },
    );
  }
}
