import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { desk, launchBrowser, openContext, phone, type Opened } from '../support/browser.js';
import { axeFaults, openPath, overflowPx, overhanging, shownKeys } from './support/page-checks.js';
import { pathsOf } from './support/paths.js';
import { signIn } from './support/people.js';
import { makeScene } from './support/scene.js';
import { keepShot } from './support/shots.js';
import { startStack, type Stack } from './support/stack.js';

type Visited = { person: WorldPerson | null; paths: string[] };

describe('every page, at a phone and at a desk', { timeout: 600_000 }, () => {
  let stack: Stack;
  let browser: Browser;
  let visited: Visited[];
  beforeAll(async () => {
    stack = await startStack();
    visited = pathsOf(stack, await makeScene(stack));
    browser = await launchBrowser();
  }, 240_000);
  afterAll(async () => {
    await browser?.close();
    await stack?.stop();
  });

  /** Walks every path as its person, in one browser each, and gathers what is wrong, page by page. */
  const walk = async (
    options: BrowserContextOptions,
    look: (opened: Opened, where: string) => Promise<string[]>,
  ): Promise<string[]> => {
    const faults: string[] = [];
    for (const { person, paths } of visited) {
      // Colours on their way from one theme to the other are nobody's contrast.
      const opened = await openContext(browser, stack.url, { ...options, reducedMotion: 'reduce' });
      try {
        if (person !== null)
          await signIn(opened.page, stack.world.people[person].email, options.locale === 'es-US' ? 'es' : 'en');
        for (const path of paths) {
          const where = `${person ?? 'nobody'} ${path.replaceAll(/[0-9a-f]{8}-[0-9a-f-]{27}/g, '…')}`;
          try {
            await openPath(opened.page, path);
            faults.push(...(await look(opened, where)).map((fault) => `${where}: ${fault}`));
          } catch (error) {
            faults.push(`${where}: ${error instanceof Error ? error.message : String(error)}`);
          }
          opened.complaints.splice(0).forEach((complaint) => faults.push(`${where}: ${complaint}`));
        }
      } finally {
        await opened.context.close();
      }
    }
    return faults;
  };

  const sound = async (page: Page): Promise<string[]> => {
    const headings = await page.locator('h1').count();
    const over = await overflowPx(page);
    const light = await axeFaults(page);
    await page.emulateMedia({ colorScheme: 'dark' });
    await page.locator('html[data-theme="dark"]').waitFor();
    const dark = await axeFaults(page, ['color-contrast']);
    await page.emulateMedia({ colorScheme: 'light' });
    return [
      ...(headings === 1 ? [] : [`${headings} first headings`]),
      ...(over === 0 ? [] : [`${over} px wider than the window: ${(await overhanging(page)).join(', ')}`]),
      ...light,
      ...dark.map((fault) => `dark: ${fault}`),
    ];
  };

  it.each([
    ['1440 px', desk],
    ['390 px', phone],
  ])(
    'is sound at %s: one heading, no sideways scroll, no complaint, nothing axe finds serious',
    async (width, options) => {
      const faults = await walk({ ...options, colorScheme: 'light' }, async ({ page }, where) => {
        await keepShot(page, `${width} ${where}`);
        return sound(page);
      });
      expect(faults).toEqual([]);
    },
  );

  it.each([
    ['1440 px', desk],
    ['390 px', phone],
  ])('speaks Spanish at %s: no key shows through, nothing gets too wide', async (width, options) => {
    const everyone = visited.flatMap(({ person }) => (person === null ? [] : [person]));
    await Promise.all(everyone.map(async (person) => stack.call(person, 'patch', '/api/me', { locale: 'es' })));
    const faults = await walk({ ...options, locale: 'es-US' }, async ({ page }, where) => {
      await keepShot(page, `${width} es ${where}`);
      const language = await page.locator('html').getAttribute('lang');
      const over = await overflowPx(page);
      return [
        ...(language === 'es' ? [] : [`is in ${language}`]),
        ...(over === 0 ? [] : [`${over} px wider than the window: ${(await overhanging(page)).join(', ')}`]),
        ...(await shownKeys(page)).map((key) => `the key ${key} shows through`),
      ];
    });
    expect(faults).toEqual([]);
  });
});
