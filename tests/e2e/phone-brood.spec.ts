import AxeBuilder from '@axe-core/playwright';
import { type Page, expect, test } from '@playwright/test';
import type { CellState } from '@/lib/comb/states';
import { openField, pressAll, readCells, startReading, untilInstalled, untilSent } from '@/tests/support/pages/field';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { origin } from '@/tests/support/running-server';
import { pushVisitedNest } from '@/tests/support/wire/visited-nest';
import { WireClient } from '@/tests/support/wire/wire-client';

const TECHNICIAN = 'technician@tarrow.example';
const DAY = 86_400_000;
const LAST: readonly CellState[] = ['capped', 'capped', 'large', 'medium', 'small', 'egg', 'egg', 'empty'];

async function nothingForAxe(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual([]);
}

/** Opens a second visit, two days after the first, and its recorder. */
async function secondVisit(page: Page, code: string): Promise<string> {
  const client = new WireClient(origin());
  await client.signIn(TECHNICIAN);
  await client.enrol();
  const startedAt = new Date(Date.now() - 2 * DAY).toISOString().replace('Z', '+00:00');
  const { nest } = await pushVisitedNest(client, code, [{ startedAt, states: LAST }]);
  await signInByForm(page, TECHNICIAN);
  await openField(page, code);
  await page.goto(`/field/nests/${nest}`);
  await page.getByRole('link', { name: 'Start a visit' }).click();
  await page.getByRole('button', { name: 'Start the visit' }).click();
  await readCells(page);
  await expect(page.getByRole('button', { name: /^As expected: capped/ })).toBeVisible({ timeout: 20_000 });
  return nest;
}

test('without signal the phone estimates after a reading, beside the main thread', async ({ page, context }) => {
  await signInByForm(page, TECHNICIAN);
  await openField(page);
  await untilInstalled(page);
  await page.reload();
  await context.setOffline(true);
  const started = page.waitForEvent('worker');
  await startReading(page, { code: 'PREVIEW-1', counted: 6 });
  await pressAll(page, ['Capped', 'Large', 'Medium', 'Small', 'Egg', 'Empty']);
  await page.getByRole('button', { name: 'Finish' }).click();
  await expect(page.getByText(/Estimate from 1 reading on this phone/)).toBeVisible({ timeout: 20_000 });
  expect(new URL((await started).url()).pathname).toBe('/field/brood-worker.js');
  await expect(page.getByText(/between .* and /).first()).toBeVisible();
  await page.screenshot({ path: screenshotPath('field-preview-390'), fullPage: true });
  await nothingForAxe(page);
  await context.setOffline(false);
});

test('a browser without workers says who estimates instead, and reads on', async ({ page }) => {
  await page.addInitScript(() => Object.defineProperty(window, 'Worker', { value: undefined }));
  await signInByForm(page, TECHNICIAN);
  await openField(page);
  await startReading(page, { code: 'PREVIEW-2', counted: 1 });
  await pressAll(page, ['Egg']);
  await page.getByRole('button', { name: 'Finish' }).click();
  await expect(page.getByText(/This browser cannot estimate by itself/)).toBeVisible();
  await page.getByRole('button', { name: 'Submit reading' }).click();
  await untilSent(page);
});

test('the next visit starts from what is expected: one press a cell, and the rest with their number', async ({
  page,
}) => {
  const nest = await secondVisit(page, 'EXPECT-1');
  await expect(page.getByRole('gridcell', { name: 'cell 0, ring 0, no mark, expected capped' })).toBeVisible();
  await page.screenshot({ path: screenshotPath('field-expected-390') });
  await nothingForAxe(page);
  await page.getByRole('button', { name: /^As expected: capped/ }).click();
  await expect(page.getByText('Cell 1', { exact: true })).toBeVisible();
  await expect(page.getByRole('gridcell', { name: 'cell 0, ring 0, capped' })).toBeVisible();
  await page.keyboard.press('=');
  await expect(page.getByText('Cell 2', { exact: true })).toBeVisible();

  await page.getByRole('button', { name: 'Tools' }).click();
  await page.getByRole('button', { name: 'The rest as expected' }).click();
  const sheet = page.getByRole('dialog', { name: 'The rest as expected?' });
  await expect(sheet.getByRole('button', { name: /^Mark the 1 cell you stepped through/ })).toBeVisible();
  await nothingForAxe(page);
  await sheet.getByRole('button', { name: /^Mark all 6 cells left/ }).click();
  await expect(page.getByText('8 cells').first()).toBeVisible();
  await page.getByRole('button', { name: 'Finish' }).click();
  await expect(page.getByText(/Estimate from 2 readings on this phone/)).toBeVisible({ timeout: 20_000 });
  await page.getByRole('button', { name: 'Submit reading' }).click();
  await untilSent(page);

  const office = new WireClient(origin());
  await office.signIn(TECHNICIAN);
  const { visits } = await office.get<{ visits: { readings: { id: string; tally: { cellsTotal: number } }[] }[] }>(
    `/api/nests/${nest}`,
  );
  expect(visits.map(({ readings }) => readings[0]?.tally.cellsTotal)).toEqual([8, 8]);
});

test('a mark that hardly fits the last visit is kept and asked about, never refused', async ({ page }) => {
  await secondVisit(page, 'EXPECT-2');
  await pressAll(page, ['Egg']);
  const sheet = page.getByRole('dialog', { name: 'Cell 0: is that so?' });
  await expect(sheet).toContainText('Capped 2 days ago, egg now.');
  await expect(page.locator('[data-cell="0,0"]')).toHaveAttribute('aria-label', /egg/);
  await nothingForAxe(page);
  await sheet.getByRole('button', { name: 'Egg, but unsure' }).click();
  await expect(page.getByRole('gridcell', { name: 'cell 0, ring 0, egg, unsure' })).toBeVisible();
  await expect(page.getByText('Cell 1', { exact: true })).toBeVisible();
  await pressAll(page, ['Large']);
  await page.getByRole('dialog').getByRole('button', { name: 'Take the mark back' }).click();
  await expect(page.getByRole('gridcell', { name: /^cell 1, ring 1, no mark, expected/ })).toBeVisible();
  await pressAll(page, ['Capped']);
  await expect(page.getByRole('dialog')).toHaveCount(0);
});
