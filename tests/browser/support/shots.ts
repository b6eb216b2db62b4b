import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from 'playwright-core';

/** Keeps a picture for people to look at, where the run names a folder for them by TEST_SHOTS_DIR. */
export async function keepShot(page: Page, name: string): Promise<void> {
  const folder = process.env.TEST_SHOTS_DIR;
  if (folder === undefined) return;
  mkdirSync(folder, { recursive: true });
  const file = name.replaceAll(/[^\w.-]+/g, '_').slice(0, 120);
  await page.screenshot({ path: join(folder, `${file}.png`), fullPage: true });
}
