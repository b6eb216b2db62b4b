import { Temporal } from 'temporal-polyfill';

/** Days of the story, counted from today in a department's zone. */
export class DemoDays {
  readonly today: Temporal.PlainDate;

  constructor(
    now: Date,
    readonly zone: string,
    private readonly workingDays: readonly number[],
    private readonly closed: ReadonlySet<string>,
  ) {
    this.today = Temporal.Instant.from(now.toISOString()).toZonedDateTimeISO(zone).toPlainDate();
  }

  /** The date `offset` working days from today: 0 is today, -1 the working day before, 1 the next. */
  workingDate(offset: number): string {
    let date = this.today;
    for (let left = Math.abs(offset); left > 0;) {
      date = date.add({ days: Math.sign(offset) });
      if (this.isWorking(date)) left -= 1;
    }
    return date.toString();
  }

  /** The working day `count` before a date. */
  before(date: string, count: number): string {
    let day = Temporal.PlainDate.from(date);
    for (let left = count; left > 0;) {
      day = day.subtract({ days: 1 });
      if (this.isWorking(day)) left -= 1;
    }
    return day.toString();
  }

  instant(date: string, time: string): Date {
    const zoned = Temporal.PlainDate.from(date).toZonedDateTime({
      timeZone: this.zone,
      plainTime: Temporal.PlainTime.from(time),
    });
    return new Date(zoned.epochMilliseconds);
  }

  private isWorking(date: Temporal.PlainDate): boolean {
    return this.workingDays.includes(date.dayOfWeek) && !this.closed.has(date.toString());
  }
}
