import { Inject, Injectable } from '@nestjs/common';
import { seal } from '../common/sealed.js';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import type { OutboxPayloads } from '../notices/outbox.kinds.js';
import { Outbox } from '../notices/outbox.service.js';

type Payload = OutboxPayloads['account-mail'];

export interface AccountMailPart {
  mail: Payload['mail'];
  to: { email: string; name: string; locale: string };
  /** The secret of the link in it; sealed before it is stored. */
  token?: string;
  organizationName?: string;
  invitedByName?: string;
  actorId?: string | null;
}

/** Puts a mail of an account into the outbox, in the transaction of whatever it tells of. */
@Injectable()
export class AccountMail {
  constructor(
    private readonly outbox: Outbox,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
  ) {}

  async add({ mail, to, token, organizationName, invitedByName, actorId }: AccountMailPart): Promise<void> {
    await this.outbox.add(
      'account-mail',
      { actorId: actorId ?? null },
      {
        mail,
        address: to.email,
        name: to.name,
        locale: to.locale,
        sealedToken: token === undefined ? null : seal(token, this.environment.JWT_SECRET),
        organizationName: organizationName ?? null,
        invitedByName: invitedByName ?? null,
      },
    );
  }
}
