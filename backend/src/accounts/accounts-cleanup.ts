import { Inject, Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { Cron } from '@nestjs/schedule';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Clock } from '../common/time/clock.js';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';

/** Days that what is over is kept, so that a late question is still answered with why. */
const keptDays = 30;

/** In this order: what refers to others goes first. */
const statements = [
  `DELETE FROM sign_in_failures WHERE at < :before`,
  `DELETE FROM idempotent_answers WHERE created_at < :before`,
  `DELETE FROM link_tokens WHERE expires_at < :before`,
  `DELETE FROM refresh_tokens USING sessions s WHERE s.id = session_id AND least(s.expires_at, s.ended_at) < :before`,
  `DELETE FROM sessions WHERE least(expires_at, ended_at) < :before
     AND NOT EXISTS (SELECT 1 FROM refresh_tokens r WHERE r.session_id = sessions.id)`,
];

/** Removes failures, answers kept for repeated requests, links and sessions that are over for good. Doing it twice does nothing more. */
@Injectable()
export class AccountsCleanup {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly clock: Clock,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
  ) {}

  @Cron('40 3 * * *')
  async everyNight(): Promise<void> {
    if (this.environment.ROLE !== 'web') await this.clean();
  }

  async clean(): Promise<void> {
    const before = new Date(this.clock.now().getTime() - keptDays * 86_400_000);
    for (const statement of statements)
      await this.sequelize.query(statement, { replacements: { before }, type: QueryTypes.DELETE });
  }
}
