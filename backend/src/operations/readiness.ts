import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { Sequelize } from 'sequelize-typescript';
import { pendingMigrations } from '../database/migrator.js';

/** Whether this process can serve. */
@Injectable()
export class Readiness {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async check(): Promise<{ status: 'ready' | 'not-ready'; checks: Record<string, string> }> {
    try {
      const pending = await pendingMigrations(this.sequelize);
      const schema = pending.length === 0 ? 'newest' : `waits for ${pending.join(', ')}`;
      return { status: pending.length === 0 ? 'ready' : 'not-ready', checks: { database: 'answers', schema } };
    } catch {
      return { status: 'not-ready', checks: { database: 'does not answer' } };
    }
  }
}
