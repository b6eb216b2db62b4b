import { setTimeout as wait } from 'node:timers/promises';
import { Injectable } from '@nestjs/common';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { AccountMail } from '../account-mail.service.js';
import { AccountsQueries } from '../accounts.queries.js';
import { Links, mostOpenLinks } from '../tokens/links.service.js';

/** An answer is never quicker, so that its time does not tell whether an address is known. */
const leastMs = 120;

const mails = { 'sign-in': 'sign-in-link', reset: 'password-reset' } as const;

/** Mails a link to whoever has the address, and says nothing of whether anybody has. */
@Injectable()
export class MailedLinks {
  constructor(
    private readonly queries: AccountsQueries,
    private readonly links: Links,
    private readonly mail: AccountMail,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  async ask(kind: keyof typeof mails, email: string): Promise<void> {
    await Promise.all([this.send(kind, email), wait(leastMs)]);
  }

  private async send(kind: keyof typeof mails, email: string): Promise<void> {
    await this.unitOfWork.run(async () => {
      const person = await this.queries.findPersonByEmail(email);
      if (!person || person.isDisabled) return;
      if ((await this.links.countOpen(kind, person.id)) >= mostOpenLinks) return;
      const token = await this.links.issue(kind, { personId: person.id });
      await this.mail.add({ mail: mails[kind], to: person, token });
    });
  }
}
