import { readFileSync } from 'node:fs';
import { type Browser, type Page, expect, test } from '@playwright/test';
import { openField, pressAll, startReading, untilSent } from '@/tests/support/pages/field';
import { settled } from '@/tests/support/pages/field-screens';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { WireClient } from '@/tests/support/wire/wire-client';
import { origin } from '@/tests/support/running-server';

const FIRST = 'technician@tarrow.example';
const SECOND = 'technician2@tarrow.example';
const MARKS = 50;
const STATES = ['Egg', 'Small', 'Medium', 'Large', 'Capped'] as const;

/** A phone whose pushes never arrive, until they may. No service worker: it would send behind the page's back. */
async function mutePhone(browser: Browser) {
  const context = await browser.newContext({ baseURL: origin(), serviceWorkers: 'block', acceptDownloads: true });
  await context.route('**/api/sync/v1/push', (route) => route.abort());
  return { context, page: await context.newPage() };
}

async function signOutKeeping(page: Page): Promise<void> {
  await page.goto('/field/settings');
  await page.getByRole('button', { name: 'Sign out and keep them here' }).click();
  await expect(page.getByRole('heading', { name: 'Sign in to begin' })).toBeVisible();
}

async function copyOf(page: Page, key: string): Promise<string> {
  const coming = page.waitForEvent('download');
  await page.getByRole('button', { name: key }).click();
  const path = await (await coming).path();
  return path;
}

async function takeIn(page: Page, file: string): Promise<void> {
  await page.goto('/field/unsent/bring-in');
  await page.getByLabel('File of unsent work').setInputFiles(file);
}

async function marksAtOffice(code: string): Promise<number[]> {
  const reviewer = new WireClient(origin());
  await reviewer.signIn('reviewer@tarrow.example');
  const { nests } = await reviewer.get<{ nests: { id: string }[] }>(`/api/nests?q=${code}`);
  const nest = await reviewer.get<{ visits: { readings: { id: string }[] }[] }>(`/api/nests/${nests[0]?.id}`);
  const reading = nest.visits[0]?.readings[0]?.id ?? '';
  const { marks } = await reviewer.get<{ marks: { cell: number }[] }>(`/api/readings/${reading}`);
  return marks.map(({ cell }) => cell);
}

