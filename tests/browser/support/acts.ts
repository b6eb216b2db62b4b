import type { Locator, Page } from 'playwright-core';

type Place = Page | Locator;

/** Chooses one of a few by its words, as a finger does: the radio button itself is under them. */
export async function choose(place: Place, group: string | RegExp, option: string | RegExp): Promise<void> {
  const radios = place.getByRole('radiogroup', { name: group, exact: true });
  await radios.locator('label').filter({ hasText: option }).first().click();
}

/** Types into a field found by its label. */
export async function type(place: Place, label: string, text: string): Promise<void> {
  await place.getByLabel(label, { exact: true }).fill(text);
}

export async function press(place: Place, name: string | RegExp): Promise<void> {
  await place.getByRole('button', { name, exact: true }).click();
}

/** Presses the act again in the question that it asks. */
export async function answer(page: Page, name: string | RegExp): Promise<void> {
  const question = page.getByRole('dialog');
  await press(question, name);
  await question.waitFor({ state: 'hidden' });
}

/** Waits until the words stand on the page. */
export async function see(place: Place, text: string | RegExp): Promise<void> {
  await place.getByText(text).locator('visible=true').first().waitFor();
}
