import { useEffect, useRef, type KeyboardEvent, type RefObject } from 'react';
import type { RibbonDay } from './week-ribbon.types';

const daysInWeek = 5;

interface RibbonKeys {
  ref: RefObject<HTMLDivElement | null>;
  onKeyDown: (event: KeyboardEvent<HTMLDivElement>) => void;
}

/**
 * Arrows walk the days, past either end into the next week; Home and End go to the ends; Page Up and Page Down keep the weekday and go by a
 * week. The focus goes along with the weeks.
 */
export function useRibbonKeys(days: readonly RibbonDay[], onMove: (weeks: number) => void): RibbonKeys {
  const row = useRef<HTMLDivElement>(null);
  const column = useRef<number | null>(null);
  const first = days[0]?.date;
  useEffect(() => {
    if (column.current === null) return;
    buttonsOf(row.current)[column.current]?.focus();
    column.current = null;
  }, [first]);
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>): void => {
    const buttons = buttonsOf(row.current);
    const at = buttons.findIndex((button) => button === document.activeElement);
    const targets: Record<string, number> = { ArrowLeft: at - 1, ArrowRight: at + 1, Home: 0, End: buttons.length - 1 };
    const weeks = { PageUp: -1, PageDown: 1 }[event.key];
    const target = targets[event.key];
    if (weeks === undefined && target === undefined) return;
    event.preventDefault();
    const move = (by: number, to: number): void => {
      column.current = to;
      onMove(by);
    };
    if (weeks !== undefined) move(weeks, at);
    else if (target === -1) move(-1, daysInWeek - 1);
    else if (target === buttons.length) move(1, buttons.length - daysInWeek);
    else if (target !== undefined) buttons[target]?.focus();
  };
  return { ref: row, onKeyDown };
}

function buttonsOf(row: HTMLElement | null): HTMLButtonElement[] {
  return [...(row?.querySelectorAll<HTMLButtonElement>('button.day') ?? [])];
}
