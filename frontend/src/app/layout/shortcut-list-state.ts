import { useSyncExternalStore } from 'react';

let isOpen = false;
const listeners = new Set<() => void>();

function set(next: boolean): void {
  isOpen = next;
  listeners.forEach((listener) => listener());
}

export function openShortcutList(): void {
  set(true);
}

export function closeShortcutList(): void {
  set(false);
}

/** Whether the list of keys is shown. */
export function useIsShortcutListOpen(): boolean {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => isOpen,
  );
}
