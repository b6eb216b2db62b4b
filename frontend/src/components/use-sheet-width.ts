import { useSyncExternalStore } from 'react';

export type SheetWidth = 'phone' | 'tablet' | 'desk';

const phoneQuery = '(max-width: 719px)';
const tabletQuery = '(max-width: 1199px)';

function read(): SheetWidth {
  if (window.matchMedia(phoneQuery).matches) return 'phone';
  return window.matchMedia(tabletQuery).matches ? 'tablet' : 'desk';
}

function subscribe(listener: () => void): () => void {
  const queries = [window.matchMedia(phoneQuery), window.matchMedia(tabletQuery)];
  queries.forEach((query) => query.addEventListener('change', listener));
  return () => queries.forEach((query) => query.removeEventListener('change', listener));
}

/** Which layout the window asks for: phone to 719 px, tablet to 1199, desk from 1200. */
export function useSheetWidth(): SheetWidth {
  return useSyncExternalStore(subscribe, read);
}
