import { type Locator, type Page, expect } from '@playwright/test';

/** Most Tab stops between two things a person wants; more would be a page nobody can use by keyboard. */
const MOST_STOPS = 60;

/** Goes to a control with the Tab key alone. */
export async function tabTo(page: Page, target: Locator): Promise<void> {
  await expect(target).toBeVisible({ timeout: 30_000 });
  for (let stop = 0; stop < MOST_STOPS; stop++) {
    if (await target.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`not reached within ${MOST_STOPS} Tab stops: ${String(target)}`);
}

/** Goes to a control with Tab and presses Enter on it. */
export async function press(page: Page, target: Locator): Promise<void> {
  await tabTo(page, target);
  await page.keyboard.press('Enter');
}

/** Goes to a text control with Tab and types into it. */
export async function type(page: Page, target: Locator, text: string): Promise<void> {
  await tabTo(page, target);
  await page.keyboard.type(text);
}
