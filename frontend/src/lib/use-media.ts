import { useSyncExternalStore } from 'react';

/** Breakpoints of the sheet, CSS pixels. */
export const phoneToPx = 719;
export const tabletToPx = 1199;
export const columnFromPx = 1680;

/** Whether a media query holds now. */
export function useMedia(query: string): boolean {
  return useSyncExternalStore(
    (listener) => {
      const media = window.matchMedia(query);
      media.addEventListener('change', listener);
      return () => media.removeEventListener('change', listener);
    },
    () => window.matchMedia(query).matches,
  );
}

/** A phone's width, 719 px or less. */
export function useIsPhone(): boolean {
  return useMedia(`(max-width: ${phoneToPx}px)`);
}

/** 1680 px or more: a lot's thread has a column of its own. */
export function useHasThreadColumn(): boolean {
  return useMedia(`(min-width: ${columnFromPx}px)`);
}

/** A phone's or a tablet's width, 1199 px or less: side panels become drawers. */
export function useIsNarrow(): boolean {
  return useMedia(`(max-width: ${tabletToPx}px)`);
}
