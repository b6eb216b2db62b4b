import type { AccountMailFacts, LotMailFacts } from './mail-facts.js';
import type { MailDraft } from './layout.js';
import { When } from './when.js';
import { en } from './words/en.js';
import { es } from './words/es.js';
import type { MailWords } from './words/mail-words.js';

const words: Record<LotMailFacts['locale'], MailWords> = { en, es };

function fill(text: string, values: Record<string, string>): string {
  return text.replaceAll(/\{(\w+)\}/g, (_whole, name: string) => values[name] ?? '');
}

/** Name of a lot in a mail: Lot 17, Sorrel Bench, phase 2. */
export function lotNameOf(facts: LotMailFacts): string {
  const w = words[facts.locale];
  return fill(facts.tractName ? w.lotInTract : w.lotName, { number: facts.lotNumber, tract: facts.tractName ?? '' });
}

/** The name of the calendar entry. */
export function entryNameOf(facts: LotMailFacts): string {
  const stage = stageOf(facts);
  return facts.locale === 'es' ? `${lotNameOf(facts)}: visita de ${stage}` : `${lotNameOf(facts)}: ${stage} visit`;
}

/** Puts a mail about a lot into words. */
export function composeLotMail(facts: LotMailFacts, appUrl: string): MailDraft {
  const w = words[facts.locale];
  const values = valuesOf(facts, w);
  const kind = w.kinds[facts.kind];
  return {
    language: facts.locale,
    tag: kind.tag,
    subject: fill(kind.subject, values),
    lead: [fill(kind.lead, values), ...whatNext(facts, w, values)].join(' '),
    cells: cellsOf(facts, w, values),
    act: actOf(facts, w, appUrl),
    notes: notesOf(facts, w),
    foot: footOf(facts, w),
  };
}

function actOf(facts: LotMailFacts, w: MailWords, appUrl: string): MailDraft['act'] {
  if (facts.ruleCard) {
    const words = fill(w.ruleCard.open, { version: String(facts.version ?? '') });
    return { words, url: `${appUrl}/rule-cards/${facts.ruleCard.ruleCardId}` };
  }
  if (!facts.lotId) return { words: w.openPage, url: appUrl };
  if (facts.hasLeft) return { words: w.openLeft, url: `${appUrl}/past-lots/${facts.lotId}` };
  const path = facts.kind === 'consent-asked' ? '/consents' : `/lots/${facts.lotId}`;
  return { words: fill(w.openLot, { number: facts.lotNumber }), url: `${appUrl}${path}` };
}

/** Puts a mail of an account into words; `token` is the secret of its link, opened only now. */
export function composeAccountMail(facts: AccountMailFacts, token: string | null, appUrl: string): MailDraft {
  const w = words[facts.locale].accounts[facts.mail];
  const values = { organization: facts.organizationName ?? 'Holdwater', actor: facts.invitedByName ?? 'Holdwater' };
  const paths: Partial<Record<AccountMailFacts['mail'], string>> = {
    'sign-in-link': '/link/sign-in',
    'password-reset': '/link/reset',
    invitation: '/link/invitation',
  };
  const path = paths[facts.mail];
  return {
    language: facts.locale,
    tag: w.tag,
    subject: fill(w.subject, values),
    lead: fill(w.lead, values),
    cells: [],
    // behind the # a secret never reaches a log
    act: { words: w.act, url: path && token ? `${appUrl}${path}#token=${token}` : appUrl },
    notes: [w.note],
    foot: [facts.recipientName],
  };
}

function stageOf(facts: LotMailFacts): string {
  const name = facts.stageName ? ((facts.locale === 'es' ? facts.stageName.es : undefined) ?? facts.stageName.en) : '';
  return name.charAt(0).toLowerCase() + name.slice(1);
}

