import type { Browser, Page } from 'playwright-core';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { desk, launchBrowser } from '../support/browser.js';
import { choose, press, see } from './support/acts.js';
import { openPath } from './support/page-checks.js';
import { openAs } from './support/people.js';
import { keepShot } from './support/shots.js';
import { startStack, type Stack } from './support/stack.js';

describe('a test plan on its page', { timeout: 240_000 }, () => {
  let stack: Stack;
  let browser: Browser;
  let page: Page;
  let complaints: string[];
  beforeAll(async () => {
    stack = await startStack();
    browser = await launchBrowser();
    const opened = await openAs(browser, stack, 'plumber', desk);
    ({ page, complaints } = opened);
    // The browser's own dialog would wait for somebody.
    await page.addInitScript(() => {
      window.print = () => undefined;
    });
  }, 240_000);
  afterAll(async () => {
    await browser?.close();
    await stack?.stop();
  });

  it('is chosen among the ways of this house, and says why the others do not serve', async () => {
    const lot = stack.world.lots[0];
    await openPath(page, `/lots/${lot.id}/plan`);
    await choose(page, 'Stage', 'Rough-in');
    await see(page, 'the rule card does not accept it');
    await page
      .getByRole('button', { name: /Attic cut/ })
      .first()
      .click();
    await press(page, 'Choose this way');
    await see(page, /^Chosen: Attic cut/);
    await keepShot(page, 'plan chosen');
    const { items } = (await stack.call('superintendent', 'get', `/api/lots/${lot.id}/plans`)) as { items: TestPlan[] };
    expect(items.map(({ method, system }) => [method, system])).toEqual([['attic-cut', 'dwv']]);
    expect(complaints).toEqual([]);
  });

  it('prints on one sheet, with the tag for the gauge', async () => {
    await press(page, 'Print the plan and the tag');
    await page.locator('.plan-print').waitFor({ state: 'attached' });
    await page.emulateMedia({ media: 'print' });
    await see(page, 'Under pressure.');
    await see(page, 'The local code, the department and a licensed plumber decide.');
    await page.emulateMedia({ media: null });
    const paper = (await page.pdf({ preferCSSPageSize: true })).toString('latin1');
    // ISO 32000-1, 7.7.3: the root of the page tree counts the pages.
    expect(/\/Type \/Pages\s+\/Count (\d+)/.exec(paper)?.[1]).toBe('1');
  });
});
