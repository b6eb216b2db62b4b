import type { NoticeKind } from '@holdwater/shared-types/notices/notice.contract.js';
import { instantOf } from '../../scheduling/working-time/local-instant.js';
import type { InviteFacts, LotMailFacts } from '../mail/mail-facts.js';
import type { Audience } from '../notice.rules.js';
import type { OutboxPayloads, VisitEventFacts } from '../outbox.kinds.js';
import type { OutboxEventModel } from '../outbox-event.model.js';
import type { LotFacts, PersonRow, VisitFacts } from './event-facts.queries.js';
import type { RuleCardNews } from './rule-card-news.js';

export interface EventSubject {
  event: OutboxEventModel;
  kind: NoticeKind;
  lot: LotFacts | null;
  visit: VisitFacts | null;
  actorName: string | null;
  /** Of a rule card that was published; null for every other event. */
  ruleCard: RuleCardNews | null;
}

/** Named values for the words of a notice on the page. */
export function noticeParams({ event, lot, visit, actorName }: EventSubject): Record<string, unknown> {
  const facts = event.payload.visit as VisitEventFacts | undefined;
  const { visit: _visit, ...rest } = event.payload;
  return {
    ...rest,
    actorName,
    lotNumber: lot?.lotNumber ?? null,
    tractName: lot?.tractName ?? null,
    address: lot?.address ?? null,
    zone: lot?.zone ?? null,
    stageName: stageOf(visit)?.name ?? null,
    startAt: facts?.startAt ?? null,
    endAt: facts?.endAt ?? null,
    inspectorName: facts?.inspectorName ?? null,
  };
}

/** What a mail about this event says to one person; null where there is no lot to say it of. */
export function lotMailFacts(
  subject: EventSubject,
  person: PersonRow,
  people: Partial<Record<Audience, readonly string[]>>,
  invite: InviteFacts | null,
  kind: LotMailFacts['kind'] = subject.kind,
): LotMailFacts | null {
  const { event, lot, visit, actorName } = subject;
  const payload = event.payload;
  return {
    type: 'lot',
    kind,
    locale: person.locale,
    recipientName: person.name,
    recipientRole: roleOf(person, people),
    organizationName: person.organizationName,
    actorName,
    lotId: event.lotId ?? '',
    lotNumber: lot?.lotNumber ?? '',
    tractName: lot?.tractName ?? null,
    address: lot?.address ?? '',
    departmentName: lot?.departmentName ?? null,
    departmentPhone: lot?.departmentPhone ?? null,
    builderName: lot?.builderName ?? '',
    zone: lot?.zone ?? 'UTC',
    stageName: stageOf(visit)?.name ?? null,
    visit: visitFacts(subject),
    from: (payload.from as LotMailFacts['from'] | undefined) ?? null,
    reason: (payload.reason ?? payload.why ?? null) as string | null,
    outcome: kind === 'outcome' ? String(payload.kind) : null,
    correctionNumber: typeof payload.number === 'number' ? payload.number : null,
    version: typeof payload.version === 'number' ? payload.version : null,
    handover: handoverFacts(subject),
    ruleCard: ruleCardFacts(subject, person),
    hasLeft: people.former?.includes(person.id) ?? false,
    invite,
  };
}

function ruleCardFacts({ event, ruleCard }: EventSubject, person: PersonRow): LotMailFacts['ruleCard'] {
  if (ruleCard === null) return null;
  const { ruleCardId, effectiveFrom } = event.payload as OutboxPayloads['rule-card-published'];
  const { sentences, more } = ruleCard.of(person);
  const { departmentName } = ruleCard;
  return { ruleCardId, departmentName, effectiveFrom, changes: [...sentences[person.locale]], more };
}

function handoverFacts({ event }: EventSubject): LotMailFacts['handover'] {
  if (event.kind !== 'handover') return null;
  const { formerName, organizationName } = event.payload as OutboxPayloads['handover'];
  return { formerName, organizationName };
}

function visitFacts({ event, lot, visit }: EventSubject): LotMailFacts['visit'] {
  const facts = event.payload.visit as VisitEventFacts | undefined;
  if (!facts) return null;
  const { startAt, endAt, inspectorName, plannedStartAt } = facts;
  return {
    startAt,
    endAt,
    inspectorName,
    plannedStartAt,
    upBy: upBy(startAt, lot, visit),
    systems: stageOf(visit)?.systems ?? [],
  };
}

/** When the tests must be up, by the rule card of the visit; null where nothing is tested. */
function upBy(startAt: string, lot: LotFacts | null, visit: VisitFacts | null): string | null {
  if (!visit || !lot?.zone || (stageOf(visit)?.systems.length ?? 0) === 0) return null;
  const rule = visit.content.readiness.upBy;
  if (rule.kind === 'hours-before') return new Date(Date.parse(startAt) - rule.hours * 3_600_000).toISOString();
  return instantOf(visit.windowDate, rule.time, lot.zone).toISOString();
}

function stageOf(visit: VisitFacts | null) {
  return visit?.content.stages.find(({ code }) => code === visit.stageCode) ?? null;
}

function roleOf(
  person: PersonRow,
  people: Partial<Record<Audience, readonly string[]>>,
): LotMailFacts['recipientRole'] {
  if (people.inspector?.includes(person.id) || people.opener?.includes(person.id)) return 'inspector';
  for (const role of ['superintendent', 'plumber', 'desk', 'inspector'] as const)
    if (person.roles.includes(role)) return role;
  return 'owner';
}
