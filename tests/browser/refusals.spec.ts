import type { Browser, Page } from 'playwright-core';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { desk, launchBrowser, openContext, phone, type Opened } from '../support/browser.js';
import { press, see, type } from './support/acts.js';
import { openPath } from './support/page-checks.js';
import { openAs } from './support/people.js';
import { request, takeableWindows } from './support/scene.js';
import { startStack, type Stack } from './support/stack.js';
import { chooseStage } from './support/story-acts.js';

describe('refusals as a person meets them', { timeout: 240_000 }, () => {
  let stack: Stack;
  let browser: Browser;
  let opened: Opened | null = null;
  beforeAll(async () => {
    stack = await startStack();
    browser = await launchBrowser();
  }, 240_000);
  afterEach(async () => {
    await opened?.context.close();
    opened = null;
  });
  afterAll(async () => {
    await browser?.close();
    await stack?.stop();
  });
  const open = async (person: WorldPerson, options: typeof desk | typeof phone = desk): Promise<Page> => {
    opened = await openAs(browser, stack, person, options);
    return opened.page;
  };

  it('tells the tries left after a wrong password, of an address that nobody has too', async () => {
    opened = await openContext(browser, stack.url);
    const { page } = opened;
    await openPath(page, '/sign-in');
    for (const email of [stack.world.people.desk.email, 'nobody@example.test']) {
      await type(page, 'Email', email);
      await type(page, 'Password', 'not the password');
      await press(page, 'Sign in');
      await page
        .getByRole('alert')
        .filter({ hasText: /Email or password do not match\. \d tries left\./ })
        .waitFor();
      expect(await page.getByLabel('Email', { exact: true }).inputValue()).toBe(email);
      await page.reload();
    }
  });

  it('knows no lot of strangers', async () => {
    const page = await open('superintendent');
    await openPath(page, `/lots/${stack.world.otherLot.id}`);
    await see(page, /^No such .* for you/);
    expect(await page.getByText(stack.world.otherLot.address).count()).toBe(0);
  });

  it('offers the next best when a window filled up meanwhile', async () => {
    const [first, second, third, fourth] = stack.world.lots;
    const page = await open('superintendent');
    await openPath(page, `/calendar?request=${fourth.id}&stage=rough-in`);
    const act = page.getByRole('button', { name: /^Book 1 visit, / });
    await act.waitFor();
    const [window] = await takeableWindows(stack, fourth.id);
    if (!window) throw new Error('no window can be taken');
    for (const lot of [first, second, third]) await request(stack, lot.id, { window });
    await act.click();
    const told = page.getByRole('alert').filter({ hasText: 'The best window left:' });
    await told.waitFor();
    await told.getByRole('button', { name: 'Book this' }).first().click();
    await see(page, /^1 visit booked, /);
    const left = await takeableWindows(stack, fourth.id).catch(() => []);
    expect(left.filter(({ date, label }) => date === window.date && label === window.label)).toEqual([]);
  });

  it('tells the faults of a list line by line, and adds nothing', async () => {
    const page = await open('superintendent');
    await openPath(page, '/lots/import');
    await type(
      page,
      'Or paste the list',
      'number,address,latitude,longitude\n71,7 Quillback Way,north,-105\n72,7 Quillback Way,39.7,-105\n,9 Quillback Way,39.7,-105\n',
    );
    await press(page, 'Try it');
    const report = page.getByRole('table');
    await report.getByRole('row').nth(3).waitFor();
    const rows = (await report.getByRole('row').allInnerTexts()).map((row) => row.replaceAll(/\s+/g, ' ').trim());
    expect(rows.find((row) => /^2 /.test(row))).toMatch(/latitude/i);
    expect(rows.find((row) => /^3 /.test(row))).toMatch(/address It stands twice in the list/);
    expect(rows.find((row) => /^4 /.test(row))).toMatch(/number/);
    const lots = (await stack.call('superintendent', 'get', '/api/lots?limit=100')) as {
      items: Array<{ number: string }>;
    };
    expect(lots.items.map(({ number }) => number)).not.toContain('71');
  });

  it('shows a script in a comment as text', async () => {
    const page = await open('plumber', phone);
    const script = `<img src=x onerror="document.title='taken'"><script>document.title='taken'</script>`;
    await openPath(page, `/lots/${stack.world.lots[0].id}/thread`);
    await page.getByPlaceholder('Write').fill(script);
    await press(page, 'Send');
    await see(page, script);
    await page.reload();
    await see(page, script);
    expect(await page.title()).not.toBe('taken');
    expect(await page.locator('main img[src="x"]').count()).toBe(0);
    expect(opened?.complaints).toEqual([]);
  });

  it('says in the act what a request lacks', async () => {
    const page = await open('superintendent');
    await openPath(page, '/calendar');
    await press(page, 'Request a window');
    const act = page.getByRole('button', { name: /no lot chosen/ });
    await act.waitFor();
    expect(await act.getAttribute('aria-disabled')).toBe('true');
    // It is not pressed for good: a person may press it and is led to what is missing.
    await act.click({ force: true });
    await type(page, 'Add a lot', '6');
    await page.getByRole('list', { name: 'Lots found' }).getByRole('button').first().click();
    await chooseStage(page, 'Rough-in');
    await page.getByRole('button', { name: /^Book 1 visit, / }).waitFor();
  });
});
