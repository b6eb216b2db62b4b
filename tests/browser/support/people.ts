import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { openContext, type Opened } from '../../support/browser.js';
import { password, type Stack } from './stack.js';

/** Signs in on the sign-in page, as a person does, and waits for the frame of somebody signed in. */
export async function signIn(page: Page, email: string, typed = password): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('Email', { exact: true }).fill(email);
  await page.getByLabel('Password', { exact: true }).fill(typed);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.getByRole('button', { name: /organizations, language, theme, sign out$/ }).waitFor();
}

/** A browser of its own with one person signed in. */
export async function openAs(browser: Browser, stack: Stack, person: WorldPerson, options?: BrowserContextOptions): Promise<Opened> {
  const opened = await openContext(browser, stack.url, options);
  await signIn(opened.page, stack.world.people[person].email);
  return opened;
}
