import type { Page } from 'playwright-core';
import { answer, choose, press, see, type } from './acts.js';
import { openPath } from './page-checks.js';

/** Chooses the stage of a request and waits for its windows: those of another stage stand there until then. */
export async function chooseStage(page: Page, stage: string): Promise<void> {
  const offers = page.waitForResponse((response) => response.url().endsWith('/api/visits/offers'));
  await choose(page, 'Stage', stage);
  await offers;
  await page.locator('label.on', { hasText: stage }).waitFor();
}

/** On the calendar: asks for the first window offered for a lot's rough-in; gives the words of the act that booked it. */
export async function requestWindow(page: Page, lotNumber: string): Promise<string> {
  await openPath(page, '/calendar');
  await press(page, 'Request a window');
  await type(page, 'Add a lot', lotNumber);
  await page.getByRole('list', { name: 'Lots found' }).getByRole('button').first().click();
  await chooseStage(page, 'Rough-in');
  const act = page.getByRole('button', { name: /^Book 1 visit, / });
  await act.waitFor();
  const words = (await act.innerText()).trim();
  await act.click();
  await see(page, /^1 visit booked, /);
  return words;
}

/** On the phone: a DWV test filled to the roof, its level read with a tape. */
export async function startDwvTest(page: Page): Promise<void> {
  await choose(page, 'How it is tested', 'stack filled to the roof');
  await type(page, 'Smallest mark of the tape', '0.125');
  await type(page, 'Water below the rim', '2');
  await page.getByRole('button', { name: /^Start the test/ }).click();
  await see(page, 'The test stands, its first reading is kept');
}

/** On the phone: water lines pumped up against a gauge, and everything said to be up. */
export async function startWaterTestAndSayUp(page: Page): Promise<void> {
  await choose(page, 'With', /^water, at least 100 psi/);
  await type(page, 'Gauge goes to', '200');
  await type(page, 'Smallest mark', '2');
  await choose(page, 'Gauge valve', 'open');
  await type(page, 'Gauge reads', '120');
  await press(page, 'Save and say test up');
  await see(page, /^Lot \d+: test up$/);
}

/** On the run of that day: I am here, before the window, and on to the outcome. */
export async function beginEarly(page: Page, date: string, lotNumber: string): Promise<void> {
  await openPath(page, `/run?date=${date}`);
  await press(page.getByRole('region', { name: `Lot ${lotNumber}`, exact: true }), 'I am here');
  await press(page.getByRole('dialog'), 'Start now');
  await page.waitForURL(/\/visits\/[0-9a-f-]+\/outcome$/);
  await page.getByRole('heading', { name: 'The work' }).waitFor();
}

/** Looks at every point of the work. */
export async function lookAtTheWork(page: Page): Promise<void> {
  const points = page.getByRole('list', { name: 'The work' }).getByRole('checkbox');
  for (const point of await points.all()) await point.click();
}

export async function answerWater(page: Page): Promise<void> {
  const water = page.getByRole('region', { name: 'Water', exact: true });
  await choose(water, 'When you opened the gauge valve, the needle', 'stayed');
  await type(water, 'Gauge reads', '118');
  await choose(water, 'Water', 'pass');
}

/** One correction on the drain, touched on the house. */
export async function openCorrection(page: Page, words: string): Promise<void> {
  await press(page.getByRole('region', { name: 'DWV', exact: true }), 'Open a correction');
  await page.getByRole('button', { name: /^Touch the place on the house/ }).click();
  await type(page, 'In words', words);
  await choose(page, 'How grave', 'fix before cover');
  await press(page, 'Add correction');
}

export async function record(page: Page, kind: 'pass' | 'fail'): Promise<void> {
  await press(page, `Record ${kind}`);
  await answer(page, `Record ${kind}`);
  await see(page, new RegExp(`^Lot \\d+: ${kind}`));
}

/** Writes to the lot's thread. */
export async function write(page: Page, words: string): Promise<void> {
  await page.getByPlaceholder('Write').fill(words);
  await press(page, 'Send');
}

/** Opens the choice of another window. The panel may be drawn anew while the page is still being read: then the act is pressed again. */
export async function openMove(page: Page): Promise<void> {
  const windows = page.getByRole('radiogroup', { name: 'Windows to move to' });
  for (let presses = 0; presses < 5; presses += 1) {
    await press(page, 'Move to another window');
    const isOpen = await windows.waitFor({ timeout: 10_000 }).then(
      () => true,
      () => false,
    );
    if (isOpen) return;
  }
  await windows.waitFor();
}
