import { readFileSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import { type Page, expect, test } from '@playwright/test';
import type { CellState } from '@/lib/comb/states';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { origin } from '@/tests/support/running-server';
import { type ReadVisit, pushVisitedNest } from '@/tests/support/wire/visited-nest';
import { WireClient } from '@/tests/support/wire/wire-client';

const WIDE = { width: 1280, height: 800 };
const REVIEWER = 'reviewer@tarrow.example';

/** So many cells of each state, in the order of the walk. */
function cells(counts: Partial<Record<CellState, number>>): CellState[] {
  return Object.entries(counts).flatMap(([state, count]) => Array<CellState>(count).fill(state as CellState));
}

const THREE_VISITS: readonly ReadVisit[] = [
  { startedAt: '2026-06-01T08:00:00-04:00', states: cells({ capped: 3, large: 4, medium: 4, small: 6, egg: 8 }) },
  { startedAt: '2026-06-10T08:00:00-04:00', states: cells({ capped: 7, large: 4, medium: 4, small: 6, egg: 9 }) },
  {
    startedAt: '2026-06-20T08:00:00-04:00',
    states: cells({ opened: 2, capped: 9, large: 6, medium: 2, small: 8, egg: 6 }),
  },
];

async function nestOf(code: string, visits: readonly ReadVisit[]): Promise<string> {
  const technician = new WireClient(origin());
  await technician.signIn('technician@tarrow.example');
  await technician.enrol();
  return (await pushVisitedNest(technician, code, visits)).nest;
}

async function openBrood(page: Page, nest: string, as = REVIEWER): Promise<void> {
  await page.setViewportSize(WIDE);
  await signInByForm(page, as);
  await page.goto(`/nests/${nest}/brood`);
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0, { timeout: 30_000 });
}

async function nothingForAxe(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual([]);
  const wider = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  expect(wider, 'the page is wider than the screen').toBeLessThanOrEqual(0);
}

test('the visits of a nest are walked by keyboard, and the page stays where it is', async ({ page }) => {
  const nest = await nestOf('BROOD-3', THREE_VISITS);
  await openBrood(page, nest);
  const known = page.getByRole('group', { name: 'As known then' });
  await expect(known).toContainText('Check, 20 June, 08:00');
  await expect(page.getByText('past: adults have come out already')).toBeVisible();

  const slider = page.getByRole('slider', { name: 'Visit' });
  await page.evaluate(() => window.scrollTo(0, 60));
  await slider.press('ArrowLeft');
  await expect(known).toContainText('Check, 10 June, 08:00');
  await expect(page.getByText('as known on 10 June')).toBeVisible();
  await expect(page.getByText('past: adults have come out already')).toHaveCount(0);
  await expect(slider).toHaveAttribute('aria-valuetext', /^2 of 3: Check, 10 June/);
  await expect(slider).toBeFocused();
  expect(await page.evaluate(() => window.scrollY)).toBe(60);
  await known.getByRole('link', { name: 'Earlier' }).click();
  await expect(known).toContainText('Check, 1 June, 08:00');
  expect(new URL(page.url()).searchParams.get('visit')).toMatch(/^[0-9a-f-]{36}$/);
  await page.reload();
  await expect(known).toContainText('Check, 1 June, 08:00');
  await nothingForAxe(page);
});

test('a cell tells its dates by keyboard, each with a range, and strips can be put in order', async ({ page }) => {
  const nest = await nestOf('BROOD-4', THREE_VISITS);
  await openBrood(page, nest);
  await page.getByRole('gridcell', { name: /^cell 2,.*days old/ }).focus();
  await page.keyboard.press('PageDown');
  const told = page.getByText(/^Cell 3, ring 1, capped, about \d+ days old/);
  await expect(told).toBeVisible();
  await expect(page.getByText(/^Adult comes out .*between .* and /).first()).toBeVisible();

  const strips = page.getByRole('img', { name: /brood strips/ });
  const grouped = await strips.locator('use').count();
  await page.getByRole('checkbox', { name: 'Cells with equal dates together' }).uncheck();
  expect(await strips.locator('use').count()).toBeGreaterThan(grouped);
  await page.getByRole('combobox', { name: 'Order' }).selectOption('by cell number');
  await expect(strips.locator('text > title').first()).toHaveText('cell 2');
  await page.getByText('Assumptions').click();
  await expect(page.getByText(/^Model .*settings version/)).toBeVisible();
  await nothingForAxe(page);
});

