import { useState, type FocusEvent, type KeyboardEvent } from 'react';

export interface GridKeys {
  /** One item of the grid is in the tab order: the last that had the focus, else the first. */
  readonly tabIndexOf: (id: string) => 0 | -1;
  readonly onKeyDown: (event: KeyboardEvent<HTMLElement>) => void;
  readonly onFocus: (event: FocusEvent) => void;
}

/** `along` walks within a lane, `across` to the nearest item of another. */
interface Ways {
  readonly along: readonly [before: string, after: string];
  readonly across: readonly [before: string, after: string];
}

const columns: Ways = { along: ['ArrowUp', 'ArrowDown'], across: ['ArrowLeft', 'ArrowRight'] };
const rows: Ways = { along: ['ArrowLeft', 'ArrowRight'], across: ['ArrowUp', 'ArrowDown'] };

/**
 * Arrow keys over lanes of items, `ids` in reading order. Lanes are marked `data-lane`, items `data-item` with their id, their button or link inside. Up and down
 * walk a lane and left and right change it where lanes are columns; the other way round where they are rows.
 */
export function useGridKeys(lanesAre: 'columns' | 'rows', ids: readonly string[]): GridKeys {
  const [active, setActive] = useState<string | null>(null);
  const ways = lanesAre === 'columns' ? columns : rows;
  const stop = active !== null && ids.includes(active) ? active : ids[0];
  return {
    tabIndexOf: (id) => (id === stop ? 0 : -1),
    onFocus: (event) => setActive(itemOf(event.target)?.dataset['item'] ?? null),
    onKeyDown: (event) => {
      const from = itemOf(event.target as Element);
      const to = from === null ? null : stepFrom(from, event.key, ways, event.currentTarget);
      if (to === null) return;
      event.preventDefault();
      to.querySelector<HTMLElement>('button, a')?.focus();
    },
  };
}

function itemOf(element: Element): HTMLElement | null {
  return element.closest<HTMLElement>('[data-item]');
}

function stepFrom(item: HTMLElement, key: string, ways: Ways, grid: HTMLElement): HTMLElement | null {
  const lane = item.closest<HTMLElement>('[data-lane]');
  if (lane === null) return null;
  const along = ways.along.indexOf(key);
  const items = itemsOf(lane);
  if (along >= 0) return items[items.indexOf(item) + (along === 0 ? -1 : 1)] ?? null;
  const across = ways.across.indexOf(key);
  if (across < 0) return null;
  const lanes = [...grid.querySelectorAll<HTMLElement>('[data-lane]')].filter((one) => itemsOf(one).length > 0);
  const next = lanes[lanes.indexOf(lane) + (across === 0 ? -1 : 1)];
  return next === undefined ? null : nearestTo(item, itemsOf(next));
}

function itemsOf(lane: HTMLElement): HTMLElement[] {
  return [...lane.querySelectorAll<HTMLElement>('[data-item]')];
}

/** By the hour each stands at, `data-hour`. */
function nearestTo(item: HTMLElement, others: readonly HTMLElement[]): HTMLElement | null {
  const hourOf = (one: HTMLElement): number => Number(one.dataset['hour'] ?? 0);
  const far = (one: HTMLElement): number => Math.abs(hourOf(one) - hourOf(item));
  return others.reduce<HTMLElement | null>((best, one) => (best === null || far(one) < far(best) ? one : best), null);
}
