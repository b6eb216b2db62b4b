/** A calendar part of a mail: any `text/calendar` part, attached or an alternative of the text. */
export interface MailCalendar {
  /** The `method` parameter of the part's content type in capitals (RFC 6047), null when it has none. */
  method: string | null;
  contentType: string;
  /** Decoded from its transfer encoding and charset. */
  text: string;
}

export interface MailAttachment {
  filename: string | null;
  contentType: string;
  sizeBytes: number;
}

/** What the headers and parts of a raw mail say. */
export interface MailContent {
  /** The From header as written, "Name <address>"; empty when the mail has none. */
  from: string;
  /** Display names of the To and Cc headers by address in lower case. */
  names: ReadonlyMap<string, string>;
  replyTo: string | null;
  subject: string;
  /** With its angle brackets. */
  messageId: string | null;
  /** The text/plain part; null when the mail has none: it is never made up from the HTML. */
  text: string | null;
  html: string | null;
  calendars: MailCalendar[];
  /** Every other part that is not shown as text. */
  attachments: MailAttachment[];
  /** Why the mail could not be taken apart; its raw text is kept all the same. */
  problem: string | null;
}

/** What the SMTP dialogue said about a mail, kept beside its raw text. */
export interface MailEnvelope {
  id: string;
  sequence: number;
  /** ISO 8601 instant. */
  receivedAt: string;
  /** MAIL FROM, empty for the null sender. */
  sender: string;
  /** RCPT TO in lower case: who really got it, blind copies too. */
  recipients: string[];
}

export interface StoredMail {
  envelope: MailEnvelope;
  content: MailContent;
}

/** A mail as the API tells it. */
export interface MailView {
  id: string;
  receivedAt: string;
  from: string;
  /** The addresses the mail was delivered to (RCPT TO), in lower case. */
  to: string[];
  subject: string;
  messageId: string | null;
  replyTo: string | null;
  text: string | null;
  html: string | null;
  calendars: MailCalendar[];
  attachments: MailAttachment[];
  rawUrl: string;
}

/** @param baseUrl address of the mailbox without a slash at its end, the start of `rawUrl` */
export function toMailView({ envelope, content }: StoredMail, baseUrl: string): MailView {
  return {
    id: envelope.id,
    receivedAt: envelope.receivedAt,
    from: content.from || envelope.sender,
    to: envelope.recipients,
    subject: content.subject,
    messageId: content.messageId,
    replyTo: content.replyTo,
    text: content.text,
    html: content.html,
    calendars: content.calendars,
    attachments: content.attachments,
    rawUrl: `${baseUrl}/api/messages/${envelope.id}/raw`,
  };
}
