import type { Locale } from '@holdwater/shared-types/common/locale.js';

/** Days and clock times of a mail, in the department's zone and the reader's language. */
export class When {
  constructor(
    private readonly locale: Locale,
    private readonly zone: string,
  ) {}

  /** Wed, Apr 15 */
  day(instant: string): string {
    return this.format(instant, { weekday: 'short', month: 'short', day: 'numeric' });
  }

  /** 9:15 am */
  time(instant: string): string {
    return this.format(instant, { hour: 'numeric', minute: '2-digit' })
      .replace(/\s?AM$/i, ' am')
      .replace(/\s?PM$/i, ' pm')
      .replaceAll(/[\u202f\u00a0]/g, ' ');
  }

  /** Wed, Apr 15, 9:00–11:00 am */
  window(startAt: string, endAt: string): string {
    const [start, end] = [this.time(startAt), this.time(endAt)];
    const half = / (am|pm|a\.\s?m\.|p\.\s?m\.)$/;
    const isSameHalf = half.exec(start)?.[1] === half.exec(end)?.[1];
    return `${this.day(startAt)}, ${isSameHalf ? start.replace(half, '') : start}–${end}`;
  }

  /** Mountain Time */
  zoneName(instant: string): string {
    const parts = new Intl.DateTimeFormat(this.tag(), {
      timeZone: this.zone,
      timeZoneName: 'longGeneric',
    }).formatToParts(new Date(instant));
    return parts.find(({ type }) => type === 'timeZoneName')?.value ?? this.zone;
  }

  private format(instant: string, options: Intl.DateTimeFormatOptions): string {
    return new Intl.DateTimeFormat(this.tag(), { ...options, timeZone: this.zone }).format(new Date(instant));
  }

  private tag(): string {
    return this.locale === 'es' ? 'es-US' : 'en-US';
  }
}
