import { createHmac } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../../common/errors/app-error.js';
import { Clock } from '../../common/time/clock.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';

/** Failures taken for one account from one address within `throttleMinutes`. */
export const mostFailures = 5;
export const throttleMinutes = 15;

/** A try that counts as failed until it is forgiven. */
export interface Try {
  triesLeft: number;
  forgive(): Promise<void>;
}

/**
 * Slows guessing: only failures count, per account and address together, so that nobody is locked out by a stranger elsewhere. A try is
 * counted before the password is looked at, else many at once would all be let through.
 */
@Injectable()
export class SignInThrottle {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
  ) {}

  /** Throws `sign-in-throttled` with the seconds until the next try. */
  async begin(email: string, address: string): Promise<Try> {
    const where = { account: this.hash(email), address: this.hash(address) };
    const earlier = await this.unitOfWork.run(() => this.count(where));
    if (earlier.length >= mostFailures)
      refuse('sign-in-throttled', { retryAfterSeconds: this.secondsUntilFree(earlier) });
    return { triesLeft: mostFailures - earlier.length - 1, forgive: () => this.forget(where) };
  }

  /** Adds this try to the failures unless there are too many; answers the earlier ones, newest last. */
  private async count(where: { account: string; address: string }): Promise<Date[]> {
    const now = this.clock.now();
    const since = new Date(now.getTime() - throttleMinutes * 60_000);
    await this.sequelize.query('SELECT pg_advisory_xact_lock(hashtextextended(:account || :address, 0))', {
      replacements: where,
      type: QueryTypes.SELECT,
    });
    const rows = await this.sequelize.query<{ at: Date }>(
      'SELECT at FROM sign_in_failures WHERE account_hash = :account AND address_hash = :address AND at > :since ORDER BY at',
      { replacements: { ...where, since }, type: QueryTypes.SELECT },
    );
    if (rows.length < mostFailures) {
      await this.sequelize.query(
        'INSERT INTO sign_in_failures (account_hash, address_hash, at) VALUES (:account, :address, :now)',
        {
          replacements: { ...where, now },
          type: QueryTypes.INSERT,
        },
      );
    }
    return rows.map((row) => row.at);
  }

  private async forget(where: { account: string; address: string }): Promise<void> {
    await this.sequelize.query(
      'DELETE FROM sign_in_failures WHERE account_hash = :account AND address_hash = :address',
      {
        replacements: where,
        type: QueryTypes.DELETE,
      },
    );
  }

  private secondsUntilFree(failures: Date[]): number {
    const oldest = failures[failures.length - mostFailures] ?? this.clock.now();
    return Math.max(1, Math.ceil((oldest.getTime() + throttleMinutes * 60_000 - this.clock.now().getTime()) / 1000));
  }

  /** Kept as hashes under the server's secret: the table names nobody. */
  private hash(value: string): string {
    return createHmac('sha256', `holdwater throttle ${this.environment.JWT_SECRET}`).update(value).digest('hex');
  }
}
