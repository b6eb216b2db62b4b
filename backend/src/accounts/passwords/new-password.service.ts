import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Actor } from '../../common/access/actor.js';
import { AppError, refuse } from '../../common/errors/app-error.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../../ledger/ledger.service.js';
import { AccountMail } from '../account-mail.service.js';
import { PersonModel } from '../person.model.js';
import { type OpenedSession, Sessions } from '../sessions/sessions.service.js';
import { type Attempt, SignIn } from '../sign-in/sign-in.service.js';
import { Links } from '../tokens/links.service.js';
import { assertPassword } from './password-rules.js';
import { Passwords } from './passwords.js';

/** Setting another password. Every other session ends, links mailed before are void, and the person is told by mail. */
@Injectable()
export class NewPassword {
  constructor(
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly passwords: Passwords,
    private readonly signIn: SignIn,
    private readonly links: Links,
    private readonly sessions: Sessions,
    private readonly mail: AccountMail,
    private readonly ledger: Ledger,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** By a mailed link. Throws `link-expired`, `password-common`; a password refused leaves the link good. */
  async reset(token: string, password: string, attempt: Attempt): Promise<OpenedSession> {
    const { personId } = await this.links.getGood('reset', token);
    const person = personId === null ? null : await this.persons.findByPk(personId);
    if (!person || person.isDisabled) return refuse('link-expired');
    const passwordHash = await this.passwords.hash(assertPassword(password, person.email));
    return this.unitOfWork.run(async () => {
      await this.links.take('reset', token);
      await this.set(person, passwordHash, null);
      return this.signIn.open(person.id, attempt);
    });
  }

  /** By whoever is signed in and knows the one in force; this session goes on. */
  async change(actor: Actor, currentPassword: string, password: string, address: string): Promise<void> {
    const person = await this.persons.findByPk(actor.personId, { rejectOnEmpty: true });
    const good = assertPassword(password, person.email);
    await this.assertCurrent(person, currentPassword, address);
    const passwordHash = await this.passwords.hash(good);
    await this.unitOfWork.run(() => this.set(person, passwordHash, actor.sessionId));
  }

  /** Whoever finds a page left open may not guess here either. The refusal is one of the form: the session goes on. */
  private async assertCurrent(person: PersonModel, currentPassword: string, address: string): Promise<void> {
    try {
      await this.signIn.assertRight(person.email, currentPassword, address);
    } catch (error) {
      if (error instanceof AppError && error.code === 'sign-in-failed')
        refuse('bad-input', error.params, { currentPassword: 'wrong' });
      throw error;
    }
  }

  private async set(person: PersonModel, passwordHash: string, keptSessionId: string | null): Promise<void> {
    await this.persons.update({ passwordHash }, { where: { id: person.id } });
    await this.links.voidAllOf(person.id);
    await this.sessions.endAllOf(person.id, 'password-changed', keptSessionId);
    const actor = { personId: person.id, role: null };
    await this.ledger.appendTo(`person:${person.id}`, 'password-changed', { personId: person.id }, actor);
    await this.mail.add({ mail: 'password-changed', to: person, actorId: person.id });
  }
}
