import { Injectable } from '@nestjs/common';
import { refuse } from '../../common/errors/app-error.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { AccountsQueries } from '../accounts.queries.js';
import { Passwords } from '../passwords/passwords.js';
import { type OpenedSession, Sessions } from '../sessions/sessions.service.js';
import { Links } from '../tokens/links.service.js';
import { PersonModel } from '../person.model.js';
import { SignInThrottle } from './sign-in-throttle.js';
import { InjectModel } from '@nestjs/sequelize';

export interface Attempt {
  /** Where it comes from, as the throttle counts it. */
  address: string;
  /** The refresh token of the session this browser had; it ends with the new sign-in. */
  earlierToken: string | null;
}

/** The ways in: password, and mailed link. */
@Injectable()
export class SignIn {
  constructor(
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly queries: AccountsQueries,
    private readonly passwords: Passwords,
    private readonly throttle: SignInThrottle,
    private readonly links: Links,
    private readonly sessions: Sessions,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** Throws `sign-in-failed` with the tries left, `sign-in-throttled`; the same for an address nobody has. */
  async byPassword(email: string, password: string, attempt: Attempt): Promise<OpenedSession> {
    const person = await this.assertRight(email, password, attempt.address);
    return this.open(person.id, attempt);
  }

  /** The person of an address whose password this is. Throws as `byPassword`. */
  async assertRight(email: string, password: string, address: string): Promise<PersonModel> {
    const thisTry = await this.throttle.begin(email, address);
    const person = await this.queries.findPersonByEmail(email);
    const isRight = await this.passwords.isRight(person?.passwordHash ?? null, password);
    if (!person || !isRight || person.isDisabled) return refuse('sign-in-failed', { triesLeft: thisTry.triesLeft });
    await thisTry.forgive();
    return person;
  }

  /** Throws `link-expired`. */
  async byLink(token: string, attempt: Attempt): Promise<OpenedSession> {
    return this.unitOfWork.run(async () => {
      const link = await this.links.take('sign-in', token);
      const person = link.personId === null ? null : await this.persons.findByPk(link.personId);
      if (!person || person.isDisabled) return refuse('link-expired');
      return this.open(person.id, attempt);
    });
  }

  /** A new session; the one this browser had ends. */
  async open(personId: string, { earlierToken }: Attempt): Promise<OpenedSession> {
    return this.unitOfWork.run(async () => {
      await this.sessions.endByRefreshToken(earlierToken, 'signed-out');
      return this.sessions.open(personId);
    });
  }
}
