import axe from 'axe-core';
import type { Page } from 'playwright-core';

declare global {
  interface Window {
    axe: typeof axe;
  }
}

/** Opens a path and waits until everything on it was read: a heading stands, nothing is busy, the network rests. */
export async function openPath(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await settle(page);
}

export async function settle(page: Page): Promise<void> {
  await page.getByRole('heading', { level: 1 }).first().waitFor({ state: 'attached' });
  await page.waitForLoadState('networkidle');
  await page.waitForFunction(() => document.querySelector('[aria-busy="true"]') === null);
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
}

/** How far the page is wider than its window, CSS px. */
export function overflowPx(page: Page): Promise<number> {
  return page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    return Math.max(0, scrollWidth - clientWidth);
  });
}

/** Which elements reach over the right edge of the window; for the message of a failed check. */
export function overhanging(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const edge = document.documentElement.clientWidth;
    const over = [...document.querySelectorAll('body *')].filter((one) => one.getBoundingClientRect().right > edge + 1);
    return over.slice(0, 4).map((one) => `${one.tagName.toLowerCase()}.${String(one.getAttribute('class') ?? '')}`);
  });
}

/**
 * What axe-core (an independent checker of WCAG 2.2 A and AA and common good practice) finds serious or critical, one line each.
 * `rules` narrows it to those named. Its source is evaluated by the browser's own protocol, which the page's policy does not bind.
 */
export async function axeFaults(page: Page, rules?: readonly string[]): Promise<string[]> {
  if (!(await page.evaluate(() => 'axe' in window))) await page.evaluate(axe.source);
  const violations = await page.evaluate(
    async (only) => {
      const runOnly = only === null ? undefined : { type: 'rule' as const, values: only };
      const found = await window.axe.run(document, { resultTypes: ['violations'], ...(runOnly && { runOnly }) });
      return found.violations.map(({ id, impact, nodes }) => ({
        id,
        impact: impact ?? 'none',
        where: nodes
          .slice(0, 3)
          .map((node) => `${node.target.join(' ')} ${node.failureSummary ?? ''}`.replaceAll('\n', ' ')),
      }));
    },
    rules === undefined ? null : [...rules],
  );
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, impact, where }) => `${impact} ${id}: ${where.join(' | ')}`);
}

/** A translation's key where words should be: two or more dotted parts that begin small, no address and no file. */
const keyPattern = /(?<![\w@./-])[a-z][A-Za-z]{2,}(?:\.[a-z][\w-]+)+(?![\w@/])/g;

/** Keys that show through: in the text of the page and in its names and hints. */
export async function shownKeys(page: Page): Promise<string[]> {
  const words = await page.evaluate(() => {
    const names = ['aria-label', 'placeholder', 'title', 'alt'];
    const named = [...document.querySelectorAll('*')].flatMap((one) =>
      names.map((name) => one.getAttribute(name) ?? ''),
    );
    return [document.title, document.body.innerText, ...named].join('\n');
  });
  return [...new Set(words.match(keyPattern) ?? [])].filter((found) => !found.endsWith('.test'));
}
