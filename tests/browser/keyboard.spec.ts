import type { Browser, Page } from 'playwright-core';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { desk, launchBrowser, openContext, patienceMs, type Opened } from '../support/browser.js';
import { see } from './support/acts.js';
import { openPath, settle } from './support/page-checks.js';
import { request } from './support/scene.js';
import { password, startStack, type Stack } from './support/stack.js';

/** Nothing in this file presses a pointer. */
describe('by keyboard alone', { timeout: 240_000 }, () => {
  let stack: Stack;
  let browser: Browser;
  let opened: Opened;
  let page: Page;
  let visit: VisitSummary;
  beforeAll(async () => {
    stack = await startStack();
    visit = await request(stack, stack.world.lots[0].id);
    browser = await launchBrowser();
    opened = await openContext(browser, stack.url, desk);
    page = opened.page;
  }, 240_000);
  afterAll(async () => {
    await browser?.close();
    await stack?.stop();
  });

  /** What has the focus, as it is read aloud; nothing while it is on the whole page. */
  const focused = (): Promise<string> =>
    page.evaluate(() => {
      const at = document.activeElement;
      if (at === null || at.matches('body, main')) return '';
      const named = at.getAttribute('aria-label');
      if (named !== null) return named;
      const read = at.cloneNode(true) as Element;
      read.querySelectorAll('[aria-hidden="true"]').forEach((hidden) => hidden.remove());
      return read.textContent.replaceAll(/\s+/g, ' ').trim();
    });
  const untilFocused = (wanted: RegExp): Promise<true> =>
    vi
      .waitUntil(async () => wanted.test(await focused()) || null, { timeout: patienceMs, interval: 100 })
      .then(() => true);
  /** Presses Tab until the focus is on what is wanted; no more often than a page has stops. */
  const tabTo = async (wanted: RegExp): Promise<void> => {
    for (let stop = 0; stop < 120; stop += 1) {
      if (wanted.test(await focused())) return;
      await page.keyboard.press('Tab');
    }
    throw new Error(`Tab never comes to ${wanted}`);
  };

  it('signs in: the email has the focus, Enter sends', async () => {
    await openPath(page, '/sign-in');
    const email = page.getByLabel('Email', { exact: true });
    await email.waitFor();
    await vi.waitUntil(() => email.evaluate((field) => field === document.activeElement), { timeout: patienceMs });
    await page.keyboard.type(stack.world.people.superintendent.email);
    await page.keyboard.press('Tab');
    await page.keyboard.type(password);
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/calendar/);
    await settle(page);
  });

  it('begins every page with a way past the bar', async () => {
    await page.reload();
    await settle(page);
    await page.keyboard.press('Tab');
    expect(await focused()).toBe('Skip to the page');
    await page.keyboard.press('Enter');
    await vi.waitUntil(() => page.evaluate(() => document.activeElement?.id === 'page'), { timeout: patienceMs });
  });

  it('opens sheets by their number and finds a lot by /', async () => {
    await page.keyboard.press('2');
    await page.waitForURL(/\/lots$/);
    await page.keyboard.press('4');
    await page.waitForURL(/\/rule-cards/);
    await page.keyboard.press('1');
    await page.waitForURL(/\/calendar/);
    await settle(page);
    await page.keyboard.press('/');
    await untilFocused(/^Find a lot, permit or address$/);
    await page.keyboard.type('P-27-0003');
    await page.getByRole('option').first().waitFor();
    await page.keyboard.press('Enter');
    await page.waitForURL(new RegExp(`/lots/${stack.world.lots[2].id}$`));
    // A digit typed into a field is a digit.
    await page.keyboard.press('/');
    await page.keyboard.type('1');
    await page.keyboard.press('Escape');
    expect(page.url()).toContain(stack.world.lots[2].id);
  });

  it('walks the ribbon by arrows; a day says its date and its visits', async () => {
    await openPath(page, `/calendar?date=${visit.window.date}`);
    await tabTo(/^(Mon|Tue|Wed|Thu|Fri), /);
    const first = await focused();
    await page.keyboard.press('ArrowRight');
    const next = await focused();
    expect(next).toMatch(/^(Mon|Tue|Wed|Thu|Fri), \w{3} \d+/);
    expect(next).not.toBe(first);
    await page.keyboard.press('ArrowLeft');
    expect(await focused()).toBe(first);
    await page.keyboard.press('End');
    const last = await focused();
    expect(last).toMatch(/^Fri, /);
    await page.keyboard.press('PageDown');
    await vi.waitUntil(async () => (await focused()) !== last && (await focused()) !== '', { timeout: patienceMs });
    expect(await focused()).toMatch(/^Fri, /);
  });

  it('moves a visit: grid, Enter, another window, Enter', async () => {
    await openPath(page, `/calendar?date=${visit.window.date}`);
    await tabTo(/Lot 1\b.*(not up|booked)/s);
    await page.keyboard.press('Enter');
    await page.waitForURL(/visit=/);
    await page.getByRole('button', { name: 'Move to another window' }).waitFor();
    await tabTo(/^Move to another window$/);
    await page.keyboard.press('Enter');
    const windows = page.getByRole('radiogroup', { name: 'Windows to move to' });
    await windows.waitFor();
    await vi.waitUntil(
      async () => {
        await page.keyboard.press('Tab');
        return windows.evaluate((group) => group.contains(document.activeElement));
      },
      { timeout: patienceMs, interval: 50 },
    );
    await page.keyboard.press('Space');
    await page.keyboard.press('ArrowDown');
    await tabTo(/^Move Lot 1 to /i);
    await page.keyboard.press('Enter');
    await see(page, /^Lot 1 moved to /);
    const moved = (await stack.call('superintendent', 'get', `/api/visits/${visit.id}`)) as VisitSummary;
    expect(moved.window.startAt).not.toBe(visit.window.startAt);
  });

  it('closes a question by Esc and gives the focus back to what asked it', async () => {
    await openPath(page, `/calendar?date=${visit.window.date}&visit=${visit.id}`);
    await page.getByRole('button', { name: 'Withdraw' }).waitFor();
    await tabTo(/^Withdraw$/);
    await page.keyboard.press('Enter');
    await page.getByRole('dialog').waitFor();
    await untilFocused(/^Keep the visit$/);
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
    await untilFocused(/^Withdraw$/);
    const kept = (await stack.call('superintendent', 'get', `/api/visits/${visit.id}`)) as VisitSummary;
    expect(kept.state).toBe('booked');
  });

  it('opens the list of keys by ? and the name menu closes by Esc', async () => {
    await openPath(page, '/calendar');
    await page.keyboard.press('?');
    await page.getByRole('dialog').waitFor();
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
    await tabTo(/organizations, language, theme, sign out$/);
    await page.keyboard.press('Enter');
    await page.getByRole('group', { name: 'Your own' }).waitFor();
    await page.keyboard.press('Escape');
    await page.getByRole('group', { name: 'Your own' }).waitFor({ state: 'hidden' });
    expect(await focused()).toMatch(/organizations, language, theme, sign out$/);
    expect(opened.complaints).toEqual([]);
  });
});
