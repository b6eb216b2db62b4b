import { randomUUID } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { NoticeKind } from '@holdwater/shared-types/notices/notice.contract.js';
import { Changes } from '../../common/changes/changes.js';
import { Clock } from '../../common/time/clock.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';
import { DeliveryModel } from '../delivery.model.js';
import type { AccountMailFacts, MailFacts } from '../mail/mail-facts.js';
import { NoticeModel } from '../notice.model.js';
import { noticeRules, recipientsOf } from '../notice.rules.js';
import type { OutboxPayloads } from '../outbox.kinds.js';
import type { OutboxEventModel } from '../outbox-event.model.js';
import { Audiences } from './audiences.service.js';
import { EventFactsQueries, type PersonRow } from './event-facts.queries.js';
import { type EventSubject, lotMailFacts, noticeParams } from './event-words.js';
import { cancellationOf, invitesOf } from './invites.js';
import { RuleCardNewsQueries } from './rule-card-news.js';

interface Addressee {
  personId: string | null;
  address: string;
  noticeId: string | null;
}

/** Turns one event into notices on the page and deliveries by mail. Called inside the unit of work that marks the event as processed. */
@Injectable()
export class ExpandEvent {
  constructor(
    @InjectModel(NoticeModel) private readonly notices: typeof NoticeModel,
    @InjectModel(DeliveryModel) private readonly deliveries: typeof DeliveryModel,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
    private readonly facts: EventFactsQueries,
    private readonly audiences: Audiences,
    private readonly ruleCards: RuleCardNewsQueries,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  async expand(event: OutboxEventModel): Promise<void> {
    if (event.kind === 'account-mail') await this.expandAccountMail(event);
    else await this.expandNotice(event, event.kind as NoticeKind);
  }

  private async expandAccountMail(event: OutboxEventModel): Promise<void> {
    const payload = event.payload as OutboxPayloads['account-mail'];
    const mail: AccountMailFacts = {
      type: 'account',
      mail: payload.mail,
      locale: payload.locale === 'es' ? 'es' : 'en',
      recipientName: payload.name,
      sealedToken: payload.sealedToken,
      organizationName: payload.organizationName,
      invitedByName: payload.invitedByName,
    };
    await this.deliver(event, { personId: null, address: payload.address, noticeId: null }, mail);
  }

  private async expandNotice(event: OutboxEventModel, kind: NoticeKind): Promise<void> {
    const lot = event.lotId ? await this.facts.findLot(event.lotId) : null;
    const visit = event.visitId ? await this.facts.findVisit(event.visitId) : null;
    const subject: EventSubject = {
      event,
      kind,
      lot,
      visit,
      actorName: await this.facts.findPersonName(event.actorId),
      ruleCard:
        kind === 'rule-card-published'
          ? await this.ruleCards.find(event.payload as OutboxPayloads['rule-card-published'])
          : null,
    };
    const audience = await this.audiences.of(event, lot, visit);
    const recipients = recipientsOf(kind, audience.people, event.actorId, lot?.hasOpenVisit ?? false);
    const invited = event.visitId && noticeRules[kind].calendar ? await this.facts.listInvited(event.visitId) : [];
    const invites = invitesOf(
      subject,
      [...recipients].filter(([, channels]) => channels.email).map(([id]) => id),
      invited,
    );
    for (const [personId, channels] of recipients) {
      const person = audience.byId.get(personId);
      if (!person) continue;
      const hasLeft = audience.people.former?.includes(personId) ?? false;
      const noticeId = channels.page ? await this.notice(subject, person, hasLeft) : null;
      if (!channels.email) continue;
      const mail = lotMailFacts(subject, person, audience.people, invites.of(personId));
      if (mail) await this.deliver(event, { personId, address: person.email, noticeId }, mail);
    }
    for (const left of invites.leftBehind) await this.cancelFor(subject, left);
  }

  /** Somebody who had the entry and is no longer concerned, such as an inspector whose visit went to another: their entry goes. */
  private async cancelFor(subject: EventSubject, left: { personId: string; address: string }): Promise<void> {
    const { departmentId = null, builderId = null, plumberId = null } = subject.lot ?? {};
    const members = await this.facts.listMembers([departmentId, builderId, plumberId]);
    const member = members.find(({ id }) => id === left.personId);
    const person = member ?? (await this.facts.findMember(left.personId));
    if (!person) return;
    const former = member ? [] : [person.id];
    const kind = person.organizationId === departmentId ? 'visit-passed-on' : 'visit-left';
    const mail = lotMailFacts(subject, person, { former }, cancellationOf(subject), kind);
    if (mail)
      await this.deliver(subject.event, { personId: left.personId, address: left.address, noticeId: null }, mail);
  }

  private async notice(subject: EventSubject, person: PersonRow, hasLeft: boolean): Promise<string> {
    const { event, kind, ruleCard } = subject;
    const personId = person.id;
    const id = randomUUID();
    await this.notices.create({
      id,
      eventId: event.id,
      personId,
      kind,
      params: {
        ...noticeParams(subject),
        ...(hasLeft && { hasLeft }),
        ...(ruleCard && { departmentName: ruleCard.departmentName, changes: ruleCard.of(person) }),
      },
      lotId: event.lotId,
      visitId: event.visitId,
      at: event.at,
    });
    this.changes.person(personId, 'notices');
    return id;
  }

  /** The Message-ID stands before the first try, so that a repeat is recognised as one. */
  private async deliver(event: OutboxEventModel, to: Addressee, mail: MailFacts): Promise<void> {
    const id = randomUUID();
    const domain = this.environment.MAIL_FROM.split('@')[1] ?? 'localhost';
    await this.deliveries.create({
      id,
      eventId: event.id,
      noticeId: to.noticeId,
      personId: to.personId,
      channel: 'email',
      kind: mail.type === 'account' ? mail.mail : mail.kind,
      address: to.address,
      orderKey: event.visitId,
      messageId: `<${id}@${domain}>`,
      payload: mail as unknown as Record<string, unknown>,
      state: 'waiting',
      nextAttemptAt: this.clock.now(),
      createdAt: this.clock.now(),
    });
  }
}
