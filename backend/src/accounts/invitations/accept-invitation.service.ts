import { randomUUID } from 'node:crypto';
import type { acceptInvitation } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { readInvitation } from '@holdwater/shared-types/accounts/auth.contract.js';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Transaction, UniqueConstraintError } from 'sequelize';
import { refuse } from '../../common/errors/app-error.js';
import { Clock } from '../../common/time/clock.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { AccountsQueries } from '../accounts.queries.js';
import { InvitationModel } from '../invitation.model.js';
import { assertPassword } from '../passwords/password-rules.js';
import { Passwords } from '../passwords/passwords.js';
import { PersonModel } from '../person.model.js';
import type { OpenedSession } from '../sessions/sessions.service.js';
import { type Attempt, SignIn } from '../sign-in/sign-in.service.js';
import { Links } from '../tokens/links.service.js';
import { Joining } from './joining.service.js';

type Acceptance = RouteInput<typeof acceptInvitation>['body'];

/** Who joins: a person who is there already, or what a new one is made of. */
type Joiner = { personId: string } | Pick<PersonModel, 'email' | 'name' | 'locale' | 'passwordHash'>;

/** Reading and accepting a mailed invitation. */
@Injectable()
export class AcceptInvitation {
  constructor(
    @InjectModel(InvitationModel) private readonly invitations: typeof InvitationModel,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly queries: AccountsQueries,
    private readonly passwords: Passwords,
    private readonly signIn: SignIn,
    private readonly links: Links,
    private readonly joining: Joining,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  /** Throws `link-expired`. */
  async read(token: string): Promise<RouteAnswer<typeof readInvitation>> {
    const { email, name, roles, organizationId } = await this.getOpen(token);
    const person = await this.queries.findPersonByEmail(email);
    const organization = organizationId === null ? null : await this.queries.findOrganization(organizationId);
    return {
      email,
      name: person?.name ?? name,
      organization,
      roles,
      hasPassword: person !== null && person.passwordHash !== null,
    };
  }

  /** Throws `link-expired`; `bad-input` and `password-common` of a new password; `sign-in-failed` of the password of a known person. */
  async accept(acceptance: Acceptance, attempt: Attempt): Promise<OpenedSession> {
    const invitation = await this.getOpen(acceptance.token);
    const joiner = await this.joinerOf(invitation, acceptance, attempt);
    try {
      return await this.unitOfWork.run(() => this.join(acceptance.token, joiner, attempt));
    } catch (error) {
      // the same person accepted another invitation in this very moment
      if (error instanceof UniqueConstraintError) refuse('email-taken');
      throw error;
    }
  }

  private async joinerOf(invitation: InvitationModel, acceptance: Acceptance, attempt: Attempt): Promise<Joiner> {
    const email = invitation.isOperator
      ? (acceptance.email ?? refuse('bad-input', {}, { email: 'required' }))
      : invitation.email;
    const known = await this.queries.findPersonByEmail(email);
    if (known?.isDisabled) return refuse('link-expired');
    if (known && known.passwordHash !== null) return this.confirmed(known.email, acceptance.password, attempt);
    const passwordHash = await this.passwords.hash(assertPassword(acceptance.password, email));
    return { email, name: acceptance.name ?? invitation.name, locale: acceptance.locale ?? 'en', passwordHash };
  }

  /** A known person confirms by the password they have. */
  private async confirmed(email: string, password: string | undefined, attempt: Attempt): Promise<Joiner> {
    if (!password) return refuse('bad-input', {}, { password: 'required' });
    const person = await this.signIn.assertRight(email, password, attempt.address);
    return { personId: person.id };
  }

  private async join(token: string, joiner: Joiner, attempt: Attempt): Promise<OpenedSession> {
    const link = await this.links.take('invitation', token);
    const invitation = this.assertOpen(
      await this.invitations.findByPk(link.invitationId ?? '', { lock: Transaction.LOCK.UPDATE }),
    );
    await invitation.update({ acceptedAt: this.clock.now() });
    const personId = 'personId' in joiner ? joiner.personId : await this.createPerson(joiner);
    await this.joining.join(personId, invitation);
    return this.signIn.open(personId, attempt);
  }

  /** A person known by the address alone, without a password, gets one here. */
  private async createPerson(joiner: Pick<PersonModel, 'email' | 'name' | 'locale' | 'passwordHash'>): Promise<string> {
    const known = await this.persons.findOne({
      where: { email: joiner.email, passwordHash: null },
      lock: Transaction.LOCK.UPDATE,
    });
    if (known) return (await known.update(joiner)).id;
    const { id } = await this.persons.create({ id: randomUUID(), ...joiner, createdAt: this.clock.now() });
    return id;
  }

  private async getOpen(token: string): Promise<InvitationModel> {
    const link = await this.links.getGood('invitation', token);
    return this.assertOpen(await this.invitations.findByPk(link.invitationId ?? ''));
  }

  private assertOpen(invitation: InvitationModel | null): InvitationModel {
    const isOpen =
      invitation &&
      invitation.acceptedAt === null &&
      invitation.withdrawnAt === null &&
      invitation.expiresAt > this.clock.now();
    return isOpen ? invitation : refuse('link-expired');
  }
}
