import { z } from 'zod';

/** Ids of rows are UUIDs. */
export const id = z.uuid();

/** An instant, ISO 8601 with `Z` or an offset. */
export const instant = z.iso.datetime({ offset: true });

/** A day of a calendar, without a zone. */
export const localDate = z.iso.date();

/** A clock time of a day's wall clock, 24 h, `07:30`. */
export const clockTime = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'not-a-clock-time');

/** Breaks of lines, tabs and other controls are no part of one line: a name goes into the heads of mails and calendar entries. */
const asOneLine = (text: string) => text.replaceAll(/\p{Cc}+/gu, ' ');

/** One line a person types. */
export const line = (longest = 200) =>
  z.string().overwrite(asOneLine).trim().min(1, 'required').max(longest, 'too-long');

/** Words a person writes; may be empty only where the caller makes it optional. */
export const words = (longest = 4000) => z.string().trim().min(1, 'required').max(longest, 'too-long');

export const email = z
  .email()
  .max(254)
  .transform((value) => value.trim().toLowerCase());

export const phone = z
  .string()
  .trim()
  .regex(/^[0-9+() .-]{7,24}$/, 'not-a-phone');

export const latitude = z.number().min(-90).max(90);
export const longitude = z.number().min(-180).max(180);

/** An IANA time zone that this machine knows. */
export const zone = z.string().refine(isTimeZone, 'no-such-zone');

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en-US', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

/**
 * What every write made in the field carries: the client's own id for it (a repeat is the same entry) and when it was made by the phone's
 * clock. The server corrects `madeAt` by the clock offset it measures from the `X-Sent-At` header and keeps `receivedAt` beside it.
 */
export const fieldWrite = { clientId: id, madeAt: instant };

/** A move names the version it was decided on; another version is a conflict. */
export const expectedVersion = z.number().int().min(0);
