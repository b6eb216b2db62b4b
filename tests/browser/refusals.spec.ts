import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { launchBrowser, openContext } from '../support/browser.js';
import { signIn } from './support/people.js';
import { startStack, type Stack } from './support/stack.js';

describe('refusals as a person meets them', { timeout: 240_000 }, () => {
  let stack: Stack;
  let browser: Browser;
  beforeAll(async () => {
    stack = await startStack();
    browser = await launchBrowser();
  }, 240_000);
  afterAll(async () => {
    await browser?.close();
    await stack?.stop();
  });

  it('signs in', async () => {
    const { page, context, complaints } = await openContext(browser, stack.url);
    try {
      await signIn(page, stack.world.people.superintendent.email);
      await page.getByRole('heading', { level: 1 }).waitFor();
      await page.screenshot({ path: '/tmp/hwb/a.png' });
      console.log(complaints, page.url());
      expect(1).toBe(1);
    } finally {
      await context.close();
    }
  });
});
