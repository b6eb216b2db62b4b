import { randomUUID } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Transaction } from 'sequelize';
import { refuse } from '../../common/errors/app-error.js';
import { Clock } from '../../common/time/clock.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';
import { Ledger } from '../../ledger/ledger.service.js';
import { AccountMail } from '../account-mail.service.js';
import { PersonModel } from '../person.model.js';
import { RefreshTokenModel } from '../refresh-token.model.js';
import { SessionModel } from '../session.model.js';
import { hashOfSecret, successorOf } from '../tokens/secrets.js';
import { type OpenedSession, Sessions } from './sessions.service.js';

/** A token just replaced is good for this long: a weak signal and a second tab must not sign people out. */
export const graceSeconds = 60;
/** A session nobody used for this long is over. */
export const idleDays = 14;

type Refusal = 'signed-out' | 'session-reused';

/** Replaces a refresh token by its successor. One that was replaced longer ago was stolen, by whichever of the two holders: the session ends. */
@Injectable()
export class RefreshSession {
  constructor(
    @InjectModel(RefreshTokenModel) private readonly tokens: typeof RefreshTokenModel,
    @InjectModel(SessionModel) private readonly rows: typeof SessionModel,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly sessions: Sessions,
    private readonly mail: AccountMail,
    private readonly ledger: Ledger,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
  ) {}

  /** Throws `signed-out` without a session that goes on, `session-reused` when it ended because a copied token was used. */
  async refresh(token: string | null): Promise<OpenedSession> {
    // a refusal is decided inside and thrown outside: the end of a reused session must stand
    const outcome = token === null ? 'signed-out' : await this.unitOfWork.run(() => this.decide(token));
    return typeof outcome === 'string' ? refuse(outcome) : outcome;
  }

  private async decide(token: string): Promise<OpenedSession | Refusal> {
    const known = await this.tokens.findOne({ where: { tokenHash: hashOfSecret(token) } });
    if (!known) return 'signed-out';
    // two tabs at once wait here for each other
    const session = await this.rows.findByPk(known.sessionId, { lock: Transaction.LOCK.UPDATE, rejectOnEmpty: true });
    if (session.endedAt !== null) return session.endReason === 'reused' ? 'session-reused' : 'signed-out';
    const person = await this.persons.findByPk(session.personId, { rejectOnEmpty: true });
    const now = this.clock.now();
    if (person.isDisabled || session.expiresAt <= now) return 'signed-out';
    await known.reload();
    if (known.replacedAt === null) return this.replace(session, known, token);
    const replacedSeconds = (now.getTime() - known.replacedAt.getTime()) / 1000;
    return replacedSeconds <= graceSeconds
      ? this.sessions.present(session, await this.currentAfter(token))
      : this.endReused(session, person);
  }

  private async replace(
    session: SessionModel,
    current: RefreshTokenModel,
    token: string,
  ): Promise<OpenedSession | Refusal> {
    const now = this.clock.now();
    if (now.getTime() - current.createdAt.getTime() > idleDays * 86_400_000) return 'signed-out';
    const successor = successorOf(token, this.environment.JWT_SECRET);
    await current.update({ replacedAt: now });
    await this.tokens.create({
      id: randomUUID(),
      sessionId: session.id,
      tokenHash: hashOfSecret(successor),
      createdAt: now,
    });
    return this.sessions.present(session, successor);
  }

  /** The token in force that follows from this one: its successor, or the successor's where another tab was quicker by two. */
  private async currentAfter(token: string): Promise<string> {
    const successor = successorOf(token, this.environment.JWT_SECRET);
    const row = await this.tokens.findOne({ where: { tokenHash: hashOfSecret(successor) }, rejectOnEmpty: true });
    return row.replacedAt === null ? successor : this.currentAfter(successor);
  }

  private async endReused(session: SessionModel, person: PersonModel): Promise<Refusal> {
    await this.sessions.end(session.id, 'reused');
    await this.ledger.appendTo(`person:${person.id}`, 'session-reused', { personId: person.id }, null);
    await this.mail.add({ mail: 'session-reused', to: person });
    return 'session-reused';
  }
}
