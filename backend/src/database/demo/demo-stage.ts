import type { SettableClock } from '../../common/time/clock.js';

interface Act {
  at: number;
  order: number;
  play: () => Promise<void>;
}

/** Plays the acts of the story in the order of their instants, each under its own time; what lies after the present is left out. */
export class DemoStage {
  private acts: Act[] = [];
  private counted = 0;

  constructor(
    private readonly clock: SettableClock,
    private readonly present: Date,
  ) {}

  at(instant: Date, play: () => Promise<void>): void {
    this.acts.push({ at: instant.getTime(), order: (this.counted += 1), play });
  }

  now(): Date {
    return this.clock.now();
  }

  /** How many acts were played. */
  async play(): Promise<number> {
    let played = 0;
    for (;;) {
      const next = this.acts.reduce<Act | null>(
        (first, act) => (first === null || isBefore(act, first) ? act : first),
        null,
      );
      if (next === null || next.at > this.present.getTime()) return played;
      this.acts = this.acts.filter((act) => act !== next);
      this.clock.set(new Date(next.at));
      await next.play();
      played += 1;
    }
  }
}

function isBefore(a: Act, b: Act): boolean {
  return a.at === b.at ? a.order < b.order : a.at < b.at;
}
