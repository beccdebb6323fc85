import { type Page, expect, test } from '@playwright/test';
import sharp from 'sharp';
import { openField, startReading, untilSent } from '@/tests/support/pages/field';
import { type KnownIds, knownIds, settled } from '@/tests/support/pages/field-screens';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { WireClient } from '@/tests/support/wire/wire-client';
import { origin } from '@/tests/support/running-server';

const FORMATS = ['A4', 'Letter'] as const;

/** Pages of a PDF that Chromium has made. */
function pagesOf(pdf: Buffer): number {
  return pdf.toString('latin1').match(/\/Type\s*\/Page\b(?!s)/g)?.length ?? 0;
}

/** The most that red, green and blue differ in any pixel of what would be printed. */
async function colourIn(page: Page, name: string): Promise<number> {
  await page.emulateMedia({ media: 'print' });
  const picture = await page.screenshot({ path: screenshotPath(name), fullPage: true });
  const { data, info } = await sharp(picture).raw().toBuffer({ resolveWithObject: true });
  let most = 0;
  for (let at = 0; at < data.length; at += info.channels) {
    const [red = 0, green = 0, blue = 0] = data.subarray(at, at + 3);
    most = Math.max(most, Math.max(red, green, blue) - Math.min(red, green, blue));
  }
  return most;
}

const PRINTS: readonly { name: string; as: string; path: (known: KnownIds) => string }[] = [
  { name: 'field-reading', as: 'technician@tarrow.example', path: ({ reading }) => `/field/readings/${reading}` },
  { name: 'field-nest', as: 'technician@tarrow.example', path: ({ nest }) => `/field/nests/${nest}` },
  { name: 'lab-nest', as: 'reviewer@tarrow.example', path: ({ nest }) => `/nests/${nest}` },
  {
    name: 'lab-reading',
    as: 'reviewer@tarrow.example',
    path: ({ nest, reading }) => `/nests/${nest}/readings/${reading}`,
  },
];

test.describe('paper', () => {
  test.setTimeout(240_000);

  for (const { name, as, path } of PRINTS) {
    test(`${name} prints its comb with the key to the symbols, black on white, within the page`, async ({ page }) => {
      await signInByForm(page, as);
      if (name.startsWith('field')) await openField(page);
      await page.goto(path(await knownIds(origin())));
      await settled(page);
      // 186 mm, the width of A4 within its margins, at 96 pixels an inch.
      await page.setViewportSize({ width: 703, height: 1000 });
      expect(await colourIn(page, `print-${name}`)).toBe(0);
      await expect(page.getByRole('list', { name: 'What the symbols mean' }).first()).toBeVisible();
      await expect(page.getByText('N12').filter({ visible: true }).first()).toBeVisible();
      const comb = await page.locator('.comb-frame svg').first().boundingBox();
      expect(comb?.width).toBeLessThanOrEqual(703);
      await expect(page.getByRole('banner')).toBeHidden();
    });
  }

  test('the blank sheet fits on one page of A4 and of Letter, black only, with the nest’s opaque code', async ({
    page,
  }) => {
    await signInByForm(page, 'technician@tarrow.example');
    await openField(page);
    const { nest } = await knownIds(origin());
    await page.goto(`/field/nests/${nest}/sheet`);
    await settled(page);
    await expect(page.getByRole('article', { name: 'Paper field sheet' })).toContainText(
      /[2-9A-HJ-NP-Z]{4}(-[2-9A-HJ-NP-Z]{4}){2}/,
    );
    for (const format of FORMATS) {
      const pdf = await page.pdf({
        format,
        path: screenshotPath(`sheet-${format}`).replace('.png', '.pdf'),
        preferCSSPageSize: false,
      });
      expect(pagesOf(pdf), format).toBe(1);
    }
    await page.setViewportSize({ width: 703, height: 1032 });
    expect(await colourIn(page, 'print-sheet')).toBe(0);
    const sheet = await page.getByRole('article', { name: 'Paper field sheet' }).boundingBox();
    // 255 mm, the height of Letter within its margins, at 96 pixels an inch.
    expect(sheet?.height).toBeLessThanOrEqual(964);
    await page.emulateMedia({ media: 'screen' });
    const code = await page.locator('.paper-sheet .font-mono').first().textContent();
    await page.goto('/field');
    await page.getByLabel('Find a nest').fill(code?.toLowerCase() ?? '');
    await expect(page.getByRole('link', { name: /bandstand roof/ })).toBeVisible();
    await expect(page.getByRole('main').getByRole('listitem')).toHaveCount(1);
  });

  test('a filled sheet is typed in by keyboard alone and becomes a reading from paper', async ({ page }) => {
    await signInByForm(page, 'technician@tarrow.example');
    await openField(page);
    await startReading(page, { code: 'TYPED-8' });
    await page.getByRole('link', { name: /Back to the visit/ }).click();
    await page.goto(page.url().replace(/\/$/, '') + '/typed');
    await settled(page);
    await page.getByLabel('Pedicel cell: 0').focus();
    await page.keyboard.type('c');
    await page.keyboard.press('Tab');
    await page.keyboard.type("cl?m s o'z");
    await expect(page.getByText('Cell 6: the sheet has no letter “z”.')).toBeVisible();
    await page.screenshot({ path: screenshotPath('field-typed-fault-390'), fullPage: true });
    await page.keyboard.press('Backspace');
    await page.keyboard.type('-');
    await page.keyboard.press('Tab');
    await page.keyboard.type('..u');
    await expect(page.getByText('8 cells', { exact: true })).toBeVisible();
    await page.setViewportSize({ width: 1280, height: 800 });
    await page.screenshot({ path: screenshotPath('field-typed-1280') });
    await page.getByRole('button', { name: 'Keep the reading (8 cells)' }).press('Enter');
    await expect(page.getByRole('group', { name: 'Keys' })).toBeVisible();
    await page.getByRole('button', { name: 'Finish' }).click();
    await page.getByRole('button', { name: 'Submit reading' }).click();
    await untilSent(page);

    const reviewer = new WireClient(origin());
    await reviewer.signIn('reviewer@tarrow.example');
    const { nests } = await reviewer.get<{ nests: { id: string }[] }>('/api/nests?q=TYPED-8');
    const nest = await reviewer.get<{ visits: { readings: { id: string; submittedAt: string | null }[] }[] }>(
      `/api/nests/${nests[0]?.id}`,
    );
    const handedIn = nest.visits[0]?.readings.find(({ submittedAt }) => submittedAt !== null);
    const reading = await reviewer.get<{
      source: string;
      marks: { cell: number; state: string; nectar: boolean; unsure: boolean }[];
    }>(`/api/readings/${handedIn?.id}`);
    expect(reading.source).toBe('paper');
    expect(reading.marks.map(({ cell, state }) => `${cell} ${state}`)).toEqual([
      '0 capped',
      '1 capped',
      '2 large',
      '3 medium',
      '4 small',
      '5 egg',
      '6 empty',
      '9 unread',
    ]);
    expect(reading.marks.filter(({ nectar }) => nectar).map(({ cell }) => cell)).toEqual([5]);
    expect(reading.marks.filter(({ unsure }) => unsure).map(({ cell }) => cell)).toEqual([2]);
  });
});