test('earlier ranges are counted against later readings, and shown cell by cell', async ({ page }) => {
  const nest = await nestOf('BROOD-5', THREE_VISITS);
  await openBrood(page, nest);
  const table = page.getByRole('table', { name: /How many ranges held/ });
  await expect(table.getByRole('row')).toHaveCount(5);
  await expect(table).toContainText(/\d+( to \d+)? of \d+/);
  await page.getByRole('slider', { name: 'Visit' }).press('Home');
  await expect(page.getByText('as known on 1 June')).toBeVisible();
  await page.getByText('Cell by cell: expected then, seen since').click();
  await expect(page.getByRole('table', { name: /Ranges as known then/ })).toContainText(/between .* and .* June/);
});

test('every figure can be taken home as lines and as pixels', async ({ page }) => {
  const nest = await nestOf('BROOD-6', THREE_VISITS);
  await openBrood(page, nest);
  for (const figure of ['brood comb', 'nest dates', 'brood strips', 'adults per day']) {
    for (const type of ['SVG', 'PNG'] as const) {
      const key = page.getByRole('button', { name: `Download ${figure} as ${type}` });
      const [download] = await Promise.all([page.waitForEvent('download'), key.click()]);
      const stem = `BROOD-6-${figure.replaceAll(' ', '-')}-as-of-2026-06-20`;
      expect(download.suggestedFilename()).toBe(`${stem}.${type.toLowerCase()}`);
      const file = readFileSync(await download.path());
      if (type === 'PNG') {
        expect(file.subarray(1, 4).toString('latin1')).toBe('PNG');
        expect(file.length).toBeGreaterThan(10_000);
      } else {
        const text = file.toString('utf8');
        expect(text).toContain('@font-face');
        expect(text).toContain('BROOD-6, estimate as known on 20 June 2026.');
        expect(text).toMatch(/--ink: #[0-9a-f]{6}/);
        expect(text).not.toMatch(/tabindex|role=/);
      }
    }
  }
});

test('a comb of 500 cells stays usable, and no more strips are drawn than can be read', async ({ page }) => {
  test.setTimeout(180_000);
  const states = cells({ capped: 150, large: 100, medium: 60, small: 90, egg: 90, empty: 10 });
  const nest = await nestOf('BROOD-500', [{ startedAt: '2026-06-16T08:00:00-04:00', states }]);
  await openBrood(page, nest);
  await page.getByRole('checkbox', { name: 'Cells with equal dates together' }).uncheck();
  await expect(page.getByText('Strips 1 to 60 of 490')).toBeVisible();
  await page.getByRole('button', { name: 'Strips after' }).click();
  await expect(page.getByText('Strips 61 to 120 of 490')).toBeVisible();
  await page.screenshot({ path: screenshotPath('brood-500-1280') });
  await nothingForAxe(page);
});

const ODD_COMBS: readonly { code: string; states: CellState[] | null; says: string | RegExp }[] = [
  { code: 'BROOD-NONE', states: null, says: 'No comb read yet' },
  { code: 'BROOD-EMPTY', states: cells({ empty: 7 }), says: 'No cell of this comb holds brood that can be dated.' },
  { code: 'BROOD-ONE', states: cells({ egg: 1 }), says: /between .* and/ },
  { code: 'BROOD-PAST', states: cells({ opened: 3, egg: 3 }), says: 'past: adults have come out already' },
];

for (const { code, states, says } of ODD_COMBS) {
  test(`${code}: the page says what there is to say`, async ({ page }) => {
    const nest = await nestOf(code, states ? [{ startedAt: '2026-06-16T08:00:00-04:00', states }] : []);
    await openBrood(page, nest, 'researcher@tarrow.example');
    await expect(page.getByText(says).first()).toBeVisible();
    await nothingForAxe(page);
  });
}

for (const [format, width] of [
  ['A4', 703],
  ['Letter', 725],
] as const) {
  test(`on ${format} everything is black on white and nothing is cut`, async ({ page }) => {
    const nest = await nestOf(`BROOD-${format}`, THREE_VISITS);
    await openBrood(page, nest);
    const pdf = await page.pdf({ format });
    expect(pdf.toString('latin1').match(/\/Type \/Page\b/g)?.length).toBeLessThanOrEqual(4);
    await page.setViewportSize({ width, height: 1000 });
    await page.emulateMedia({ media: 'print' });
    await page.screenshot({ path: screenshotPath(`brood-print-${format}`), fullPage: true });
    await expect(page.getByRole('slider')).toHaveCount(0);
    await expect(page.getByText(/^Model .*settings version/)).toBeVisible();
    const fills = await page
      .locator('.comb-wall')
      .evaluateAll((walls) => [...new Set(walls.map((wall) => getComputedStyle(wall).fill))]);
    expect(fills).toEqual(['rgb(255, 255, 255)']);
  });
}
