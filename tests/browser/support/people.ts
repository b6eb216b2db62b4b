import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { openContext, type Opened } from '../../support/browser.js';
import { password, type Stack } from './stack.js';

const words = {
  en: { email: 'Email', password: 'Password', act: 'Sign in', name: /organizations, language, theme, sign out$/ },
  es: {
    email: 'Correo',
    password: 'Contraseña',
    act: 'Iniciar sesión',
    name: /organizaciones, idioma, tema/,
  },
} as const;

/** Signs in on the sign-in page, as a person does, and waits for the frame of somebody signed in. */
export async function signIn(page: Page, email: string, language: keyof typeof words = 'en'): Promise<void> {
  const said = words[language];
  await page.goto('/sign-in');
  await page.getByLabel(said.email, { exact: true }).fill(email);
  await page.getByLabel(said.password, { exact: true }).fill(password);
  await page.getByRole('button', { name: said.act, exact: true }).click();
  await page.getByRole('button', { name: said.name }).waitFor();
}

/** A browser of its own with one person signed in. */
export async function openAs(
  browser: Browser,
  stack: Stack,
  person: WorldPerson,
  options?: BrowserContextOptions,
): Promise<Opened> {
  const opened = await openContext(browser, stack.url, options);
  await signIn(opened.page, stack.world.people[person].email);
  return opened;
}
