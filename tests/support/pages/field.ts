import { type Page, expect } from '@playwright/test';

/** What a test opens on the phone. */
export interface NewReading {
  code: string;
  counted?: number;
}

/** Opens the phone app with a full load and waits until the nests of the team are on it. */
export async function openField(page: Page, shows: RegExp | string = 'N12'): Promise<void> {
  await page.goto('/field');
  await expect(page.getByText(shows).first()).toBeVisible({ timeout: 30_000 });
}

/** Waits until the service worker holds the whole app, so that it opens with the server gone. */
export async function untilInstalled(page: Page): Promise<void> {
  await page.evaluate(async () => {
    const registration = await navigator.serviceWorker.ready;
    if (registration.active?.state !== 'activated') {
      await new Promise((resolve) => registration.active?.addEventListener('statechange', resolve, { once: true }));
    }
  });
}

/** Starts a nest, a take-down visit and a reading by the keys a technician presses; answers the recorder's path. */
export async function startReading(page: Page, { code, counted }: NewReading): Promise<string> {
  await page.getByRole('link', { name: 'Start a nest' }).first().click();
  await page.getByLabel('Code').fill(code);
  await page.getByRole('button', { name: 'Start the nest' }).click();
  await page.getByRole('link', { name: 'Start a visit' }).click();
  await page.getByRole('button', { name: 'Start the visit' }).click();
  return readCells(page, counted);
}

/** Starts a reading on the visit that is open; answers the recorder's path. */
export async function readCells(page: Page, counted?: number): Promise<string> {
  await page.getByRole('button', { name: 'Start reading' }).click();
  if (counted !== undefined) await page.getByRole('dialog').getByRole('textbox').fill(String(counted));
  await page.getByRole('button', { name: 'Read the cells' }).click();
  await expect(page.getByRole('group', { name: 'Keys' })).toBeVisible();
  return new URL(page.url()).pathname;
}

/** The large key of a state. */
function stateKey(page: Page, name: string) {
  return page.getByRole('group', { name: 'Keys' }).getByRole('button', { name: new RegExp(`^${name}\\b`, 'i') });
}

/** Presses one key a cell and waits until each mark is said to be saved. */
export async function pressAll(page: Page, states: readonly string[]): Promise<void> {
  for (const state of states) await stateKey(page, state).click();
}

/** Waits until nothing is left to send. */
export async function untilSent(page: Page): Promise<void> {
  await expect(page.getByText(/at the office/i).first()).toBeVisible({ timeout: 60_000 });
}
