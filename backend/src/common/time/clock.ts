/** The one source of the present. Rules and jobs ask it, so that tests and the demo can set it. */
export abstract class Clock {
  abstract now(): Date;
}

export class SystemClock extends Clock {
  now(): Date {
    return new Date();
  }
}

/** A clock that stands where it is put. */
export class SettableClock extends Clock {
  constructor(private instant: Date) {
    super();
  }

  now(): Date {
    return new Date(this.instant);
  }

  set(instant: Date | string): void {
    this.instant = new Date(instant);
  }

  advance(minutes: number): void {
    this.instant = new Date(this.instant.getTime() + minutes * 60_000);
  }
}
