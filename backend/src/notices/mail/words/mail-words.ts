import type { AccountMailFacts, LotMailFacts } from '../mail-facts.js';

/** The words of every mail in one language. Placeholders stand in braces; their values are already in the reader's language and zone. */
export interface MailWords {
  lotName: string;
  lotInTract: string;
  kinds: Record<LotMailFacts['kind'], { tag: string; subject: string; lead: string }>;
  arrives: string;
  putUpBy: string;
  outcomes: Record<string, string>;
  reasons: Record<string, string>;
  systems: Record<string, string>;
  roles: Record<LotMailFacts['recipientRole'], string>;
  labels: { when: string; where: string; inspector: string; tests: string; reason: string; was: string };
  ruleCard: { changes: string; none: string; more: string; kept: string; open: string; because: string };
  notSetYet: string;
  openLot: string;
  openPage: string;
  openLeft: string;
  calendar: Record<'request' | 'move' | 'change' | 'cancel', string>;
  sentBecause: string;
  sentBecauseLeft: string;
  department: string;
  local: string;
  accounts: Record<AccountMailFacts['mail'], { tag: string; subject: string; lead: string; act: string; note: string }>;
}
