import { simpleParser } from 'mailparser';
import type { AddressObject, Attachment, HeaderValue, ParsedMail } from 'mailparser';
import type { MailCalendar, MailContent } from './mail-types.js';

/**
 * Reads a raw mail (RFC 5322, MIME). Nothing is made up: a mail without a text part has `text: null`,
 * so that a check for the plain-text twin can fail. Never throws: what cannot be read says so in `problem`.
 */
export async function parseMessage(raw: Buffer): Promise<MailContent> {
  try {
    return toContent(await simpleParser(raw, { skipHtmlToText: true }));
  } catch (error) {
    return { ...nothing, problem: error instanceof Error ? error.message : String(error) };
  }
}

const nothing: MailContent = {
  from: '',
  names: new Map(),
  replyTo: null,
  subject: '',
  messageId: null,
  text: null,
  html: null,
  calendars: [],
  attachments: [],
  problem: null,
};

function toContent(mail: ParsedMail): MailContent {
  return {
    from: mail.from?.text ?? '',
    names: namesByAddress(mail),
    replyTo: mail.replyTo?.text ?? null,
    subject: mail.subject ?? '',
    messageId: mail.messageId ?? null,
    text: mail.text || null,
    html: mail.html || null,
    calendars: mail.attachments.filter(isCalendar).map(toCalendar),
    attachments: mail.attachments
      .filter((part) => !isCalendar(part))
      .map((part) => ({ filename: part.filename ?? null, contentType: part.contentType, sizeBytes: part.size })),
    problem: null,
  };
}

/** The parser hands out every part that is neither plain text nor HTML, alternatives included, in `attachments`. */
function isCalendar(part: Attachment): boolean {
  return part.contentType.toLowerCase() === 'text/calendar';
}

function toCalendar(part: Attachment): MailCalendar {
  const params = paramsOf(part.headers.get('content-type'));
  return {
    method: params['method']?.toUpperCase() ?? null,
    contentType: part.contentType.toLowerCase(),
    text: decode(part.content, params['charset']),
  };
}

function paramsOf(header: HeaderValue | undefined): Record<string, string | undefined> {
  if (typeof header !== 'object' || header === null || !('params' in header)) return {};
  return header.params as Record<string, string | undefined>;
}

/** UTF-8 is what RFC 5545 (3.1.4) takes a calendar for that names no charset. */
function decode(bytes: Uint8Array, charset = 'utf-8'): string {
  try {
    return new TextDecoder(charset).decode(bytes);
  } catch {
    // A charset nobody knows: the ASCII of names, numbers and times is still right.
    return new TextDecoder('utf-8').decode(bytes);
  }
}

function namesByAddress(mail: ParsedMail): Map<string, string> {
  const entries = [mail.to, mail.cc].flatMap((header: AddressObject | AddressObject[] | undefined) => header ?? []);
  const names = new Map<string, string>();
  for (const { address, name } of entries.flatMap((entry) => entry.value)) {
    if (address && name) names.set(address.toLowerCase(), name);
  }
  return names;
}