function valuesOf(facts: LotMailFacts, w: MailWords): Record<string, string> {
  const when = new When(facts.locale, facts.zone);
  const { visit, from } = facts;
  const outcome = facts.outcome ? (w.outcomes[facts.outcome] ?? facts.outcome) : '';
  return {
    lot: lotNameOf(facts),
    stage: stageOf(facts),
    when: visit ? when.window(visit.startAt, visit.endAt) : '',
    from: from ? when.window(from.startAt, from.endAt) : '',
    actor: facts.actorName ?? 'Holdwater',
    inspector: visit?.inspectorName ?? '',
    arrival: visit?.plannedStartAt ? when.time(visit.plannedStartAt) : '',
    upBy: visit?.upBy ? `${when.time(visit.upBy)} ${when.day(visit.upBy)}` : '',
    reason: facts.reason ? (w.reasons[facts.reason] ?? facts.reason) : '',
    outcome,
    number: String(facts.correctionNumber ?? ''),
    version: String(facts.version ?? ''),
    organization: facts.organizationName,
    builder: facts.builderName,
    former: facts.handover?.formerName ?? '',
    successor: facts.handover?.organizationName ?? '',
    department: facts.ruleCard?.departmentName ?? facts.departmentName ?? '',
    day: facts.ruleCard ? new When(facts.locale, 'UTC').day(`${facts.ruleCard.effectiveFrom}T12:00:00Z`) : '',
  };
}

const comes: ReadonlyArray<LotMailFacts['kind']> = ['visit-booked', 'visit-moved', 'visit-changed', 'visit-restored'];

function whatNext(facts: LotMailFacts, w: MailWords, values: Record<string, string>): string[] {
  if (!comes.includes(facts.kind) || !facts.visit?.inspectorName) return [];
  const sentences = facts.visit.plannedStartAt ? [fill(w.arrives, values)] : [];
  const isStillToDo = facts.recipientRole !== 'inspector' && facts.kind !== 'visit-restored';
  return facts.visit.upBy && isStillToDo ? [...sentences, fill(w.putUpBy, values)] : sentences;
}

function cellsOf(facts: LotMailFacts, w: MailWords, values: Record<string, string>): MailDraft['cells'] {
  const where = [facts.tractName, fill(w.lotName, { number: facts.lotNumber })].filter(Boolean).join(', ');
  const cells: MailDraft['cells'] = [];
  if (facts.visit) {
    cells.push({
      label: w.labels.when,
      value: values.when ?? '',
      more: new When(facts.locale, facts.zone).zoneName(facts.visit.startAt),
    });
  }
  if (facts.address) cells.push({ label: w.labels.where, value: facts.address, more: where });
  if (facts.from) cells.push({ label: w.labels.was, value: values.from ?? '' });
  if (facts.visit && (comes.includes(facts.kind) || facts.kind === 'outcome')) {
    cells.push({ label: w.labels.inspector, value: facts.visit.inspectorName ?? w.notSetYet });
  }
  if (values.reason) cells.push({ label: w.labels.reason, value: values.reason });
  const tests = facts.visit?.systems.map((system) => w.systems[system] ?? system).join(', ');
  if (tests && cells.length < 4 && comes.includes(facts.kind)) cells.push({ label: w.labels.tests, value: tests });
  return cells.slice(0, 4);
}

function askedOf(kind: LotMailFacts['kind']): 'request' | 'move' | 'change' {
  if (kind === 'visit-moved') return 'move';
  return kind === 'visit-changed' ? 'change' : 'request';
}

function notesOf(facts: LotMailFacts, w: MailWords): string[] {
  const notes = ruleCardNotes(facts, w);
  if (facts.invite) notes.push(w.calendar[facts.invite.method === 'CANCEL' ? 'cancel' : askedOf(facts.kind)]);
  if (facts.visit?.upBy && comes.includes(facts.kind)) notes.push(w.local);
  return notes;
}

/** What a published rule card changes for the reader, a line each; what stays comes last. */
function ruleCardNotes({ ruleCard }: LotMailFacts, w: MailWords): string[] {
  if (!ruleCard) return [];
  const { changes, more } = ruleCard;
  const told = changes.length === 0 ? [w.ruleCard.none] : [w.ruleCard.changes, ...changes];
  return [...told, ...(more > 0 ? [fill(w.ruleCard.more, { more: String(more) })] : []), w.ruleCard.kept];
}

function becauseOf({ ruleCard, hasLeft }: LotMailFacts, w: MailWords): string {
  if (ruleCard) return w.ruleCard.because;
  return hasLeft ? w.sentBecauseLeft : w.sentBecause;
}

function footOf(facts: LotMailFacts, w: MailWords): string[] {
  const because = fill(becauseOf(facts, w), {
    name: facts.recipientName,
    organization: facts.organizationName,
    role: w.roles[facts.recipientRole],
    department: facts.ruleCard?.departmentName ?? '',
  });
  if (!facts.departmentName) return [because];
  return [
    because,
    fill(w.department, {
      builder: facts.builderName,
      department: facts.departmentName,
      phone: facts.departmentPhone ?? '',
    }),
  ];
}
