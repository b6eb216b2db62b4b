import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { PinoLogger } from 'nestjs-pino';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Clock } from '../../common/time/clock.js';
import type { MailFacts } from '../mail/mail-facts.js';
import { Mailer } from '../mail/mailer.js';
import { isFinal, nextAttemptAt } from './retry.rules.js';
import { StillConcerned } from './still-concerned.js';

interface ClaimedDelivery {
  id: string;
  personId: string | null;
  address: string;
  messageId: string;
  attempts: number;
  payload: MailFacts;
}

/** How long a claimed delivery is ours; a process that dies leaves it to another after this. */
const claimMinutes = 2;

/**
 * Sends what is due, one at a time. A delivery is claimed by a conditional update, sent outside any transaction, and only then recorded:
 * a kill between the two may send it again, under the same Message-ID.
 */
@Injectable()
export class DeliveryWorker {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly mailer: Mailer,
    private readonly concerned: StillConcerned,
    private readonly clock: Clock,
    private readonly logger: PinoLogger,
  ) {}

  /** Sends everything that is due now; answers how many were sent. */
  async drain(): Promise<number> {
    for (let sent = 0; ;) {
      const delivery = await this.claim();
      if (delivery === null) return sent;
      if (await this.deliver(delivery)) sent += 1;
    }
  }

  private async deliver(delivery: ClaimedDelivery): Promise<boolean> {
    if (!(await this.concerned.is(delivery.personId, lotIdOf(delivery.payload)))) {
      await this.settle(delivery.id, `state = 'dropped'`, {});
      return false;
    }
    try {
      await this.mailer.send({ messageId: delivery.messageId, address: delivery.address, facts: delivery.payload });
      await this.settle(delivery.id, `state = 'sent', sent_at = :now, last_error = NULL`, {});
      return true;
    } catch (error) {
      await this.fail(delivery, error);
      return false;
    }
  }

  private async fail(delivery: ClaimedDelivery, error: unknown): Promise<void> {
    const lastError = (error instanceof Error ? error.message : String(error)).slice(0, 500);
    const state = isFinal(error, delivery.attempts) ? 'given-up' : 'waiting';
    this.logger.warn({ delivery: delivery.id, attempts: delivery.attempts, state, lastError }, 'mail was not taken');
    await this.settle(delivery.id, 'state = :state, next_attempt_at = :next, last_error = :lastError', {
      state,
      lastError,
      next: nextAttemptAt(this.clock.now(), delivery.attempts),
    });
  }

  /** The oldest due delivery whose calendar entry has no earlier one waiting for the same address. */
  private async claim(): Promise<ClaimedDelivery | null> {
    const now = this.clock.now();
    const until = new Date(now.getTime() + claimMinutes * 60_000);
    const [claimed] = await this.sequelize.query<ClaimedDelivery>(
      `UPDATE deliveries SET claimed_until = :until, attempts = attempts + 1 WHERE id = (
         SELECT d.id FROM deliveries d
         WHERE d.state = 'waiting' AND d.next_attempt_at <= :now AND (d.claimed_until IS NULL OR d.claimed_until <= :now)
           AND NOT EXISTS (SELECT 1 FROM deliveries before WHERE before.order_key = d.order_key AND before.address = d.address
             AND before.state = 'waiting' AND before.position < d.position)
         ORDER BY d.position LIMIT 1 FOR UPDATE SKIP LOCKED)
       RETURNING id, person_id AS "personId", address, message_id AS "messageId", attempts, payload`,
      { replacements: { now, until }, type: QueryTypes.SELECT },
    );
    return claimed ?? null;
  }

  private async settle(id: string, set: string, values: Record<string, unknown>): Promise<void> {
    await this.sequelize.query(`UPDATE deliveries SET ${set}, claimed_until = NULL WHERE id = :id`, {
      replacements: { id, now: this.clock.now(), ...values },
      type: QueryTypes.UPDATE,
    });
  }
}

/** What is said to those who leave a lot, and what takes an entry out of a calendar, asks no more whether they are of it. */
function lotIdOf(facts: MailFacts): string | null {
  if (facts.type === 'lot' && (facts.hasLeft || facts.invite?.method === 'CANCEL')) return null;
  return facts.type === 'lot' && facts.lotId !== '' ? facts.lotId : null;
}
