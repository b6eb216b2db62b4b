import { randomUUID } from 'node:crypto';
import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op } from 'sequelize';
import { Changes } from '../../common/changes/changes.js';
import { Clock } from '../../common/time/clock.js';
import { presentMe } from '../accounts.presenter.js';
import { AccountsQueries } from '../accounts.queries.js';
import { PersonModel } from '../person.model.js';
import { RefreshTokenModel } from '../refresh-token.model.js';
import { SessionModel } from '../session.model.js';
import { AccessTokens } from '../tokens/access-tokens.js';
import { hashOfSecret, newSecret } from '../tokens/secrets.js';

/** After this a person signs in anew, whatever they did. */
export const sessionDays = 30;

export type SessionEnd = 'signed-out' | 'signed-out-everywhere' | 'reused' | 'password-changed' | 'disabled';

/** What a sign-in gives: the answer for the page, and the cookie beside it. */
export interface OpenedSession {
  answer: Session;
  refreshToken: string;
  expiresAt: Date;
}

/** Opens and ends sessions. Inside the unit of work of the act that does so. */
@Injectable()
export class Sessions {
  constructor(
    @InjectModel(SessionModel) private readonly sessions: typeof SessionModel,
    @InjectModel(RefreshTokenModel) private readonly refreshTokens: typeof RefreshTokenModel,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly queries: AccountsQueries,
    private readonly accessTokens: AccessTokens,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  async open(personId: string): Promise<OpenedSession> {
    const now = this.clock.now();
    const expiresAt = new Date(now.getTime() + sessionDays * 86_400_000);
    const session = await this.sessions.create({
      id: randomUUID(),
      personId,
      createdAt: now,
      expiresAt,
      endedAt: null,
    });
    const refreshToken = newSecret();
    await this.refreshTokens.create({
      id: randomUUID(),
      sessionId: session.id,
      tokenHash: hashOfSecret(refreshToken),
      createdAt: now,
    });
    return this.present(session, refreshToken);
  }

  /** The answer for a session that goes on under `refreshToken`. */
  async present(session: SessionModel, refreshToken: string): Promise<OpenedSession> {
    const person = await this.persons.findByPk(session.personId, { rejectOnEmpty: true });
    const { accessToken, expiresAt } = this.accessTokens.issue(person.id, session.id);
    const me = presentMe(person, await this.queries.listMembershipsOf(person.id));
    return {
      answer: { accessToken, expiresAt: expiresAt.toISOString(), me },
      refreshToken,
      expiresAt: session.expiresAt,
    };
  }

  async end(sessionId: string, endReason: SessionEnd): Promise<void> {
    await this.sessions.update({ endedAt: this.clock.now(), endReason }, { where: { id: sessionId, endedAt: null } });
    this.changes.access({ sessionId });
  }

  async endAllOf(personId: string, endReason: SessionEnd, exceptId: string | null = null): Promise<void> {
    const where = { personId, endedAt: null, ...(exceptId !== null && { id: { [Op.ne]: exceptId } }) };
    await this.sessions.update({ endedAt: this.clock.now(), endReason }, { where });
    this.changes.access({ personId });
  }

  /** Ends the session a refresh token belongs to, if it is one of ours. */
  async endByRefreshToken(token: string | null, endReason: SessionEnd): Promise<void> {
    if (token === null) return;
    const found = await this.refreshTokens.findOne({ where: { tokenHash: hashOfSecret(token) } });
    if (found) await this.end(found.sessionId, endReason);
  }
}
