import { useEffect, useRef, useSyncExternalStore } from 'react';

const storageKey = 'holdwater.single-keys';
const listeners = new Set<() => void>();

function readOff(): boolean {
  try {
    return window.localStorage.getItem(storageKey) === 'off';
  } catch {
    return false;
  }
}

let isOff = readOff();

/** Switches the single keys for this device: they disturb those who speak their input. */
export function setSingleKeys(areOn: boolean): void {
  isOff = !areOn;
  try {
    window.localStorage.setItem(storageKey, areOn ? 'on' : 'off');
  } catch {
    // Storage may be blocked: the choice then lasts as long as the page.
  }
  listeners.forEach((listener) => listener());
}

/** Whether single keys act on this device. */
export function useSingleKeys(): boolean {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => !isOff,
  );
}

/** Whether a key is being typed into something, or belongs to a dialog. */
function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  return target.isContentEditable || target.closest('input, textarea, select, dialog, [role="dialog"]') !== null;
}

/** Does `act` when the single key is pressed outside of a field; `key` as the keyboard event names it, letters in lower case. */
export function useShortcut(key: string | readonly string[], act: (key: string) => void): void {
  const latest = useRef(act);
  useEffect(() => {
    latest.current = act;
  });
  const keys = typeof key === 'string' ? key : key.join(' ');
  useEffect(() => {
    const wanted = keys.split(' ');
    const press = (event: KeyboardEvent): void => {
      if (isOff || event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target))
        return;
      const pressed = event.key.toLowerCase();
      if (!wanted.includes(pressed)) return;
      event.preventDefault();
      latest.current(pressed);
    };
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  }, [keys]);
}
