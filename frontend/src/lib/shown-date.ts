import { useCallback, useEffect, useSyncExternalStore } from 'react';
import { useSearchParams } from 'react-router-dom';

/** The dates a page covers: the bracket on the week ribbon. */
export interface ShownSpan {
  readonly from: string;
  readonly to: string;
}

const datePattern = /^\d{4}-\d\d-\d\d$/;

/**
 * The date the page is about, kept in the address as `?date=`, so that the ribbon, the back key and a link agree. Null: the page's own
 * default, mostly today.
 */
export function useShownDate(): [date: string | null, show: (date: string) => void] {
  const [search, setSearch] = useSearchParams();
  const given = search.get('date');
  const show = useCallback(
    (date: string) =>
      setSearch((before) => {
        const after = new URLSearchParams(before);
        after.set('date', date);
        return after;
      }),
    [setSearch],
  );
  return [given !== null && datePattern.test(given) ? given : null, show];
}

let span: ShownSpan | null = null;
const listeners = new Set<() => void>();

function setSpan(next: ShownSpan | null): void {
  if (next?.from === span?.from && next?.to === span?.to) return;
  span = next;
  listeners.forEach((listener) => listener());
}

/** A page says which dates it covers, and thereby that it takes its date from the ribbon. */
export function useCoversDates(from: string | null, to: string | null): void {
  useEffect(() => {
    setSpan(from !== null && to !== null ? { from, to } : null);
    return () => setSpan(null);
  }, [from, to]);
}

/** What the page below the ribbon covers; null on pages that are about no date. */
export function useShownSpan(): ShownSpan | null {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => span,
  );
}
