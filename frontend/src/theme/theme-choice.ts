import { useSyncExternalStore } from 'react';
import type { ThemeChoice, ThemeName } from './tokens';

const storageKey = 'holdwater.theme';
const choices: readonly ThemeChoice[] = ['device', 'light', 'dark', 'sun'];
const listeners = new Set<() => void>();

/** The choices in the order of the name menu. */
export const themeChoices = choices;

function readChoice(): ThemeChoice {
  try {
    const kept = window.localStorage.getItem(storageKey);
    return choices.find((choice) => choice === kept) ?? 'device';
  } catch {
    return 'device';
  }
}

let current: ThemeChoice = readChoice();

/** The theme a choice draws on this device. */
export function resolveTheme(choice: ThemeChoice): ThemeName {
  if (choice !== 'device') return choice;
  return window.matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light';
}

function draw(): void {
  document.documentElement.setAttribute('data-theme', resolveTheme(current));
  listeners.forEach((listener) => listener());
}

/** Chooses a theme for this device, draws it at once and keeps it. */
export function chooseTheme(choice: ThemeChoice): void {
  current = choice;
  try {
    window.localStorage.setItem(storageKey, choice);
  } catch {
    // Storage may be blocked: the choice then lasts as long as the page.
  }
  draw();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  const device = window.matchMedia('(prefers-color-scheme: dark)');
  device.addEventListener('change', draw);
  return () => {
    listeners.delete(listener);
    device.removeEventListener('change', draw);
  };
}

/** The chosen theme, the theme drawn, and the way to choose another. */
export function useThemeChoice(): {
  choice: ThemeChoice;
  theme: ThemeName;
  chooseTheme: (choice: ThemeChoice) => void;
} {
  const choice = useSyncExternalStore(subscribe, () => current);
  const theme = useSyncExternalStore(subscribe, () => resolveTheme(current));
  return { choice, theme, chooseTheme };
}
