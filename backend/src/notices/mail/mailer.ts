import { Inject, Injectable, type OnModuleDestroy } from '@nestjs/common';
import nodemailer, { type SendMailOptions, type Transporter } from 'nodemailer';
import { unseal } from '../../common/sealed.js';
import { Clock } from '../../common/time/clock.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';
import { composeAccountMail, composeLotMail, entryNameOf } from './compose.js';
import { inviteOf } from './invite.js';
import { htmlOf, textOf } from './layout.js';
import type { LotMailFacts, MailFacts } from './mail-facts.js';

/** Longest a mail server may keep us waiting. */
const timeoutMs = 20_000;

export interface Outgoing {
  messageId: string;
  address: string;
  facts: MailFacts;
}

/** Words a mail, makes its invite, and hands it to the mail server. */
@Injectable()
export class Mailer implements OnModuleDestroy {
  private readonly transport: Transporter;

  constructor(
    @Inject(ENVIRONMENT) private readonly environment: Environment,
    private readonly clock: Clock,
  ) {
    this.transport = nodemailer.createTransport({
      url: environment.SMTP_URL,
      connectionTimeout: timeoutMs,
      greetingTimeout: timeoutMs,
      socketTimeout: timeoutMs,
    });
  }

  onModuleDestroy(): void {
    this.transport.close();
  }

  /** Throws what the mail server answered when it does not take the mail. */
  async send(outgoing: Outgoing): Promise<void> {
    await this.transport.sendMail(this.messageOf(outgoing));
  }

  /** The message as it will be sent. */
  messageOf({ messageId, address, facts }: Outgoing): SendMailOptions {
    const draft =
      facts.type === 'account'
        ? composeAccountMail(
            facts,
            facts.sealedToken && unseal(facts.sealedToken, this.environment.JWT_SECRET),
            this.environment.APP_URL,
          )
        : composeLotMail(facts, this.environment.APP_URL);
    const invite = facts.type === 'lot' && facts.invite ? this.calendarOf(facts, draft.lead, address) : null;
    return {
      messageId,
      from: { name: fromName(facts), address: this.environment.MAIL_FROM },
      to: address,
      subject: draft.subject,
      date: this.clock.now(),
      text: textOf(draft),
      html: htmlOf(draft),
      headers: { 'Auto-Submitted': 'auto-generated' },
      // last in multipart/alternative, with its method in the content type: what makes mail programs offer accept and decline
      ...(invite && {
        alternatives: [
          { contentType: `text/calendar; charset=utf-8; method=${invite.method}`, content: invite.content },
        ],
      }),
    };
  }

  private calendarOf(facts: LotMailFacts, lead: string, address: string): { method: string; content: string } | null {
    if (!facts.invite) return null;
    const content = inviteOf({
      facts: facts.invite,
      summary: entryNameOf(facts),
      description: lead,
      location: facts.address,
      url: `${this.environment.APP_URL}/lots/${facts.lotId}`,
      organizer: { name: fromName(facts), email: this.environment.MAIL_FROM },
      attendee: { name: facts.recipientName, email: address },
      stamp: this.clock.now(),
    });
    return { method: facts.invite.method, content };
  }
}

function fromName(facts: MailFacts): string {
  return facts.type === 'lot' && facts.departmentName ? `Holdwater for ${facts.departmentName}` : 'Holdwater';
}
