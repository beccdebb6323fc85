import AxeBuilder from '@axe-core/playwright';
import { type Page, expect, test } from '@playwright/test';
import { openField, pressAll, startReading } from '@/tests/support/pages/field';
import { FIELD_SCREENS, knownIds, overhang, settled, smallTargets } from '@/tests/support/pages/field-screens';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { origin } from '@/tests/support/running-server';

/** 10 mm, at about 6 CSS pixels a millimetre of a phone: the least size of what a glove presses. */
const FIELD_PX = 60;

/** 15 mm: the least size of a key that names a state. */
const STAGE_PX = 90;

/** 3 mm between the keys of the recorder. */
const GAP_PX = 18;

const PHONE = { width: 390, height: 844 };
const NARROW = { width: 320, height: 640 };

/** Does something on every screen of the field app that has a path. */
async function onEveryScreen(page: Page, look: (name: string) => Promise<void>): Promise<void> {
  const known = await knownIds(origin());
  for (const { name, path } of FIELD_SCREENS) {
    await test.step(name, async () => {
      await page.goto(path(known));
      await settled(page);
      await look(name);
    });
  }
}

async function findings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`);
}

/** Turns a switch of the settings over. */
async function flip(page: Page, name: string): Promise<void> {
  await page.goto('/field/settings');
  await page.getByRole('switch', { name: new RegExp(`^${name}`) }).click();
}

test.describe('in the hand', () => {
  test.setTimeout(300_000);

  test.beforeEach(async ({ page }) => {
    await signInByForm(page, 'technician@tarrow.example');
    await openField(page);
  });

  test('everything to press is 10 mm large or larger, and nothing is cut off at 320 pixels', async ({ page }) => {
    await onEveryScreen(page, async (name) => {
      await page.setViewportSize(PHONE);
      expect(await smallTargets(page, FIELD_PX), `${name} at 390`).toEqual([]);
      await page.setViewportSize(NARROW);
      expect(await smallTargets(page, FIELD_PX), `${name} at 320`).toEqual([]);
      expect(await overhang(page), `${name} is wider than the screen`).toBeLessThanOrEqual(0);
      await page.screenshot({ path: screenshotPath(`field-${name}-320`), fullPage: true });
    });
  });

  test('letters twice as large leave every screen within the width of the phone', async ({ page }) => {
    await onEveryScreen(page, async (name) => {
      await page.evaluate(() => (document.documentElement.style.fontSize = '200%'));
      expect(await overhang(page), name).toBeLessThanOrEqual(0);
      await page.screenshot({ path: screenshotPath(`field-${name}-double`), fullPage: true });
    });
  });

  test('the keys of the recorder are as large as a glove needs, mirror for the left hand, and are read by keyboard', async ({
    page,
  }) => {
    await startReading(page, { code: 'HAND-1', counted: 19 });
    const keys = page.getByRole('group', { name: 'Keys' });
    for (const size of [PHONE, NARROW]) {
      await page.setViewportSize(size);
      expect(await smallTargets(page, FIELD_PX), `recorder at ${size.width}`).toEqual([]);
      for (const state of ['Empty', 'Egg', 'Small', 'Medium', 'Large', 'Capped']) {
        const box = await keys.getByRole('button', { name: new RegExp(`^${state}`) }).boundingBox();
        expect(box?.height, `${state} at ${size.width}`).toBeGreaterThanOrEqual(STAGE_PX - 0.5);
        expect(box?.width, `${state} at ${size.width}`).toBeGreaterThanOrEqual(size.width === 320 ? 80 : STAGE_PX);
      }
    }
    await page.setViewportSize(PHONE);
    await page.evaluate(() => (document.documentElement.style.fontSize = '200%'));
    expect(await overhang(page), 'recorder with letters twice as large').toBeLessThanOrEqual(0);
    await page.screenshot({ path: screenshotPath('field-recorder-double'), fullPage: true });
    await page.evaluate(() => (document.documentElement.style.fontSize = ''));
    const left = async (name: RegExp) => (await keys.getByRole('button', { name }).boundingBox())?.x ?? Number.NaN;
    const right = await keys.getByRole('button', { name: /^Empty/ }).boundingBox();
    expect((await left(/^Egg/)) - (right?.x ?? 0) - (right?.width ?? 0)).toBeGreaterThanOrEqual(GAP_PX - 0.5);
    expect(await left(/^Empty/)).toBeLessThan(await left(/^Small/));

    const recorder = page.url();
    await flip(page, 'Left hand');
    await page.goto(recorder);
    await expect(keys).toBeVisible();
    expect(await left(/^Empty/)).toBeGreaterThan(await left(/^Small/));
    expect(await left(/^No cell here/)).toBeLessThan(await left(/^Undo/));
    await page.screenshot({ path: screenshotPath('field-recorder-left-390') });

    await page.keyboard.type('co-');
    await expect(page.getByText('Cell 3', { exact: true })).toBeVisible();
    await page.getByRole('button', { name: 'Help' }).click();
    await expect(page.getByRole('dialog').getByText('no cell here', { exact: true })).toBeVisible();
    expect(await smallTargets(page, FIELD_PX), 'help').toEqual([]);
    await page.screenshot({ path: screenshotPath('field-recorder-help-390') });
    await page.keyboard.press('Escape');
    await page.getByRole('button', { name: 'Tools' }).click();
    expect(await smallTargets(page, FIELD_PX), 'tools').toEqual([]);
    await page.keyboard.press('Escape');
    await page.getByRole('button', { name: 'More' }).click();
    expect(await smallTargets(page, FIELD_PX), 'more').toEqual([]);
    await page.keyboard.press('Escape');
    await page.getByRole('button', { name: 'Finish' }).click();
    expect(await smallTargets(page, FIELD_PX), 'summary').toEqual([]);
  });

  test('by low lamp axe finds nothing on any screen, the page never flashes white, and print is black on white', async ({
    page,
  }) => {
    await flip(page, 'Low lamp');
    await onEveryScreen(page, async (name) => {
      expect(await page.evaluate(() => document.documentElement.dataset.lamp)).toBe('low');
      expect(await findings(page), name).toEqual([]);
      await page.screenshot({ path: screenshotPath(`field-${name}-lamp`), fullPage: true });
    });
    // The attribute is there before the app has started: a script in the head has put it.
    const bare = await page
      .context()
      .browser()
      ?.newContext({ storageState: await page.context().storageState(), serviceWorkers: 'block' });
    const first = await bare?.newPage();
    await first?.route('**/_next/static/chunks/**', (route) => route.abort());
    await first?.goto(`${origin()}/field`);
    expect(await first?.evaluate(() => document.documentElement.dataset.lamp)).toBe('low');
    await bare?.close();
    await page.emulateMedia({ media: 'print' });
    const ground = await page.evaluate(() => getComputedStyle(document.body).backgroundColor);
    expect(ground).toBe('rgb(255, 255, 255)');
  });

  test('presses buzz where the phone can, and are read aloud only by a voice of its own', async ({ page }) => {
    await page.addInitScript(() => {
      const log: string[] = [];
      Object.assign(window, { log });
      navigator.vibrate = (pattern) => Boolean(log.push(`buzz ${JSON.stringify(pattern)}`));
      const voices = [{ lang: 'en-US', localService: true, default: true, name: 'own', voiceURI: 'own' }];
      speechSynthesis.getVoices = () => voices;
      speechSynthesis.speak = (speech) => void log.push(`say ${speech.text}`);
      Object.defineProperty(SpeechSynthesisUtterance.prototype, 'voice', { set: () => undefined });
    });
    await page.goto('/field');
    await flip(page, 'Read marks aloud');
    await page.getByRole('link', { name: /Back to/ }).click();
    await startReading(page, { code: 'HAND-2', counted: 7 });
    await pressAll(page, ['Egg']);
    const log = () => page.evaluate(() => (window as unknown as { log: string[] }).log);
    await expect.poll(log).toEqual(expect.arrayContaining(['say cell 0 egg, 1 of 7', 'buzz [20]']));
  });
});