test.describe('a shared phone', () => {
  test.setTimeout(300_000);

  test('fifty unsent marks are shown to nobody else, lost to nobody, and counted once from two phones', async ({
    browser,
  }) => {
    const { context, page } = await mutePhone(browser);
    await signInByForm(page, FIRST);
    await openField(page);
    await startReading(page, { code: 'HANDED-50', counted: MARKS });
    await pressAll(
      page,
      Array.from({ length: MARKS }, (_, n) => STATES[n % STATES.length] ?? 'Egg'),
    );
    await page.goto('/field/unsent');
    await expect(page.getByRole('heading', { name: `Still on this phone: ${MARKS + 3} items` })).toBeVisible();
    await page.goto('/field/settings');
    await settled(page);
    await page.screenshot({ path: screenshotPath('field-settings-unsent-390'), fullPage: true });

    for (let turn = 0; turn < 2; turn++) {
      await signOutKeeping(page);
      expect(await page.content()).not.toContain('HANDED-50');
      await signInByForm(page, SECOND);
      await openField(page);
      await expect(page.getByText('HANDED-50')).toHaveCount(0);
      await page.goto('/field/unsent');
      await expect(page.getByRole('heading', { name: 'Nothing is unsent' })).toBeVisible();
      await page.goto('/field/settings');
      await page.getByRole('button', { name: 'Sign out', exact: true }).click();
      await expect(page.getByRole('heading', { name: 'Sign in to begin' })).toBeVisible();
      await signInByForm(page, FIRST);
      await openField(page, 'HANDED-50');
    }

    await page.goto('/field/unsent');
    await expect(page.getByRole('heading', { name: `Still on this phone: ${MARKS + 3} items` })).toBeVisible();
    const file = await copyOf(page, 'Copy of everything unsent');

    await test.step('a file of one person is not taken in by another', async () => {
      const desk = await browser.newContext({ baseURL: origin(), serviceWorkers: 'block' });
      const other = await desk.newPage();
      await signInByForm(other, SECOND);
      await openField(other);
      await takeIn(other, file);
      await expect(other.getByRole('alert').getByText('This is the work of Tobiah Marsh')).toBeVisible();
      await desk.close();
    });

    await test.step('another phone takes the file in, twice, and sends it', async () => {
      const desk = await browser.newContext({ baseURL: origin(), serviceWorkers: 'block' });
      const other = await desk.newPage();
      await signInByForm(other, FIRST);
      await openField(other);
      await takeIn(other, file);
      await expect(other.getByText(`${MARKS + 3} items taken in`)).toBeVisible();
      await other.screenshot({ path: screenshotPath('field-bring-in-done-390') });
      await takeIn(other, file);
      await expect(other.getByText('Everything in it was here already')).toBeVisible();
      await untilSent(other);
      await desk.close();
    });
    const cells = Array.from({ length: MARKS }, (_, n) => n);
    expect(await marksAtOffice('HANDED-50')).toEqual(cells);

    await test.step('the first phone sends the same, and each still counts once', async () => {
      await context.unroute('**/api/sync/v1/push');
      await page.goto('/field/unsent');
      await page.getByRole('button', { name: 'Send now' }).click();
      await untilSent(page);
    });
    expect(await marksAtOffice('HANDED-50')).toEqual(cells);
    await context.close();
  });

  test('copying and deleting needs the copy and the typed word, and leaves nothing of it on the phone', async ({
    browser,
  }) => {
    const { context, page } = await mutePhone(browser);
    await signInByForm(page, FIRST);
    await openField(page);
    await startReading(page, { code: 'DELETED-3', counted: 3 });
    await pressAll(page, ['Egg', 'Egg', 'Empty']);
    const second = await context.newPage();
    await second.goto('/field');
    await expect(second.getByText('DELETED-3').first()).toBeVisible();

    await page.goto('/field/settings');
    await page.getByText('Make a copy, then delete them here').click();
    await expect(page.getByRole('button', { name: 'Delete here and sign out' })).toHaveCount(0);
    const file = await copyOf(page, '1. Make the copy');
    await page.getByRole('button', { name: 'Delete here and sign out' }).click();
    await expect(page.getByText('Nothing is deleted before the word delete stands here.')).toBeVisible();
    await page.getByLabel('Type the word delete').fill('delete');
    await page.screenshot({ path: screenshotPath('field-settings-delete-390'), fullPage: true });
    await page.getByRole('button', { name: 'Delete here and sign out' }).click();
    await expect(page.getByRole('heading', { name: 'Sign in to begin' })).toBeVisible();
    // The other tab of the phone shows nothing of it either.
    await expect(second.getByRole('heading', { name: 'Sign in to begin' })).toBeVisible();
    const names = await page.evaluate(async () => (await indexedDB.databases()).map(({ name }) => name));
    expect(names).toEqual(['undereave-device']);

    const kept: { ops: { op: { kind: string } }[] } = JSON.parse(readFileSync(file, 'utf8'));
    expect(kept.ops.map(({ op }) => op.kind).sort()).toEqual(
      ['cell.mark', 'cell.mark', 'cell.mark', 'nest.open', 'reading.open', 'visit.open'].sort(),
    );
    await context.unroute('**/api/sync/v1/push');
    await signInByForm(page, FIRST);
    await openField(page);
    await takeIn(page, file);
    await untilSent(page);
    expect(await marksAtOffice('DELETED-3')).toEqual([0, 1, 2]);
    await context.close();
  });

  test('a session that has run out asks the same person, and gives another one nothing', async ({ browser }) => {
    const { context, page } = await mutePhone(browser);
    await signInByForm(page, FIRST);
    await openField(page);
    await startReading(page, { code: 'WEEKS-1', counted: 3 });
    await pressAll(page, ['Egg']);
    await context.clearCookies();
    await page.goto('/field');
    await expect(page.getByText('Sign in again as Tobiah Marsh')).toBeVisible();
    await expect(page.getByText('WEEKS-1').first()).toBeVisible();
    await page.screenshot({ path: screenshotPath('field-expired-390') });
    await signInByForm(page, SECOND);
    await openField(page);
    await expect(page.getByText('WEEKS-1')).toHaveCount(0);
    await page.goto('/field/settings');
    await page.getByRole('button', { name: 'Sign out', exact: true }).click();
    await signInByForm(page, FIRST);
    await openField(page, 'WEEKS-1');
    await context.unroute('**/api/sync/v1/push');
    await page.goto('/field/unsent');
    await page.getByRole('button', { name: 'Send now' }).click();
    await untilSent(page);
    await context.close();
  });
});
