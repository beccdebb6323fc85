import AxeBuilder from '@axe-core/playwright';
import { type Page, expect, test } from '@playwright/test';
import { origin } from '@/tests/support/running-server';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { WireClient } from '@/tests/support/wire/wire-client';

const SIZES = [
  { width: 390, height: 844 },
  { width: 1280, height: 800 },
] as const;

/** Pictures at both sizes, nothing for axe to find, nothing that scrolls the page sideways. */
async function look(page: Page, name: string): Promise<void> {
  for (const size of SIZES) {
    await page.setViewportSize(size);
    await page.screenshot({ path: screenshotPath(`${name}-${size.width}`), fullPage: true });
    const wide = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    expect([name, size.width, wide]).toEqual([name, size.width, 0]);
  }
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
}

/** Three warm days of a logger whose dates may be read both ways, in °F, with a gap, a line twice and a hot hour. */
function ambiguousFile(): string {
  const rows = Array.from({ length: 72 }, (_, i) => {
    const [day, hour] = [3 + Math.floor(i / 24), i % 24];
    const celsius = i === 38 ? 43 : 22 + 6 * Math.sin(((hour - 9) * Math.PI) / 12);
    return `0${day}/06/2026 ${String(hour).padStart(2, '0')}:00;${((celsius * 9) / 5 + 32).toFixed(1).replace('.', ',')}`;
  });
  const withGap = rows.filter((_, i) => i < 30 || i > 32);
  return ['Logger under the eaves', 'Date and time;Temp (°F)', ...withGap, rows.at(-1)].join('\r\n');
}

async function nestId(code: string): Promise<string> {
  const client = new WireClient(origin());
  await client.signIn('reviewer@tarrow.example');
  const { nests } = await client.get<{ nests: { id: string; code: string }[] }>(`/api/nests?q=${code}`);
  return nests.find((nest) => nest.code === code)?.id ?? '';
}

test('a technician keeps a logger’s file after seeing what it is, and takes it out again', async ({ page }) => {
  test.slow();
  const nest = await nestId('N03');
  await signInByForm(page, 'technician@tarrow.example');
  await page.goto(`/nests/${nest}#temperature`);
  await expect(page.getByText('No temperature record: a day counts as a day')).toBeVisible();
  await page.getByText('Add a temperature file').click();
  const file = { name: 'eaves.csv', mimeType: 'text/csv', buffer: Buffer.from(ambiguousFile()) };
  await page.getByLabel('A logger’s file').setInputFiles(file);
  await expect(page.getByText('may have the day or the month first')).toBeVisible();
  await page.getByRole('button', { name: 'Day first' }).click();
  await expect(page.getByText('°F (the file says so)')).toBeVisible();
  await expect(page.getByText('1 line twice')).toBeVisible();
  await look(page, 'temperature-preview');
  await page.getByRole('button', { name: 'Keep this record' }).click();
  await expect(page.getByText('It was too hot for brood')).toBeVisible();
  await expect(page.getByRole('img', { name: /Lowest and highest of each day from 3 June to 5 June/ })).toBeVisible();
  await page.getByText('The same days as a table').click();
  await look(page, 'temperature-kept');

  await page.getByRole('button', { name: /Take out/ }).click();
  await page.getByLabel('Reason').fill('It hung at another nest.');
  await page.getByRole('button', { name: 'Take it out' }).click();
  await expect(page.getByText('No temperature record: a day counts as a day')).toBeVisible();
  await expect(page.getByText('It hung at another nest.')).toBeVisible();

  await page.getByText('Note a day by hand').click();
  await page.getByLabel('Day', { exact: true }).fill('2026-06-04');
  await page.getByLabel('Lowest', { exact: true }).fill('25');
  await page.getByLabel('Highest', { exact: true }).fill('12,5');
  await page.getByRole('button', { name: 'Keep the day' }).click();
  await expect(page.getByText('The lowest is above the highest.')).toBeVisible();
});

test('the lead biologist drafts settings, sees what would move, and signs', async ({ page }) => {
  test.slow();
  await signInByForm(page, 'biologist@tarrow.example');
  await page.goto('/settings');
  await expect(page.getByRole('heading', { name: 'Settings', exact: true })).toBeVisible();
  await look(page, 'settings');
  await page.getByRole('link', { name: 'What your own readings say about them' }).click();
  await expect(page.getByRole('heading', { name: 'What your own readings say' })).toBeVisible();
  await look(page, 'settings-learning');

  await page.goto('/settings/draft');
  await page.getByLabel('True egg, recorded empty').fill('0.5');
  await page.getByRole('button', { name: 'Save the draft' }).click();
  await expect(page.getByText('Confusion, row egg: the shares add up to 1.45, not to 1.')).toBeVisible();
  await page.getByLabel('True egg, recorded empty').fill('0,05');
  await page.getByLabel('From founding to the first egg', { exact: true }).fill('5');
  await page.getByRole('button', { name: 'Save the draft' }).click();
  await expect(page.getByText('Saved. It changes nothing before it is signed.')).toBeVisible();
  await page.getByRole('button', { name: 'Show which dates would move' }).click();
  await expect(page.getByText('4 days earlier').first()).toBeVisible({ timeout: 60_000 });
  await expect(page.getByText(/^\d+ nests looked at$/)).toBeVisible({ timeout: 60_000 });
  await look(page, 'settings-draft');

  await page.getByLabel('Why these numbers').fill('Stalks took five days in our own notes.');
  await page.getByRole('button', { name: 'Sign version 2' }).click();
  await page.getByRole('button', { name: 'Sign it' }).click();
  await expect(page).toHaveURL(/settings$/);
  await expect(page.getByText('Stalks took five days in our own notes.')).toBeVisible();
  await page.getByRole('link', { name: 'What version 2 changed' }).click();
  await expect(page.getByRole('cell', { name: 'From founding to the first egg' })).toBeVisible();
  await look(page, 'settings-compare');
});
