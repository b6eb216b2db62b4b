import type { OutboxPayloads } from '../outbox.kinds.js';
import type { NoticeKind } from '@holdwater/shared-types/notices/notice.contract.js';
import type { Locale } from '@holdwater/shared-types/common/locale.js';

/** What a mail about a lot says, as it stood at the moment of the event. Kept with the delivery: a late mail tells the truth of its time. */
export interface LotMailFacts {
  type: 'lot';
  /** `visit-passed-on`: to an inspector whose visit went to another; `visit-left`: to somebody whose lot did. */
  kind: NoticeKind | 'visit-passed-on' | 'visit-left';
  locale: Locale;
  recipientName: string;
  /** Why they get it. */
  recipientRole: 'superintendent' | 'plumber' | 'inspector' | 'desk' | 'owner';
  organizationName: string;
  actorName: string | null;
  lotId: string;
  lotNumber: string;
  tractName: string | null;
  address: string;
  departmentName: string | null;
  departmentPhone: string | null;
  builderName: string;
  zone: string;
  stageName: { en: string; es?: string } | null;
  visit: {
    startAt: string;
    endAt: string;
    inspectorName: string | null;
    plannedStartAt: string | null;
    upBy: string | null;
    systems: string[];
  } | null;
  from: { startAt: string; endAt: string } | null;
  reason: string | null;
  outcome: string | null;
  correctionNumber: number | null;
  version: number | null;
  /** A handover: who went, who came. Absent from mails written before there was any. */
  handover?: { formerName: string; organizationName: string } | null;
  /** A rule card that was published, with what it changes for the reader. Absent from mails written before that was told. */
  ruleCard?: {
    ruleCardId: string;
    departmentName: string;
    effectiveFrom: string;
    changes: string[];
    /** How many more changes there are than are told. */
    more: number;
  } | null;
  /** The reader's organization is no longer on the lot. */
  hasLeft?: boolean;
  invite: InviteFacts | null;
}

export interface InviteFacts {
  method: 'REQUEST' | 'CANCEL';
  uid: string;
  sequence: number;
  startAt: string;
  endAt: string;
}

/** A mail of an account. */
export interface AccountMailFacts {
  type: 'account';
  mail: OutboxPayloads['account-mail']['mail'];
  locale: Locale;
  recipientName: string;
  sealedToken: string | null;
  organizationName: string | null;
  invitedByName: string | null;
}

export type MailFacts = LotMailFacts | AccountMailFacts;
