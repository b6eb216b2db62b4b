import type { ReactNode } from 'react';
import type { MarkName } from '../components/mark-names';

/** A window of one department on one day; hours of the day on its own wall clock, 9.5 is 9:30 am. */
export interface RibbonShelf {
  from: number;
  to: number;
  label: string;
  /** One row per department, from 0. */
  row?: number;
  /** For a desk: share of the room that is booked, and the share of that which is up; 0 to 1. */
  booked?: number;
  up?: number;
  /** Requests for it are closed. */
  isShut?: boolean;
}

/** A visit, standing at its planned hour on the shelf that holds it. */
export interface RibbonMark {
  at: number;
  mark: MarkName;
  row?: number;
}

export interface RibbonDay {
  /** ISO date. */
  date: string;
  /** Its full name, as read aloud: "Wed, Apr 15". */
  label: string;
  shelves: readonly RibbonShelf[];
  marks: readonly RibbonMark[];
  /** A day nobody works; `closures` for parts of one. */
  isClosed?: boolean;
  closures?: readonly { from: number; to: number; row?: number }[];
  /** How many visits; the number of marks without it. */
  visits?: number;
  notUp: number;
  /** Replaces the note at the right end of its head: "1 freed". */
  note?: string;
  isNoteUrgent?: boolean;
  /** The page below covers it. */
  isBracketed?: boolean;
  isToday?: boolean;
}

export interface WeekRibbonProps {
  /** Ten working days, two weeks. */
  days: readonly RibbonDay[];
  /** Hours a day is drawn over, from the rule card. */
  hours?: { from: number; to: number };
  /** Where now is, as a fraction of those hours. */
  nowFraction?: number;
  form?: 'desk' | 'phone';
  /** At the left end: the month over the days, "Apr" over "13–24". */
  over?: string;
  span?: string;
  /** At the right end: what waits on you, two lines. */
  end?: ReactNode;
  onPick: (date: string) => void;
  /** Weeks forward, or back when negative. */
  onMove: (weeks: number) => void;
}
