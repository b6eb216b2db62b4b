import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import i18next from 'i18next';
import { afterEach } from 'vitest';
import { startI18n } from './lib/i18n';
import { listNamespaces } from './lib/locale-files';

/** What jsdom has not got, and the words of the page: run before every spec of the front end. */

class NoResizeObserver implements ResizeObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
}

function matchMediaStub(query: string): MediaQueryList {
  const target = new EventTarget();
  return Object.assign(target, {
    matches: false,
    media: query,
    onchange: null,
    addListener: () => undefined,
    removeListener: () => undefined,
  });
}

/** Puts a stub where jsdom has nothing; what it has stays. */
function fill(owner: object, name: string, value: unknown): void {
  if (!Reflect.has(owner, name)) Object.defineProperty(owner, name, { value, writable: true, configurable: true });
}

if (typeof window !== 'undefined') {
  fill(window, 'matchMedia', matchMediaStub);
  fill(window, 'ResizeObserver', NoResizeObserver);
  fill(window.HTMLElement.prototype, 'scrollIntoView', () => undefined);
  fill(window.HTMLDialogElement.prototype, 'showModal', function showModal(this: HTMLDialogElement) {
    this.open = true;
  });
  fill(window.HTMLDialogElement.prototype, 'close', function close(this: HTMLDialogElement) {
    this.open = false;
  });
}

/** On a busy machine the thing waited for may take longer than the usual second. */
configure({ asyncUtilTimeout: 15_000 });

/** The phrases as the page loads them, all namespaces at once so that no spec waits for one. */
await startI18n('en');
await i18next.loadNamespaces(listNamespaces());

afterEach(() => cleanup());
