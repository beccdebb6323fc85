import { type Page, expect, test } from '@playwright/test';
import { type AlteringProxy, startAlteringProxy } from '@/tests/support/altering-proxy';
import { openField, pressAll, startReading, untilInstalled, untilSent } from '@/tests/support/pages/field';
import { FIELD_SCREENS, knownIds } from '@/tests/support/pages/field-screens';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { origin } from '@/tests/support/running-server';

const TECHNICIAN = 'technician@tarrow.example';

async function atTheNest(page: Page, code: string): Promise<string> {
  await signInByForm(page, TECHNICIAN);
  await openField(page);
  return startReading(page, { code, counted: 7 });
}

interface Manifest {
  id: string;
  scope: string;
  start_url: string;
  short_name: string;
  icons: { src: string; sizes: string; purpose: string }[];
  shortcuts: { url: string }[];
  screenshots: { src: string; sizes: string; form_factor: string; label: string }[];
}

test.describe('life on a phone', () => {
  test.setTimeout(180_000);

  test('the manifest has all a phone needs, and every picture it names is there', async ({ request }) => {
    const manifest = (await (await request.get('/manifest.webmanifest')).json()) as Manifest;
    expect(manifest).toMatchObject({ id: '/field', scope: '/', start_url: '/field' });
    expect(manifest.short_name.length).toBeLessThanOrEqual(12);
    const purposes = manifest.icons.map(({ purpose, sizes }) => `${purpose} ${sizes}`);
    expect(purposes).toEqual(
      expect.arrayContaining(['any 192x192', 'any 512x512', 'maskable 512x512', 'monochrome 512x512']),
    );
    expect(purposes.join()).not.toContain('any maskable');
    expect(manifest.shortcuts.map(({ url }) => url)).toEqual(['/field', '/field/nests/new', '/field/unsent']);
    expect(manifest.screenshots.map((shot) => shot.form_factor).sort()).toEqual(['narrow', 'wide']);
    for (const { src } of [...manifest.icons, ...manifest.screenshots]) {
      expect((await request.get(src)).status(), src).toBe(200);
    }
  });

  test('a press that finds no room is shown as not saved, keeps its place, and is kept once there is room', async ({
    page,
  }) => {
    // As Chromium does it on a full disk: every request reports success, then the transaction is aborted over its room.
    await page.addInitScript(() => {
      const put = IDBObjectStore.prototype.put;
      const doomed = new WeakSet<IDBTransaction>();
      const doom = (transaction: IDBTransaction) => {
        Object.defineProperty(transaction, 'error', { value: new DOMException('no room', 'QuotaExceededError') });
        transaction.abort();
      };
      IDBObjectStore.prototype.put = function (value, key) {
        const request = put.call(this, value, key);
        const { transaction } = this;
        if ((window as { full?: boolean }).full && this.name === 'ops') doomed.add(transaction);
        if (this.name === 'meta' && doomed.has(transaction))
          request.addEventListener('success', () => doom(transaction));
        return request;
      };
    });
    const recorder = await atTheNest(page, 'FULL-1');
    await pressAll(page, ['Egg', 'Capped']);
    await expect(page.getByText('Cell 2', { exact: true })).toBeVisible();
    await page.evaluate(() => Object.assign(window, { full: true }));
    await pressAll(page, ['Large', 'Small']);
    const alert = page.getByRole('alert').filter({ hasText: 'Not saved: cell 2, large larva' });
    await expect(alert).toBeVisible({ timeout: 20_000 });
    await expect(alert).toContainText('cell 3, small larva');
    await expect(alert).toContainText('storage is full');
    await expect(page.getByRole('link', { name: /Not saved/ })).toBeVisible();
    await page.screenshot({ path: screenshotPath('field-recorder-full-390') });
    await page.evaluate(() => Object.assign(window, { full: false }));
    await alert.getByRole('button', { name: 'Try again' }).click();
    await expect(alert).toHaveCount(0);
    await page.goto(recorder);
    await expect(page.getByText('Cell 4', { exact: true })).toBeVisible();
    await expect(page.getByRole('gridcell', { name: /^cell 2, ring 1, large larva/ })).toBeVisible();
  });

  test('a clock that is off by a quarter of an hour is named, and nothing is refused for it', async ({ page }) => {
    await page.clock.install({ time: Date.now() - 15 * 60_000 });
    await page.clock.resume();
    await signInByForm(page, TECHNICIAN);
    await openField(page);
    await startReading(page, { code: 'CLOCK-1', counted: 3 });
    await expect(page.getByRole('region', { name: 'Clock' })).toHaveCount(0);
    await pressAll(page, ['Egg']);
    await untilSent(page);
    await page.goto('/field');
    await expect(page.getByRole('region', { name: 'Clock' })).toContainText('about 15 minutes slow', {
      timeout: 20_000,
    });
    await page.screenshot({ path: screenshotPath('field-clock-off-390') });
  });

  test('Safari is told its own steps once there is a nest, and the hint stays away when put away', async ({
    browser,
  }) => {
    const userAgent =
      'Mozilla/5.0 (iPhone; CPU iPhone OS 18_4 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.4 Mobile/15E148 Safari/604.1';
    const context = await browser.newContext({ baseURL: origin(), userAgent, viewport: { width: 390, height: 844 } });
    const page = await context.newPage();
    await signInByForm(page, TECHNICIAN);
    await openField(page);
    await expect(page.getByText('Press the Share key of Safari')).toBeVisible();
    await page.screenshot({ path: screenshotPath('field-install-safari-390') });
    await page.getByRole('button', { name: 'Not now' }).click();
    await page.reload();
    await openField(page);
    await expect(page.getByText('Press the Share key of Safari')).toHaveCount(0);
    await page.goto('/field/settings');
    await expect(page.getByText('Press the Share key of Safari')).toBeVisible();
    await context.close();
  });

  test('every screen has its help with no network at all', async ({ page, context }) => {
    await signInByForm(page, TECHNICIAN);
    await openField(page);
    await untilInstalled(page);
    const known = await knownIds(origin());
    await page.reload();
    await openField(page);
    await context.setOffline(true);
    const titles = new Set<string>();
    for (const { name, path } of FIELD_SCREENS) {
      await page.goto(path(known));
      await page.getByRole('button', { name: 'Help' }).click();
      const title = await page.getByRole('dialog').getByRole('heading', { level: 2 }).textContent();
      expect(title, name).toMatch(/^Help: /);
      await expect(page.getByRole('dialog').getByText('Somebody was stung')).toBeVisible();
      titles.add(title ?? '');
    }
    expect(titles.size).toBeGreaterThanOrEqual(11);
    await context.setOffline(false);
  });

  test('lasting storage is asked for after the first nest', async ({ page }) => {
    await page.addInitScript(() => {
      navigator.storage.persist = async () => Boolean(sessionStorage.setItem('asked', 'yes')) || true;
    });
    await signInByForm(page, TECHNICIAN);
    await openField(page);
    expect(await page.evaluate(() => sessionStorage.getItem('asked'))).toBeNull();
    await startReading(page, { code: 'LAST-1' });
    expect(await page.evaluate(() => sessionStorage.getItem('asked'))).toBe('yes');
  });

  test('two tabs read one comb: what the one keeps the other shows, and nothing is lost or doubled', async ({
    page,
  }) => {
    const recorder = await atTheNest(page, 'TABS-1');
    const other = await page.context().newPage();
    await other.goto(recorder);
    await expect(other.getByRole('group', { name: 'Keys' })).toBeVisible();
    await pressAll(page, ['Egg', 'Egg']);
    await other.bringToFront();
    await other.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
    await expect(other.getByText('Cell 2', { exact: true })).toBeVisible();
    await pressAll(other, ['Capped', 'Capped']);
    await page.bringToFront();
    await page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
    await expect(page.getByText('Cell 4', { exact: true })).toBeVisible();
    await expect(page.getByText('4 cells', { exact: true })).toBeVisible();
    await untilSent(page);
  });

  test('a tab with a newer version takes the records over: the old one says so and shows no press as saved', async ({
    page,
  }) => {
    await atTheNest(page, 'OLD-TAB-1');
    await pressAll(page, ['Egg']);
    await expect(page.getByText('Cell 1', { exact: true })).toBeVisible();
    const other = await page.context().newPage();
    await other.goto('/icons/mark.svg');
    await other.evaluate(async () => {
      const names = (await indexedDB.databases()).map(({ name }) => name ?? '');
      const name = names.find((each) => each.startsWith('undereave-') && each !== 'undereave-device') ?? '';
      const opening = indexedDB.open(name, 990);
      const opened = await new Promise<IDBDatabase>((resolve) => (opening.onsuccess = () => resolve(opening.result)));
      opened.close();
    });
    await expect(page.getByText('A newer version works in another tab.')).toBeVisible();
    await pressAll(page, ['Capped']);
    await expect(page.getByRole('alert').filter({ hasText: 'Not saved: cell 1, capped' })).toBeVisible({
      timeout: 40_000,
    });
    await page.screenshot({ path: screenshotPath('field-taken-over-390') });
  });
});

test.describe('a newer version', () => {
  test.setTimeout(180_000);
  let proxy: AlteringProxy;

  test.beforeAll(async () => {
    proxy = await startAlteringProxy(origin());
  });

  test.afterAll(() => proxy.close());

  test('is offered at a calm moment only, is taken by a press, and the old page lives on without its server files', async ({
    browser,
  }) => {
    const context = await browser.newContext({ baseURL: proxy.origin, viewport: { width: 390, height: 844 } });
    const page = await context.newPage();
    await signInByForm(page, TECHNICIAN);
    await openField(page);
    await untilInstalled(page);
    const recorder = await startReading(page, { code: 'NEWER-1', counted: 7 });
    const newer = (path: string) => (path === '/sw.js' ? (text: string) => `${text}\n// another version` : null);
    proxy.alter(newer);
    await page.reload();
    await expect(page.getByRole('group', { name: 'Keys' })).toBeVisible();
    await page.evaluate(async () => {
      const registration = await navigator.serviceWorker.getRegistration('/field');
      await registration?.update();
      await new Promise<void>((resolve) => {
        const look = () => (registration?.waiting ? resolve() : void setTimeout(look, 100));
        look();
      });
    });
    await pressAll(page, ['Egg']);
    await expect(page.getByText('A newer version is ready.')).toHaveCount(0);

    await test.step('the old page goes on when the files of its build are gone from the server', async () => {
      proxy.alter((path) => (path.startsWith('/_next/static/') ? 'gone' : newer(path)));
      await page.reload();
      await expect(page.getByText('Cell 1', { exact: true })).toBeVisible();
      await page.goto('/field/settings');
      await expect(page.getByRole('heading', { name: 'Settings' })).toBeVisible();
      proxy.alter(newer);
    });

    await page.goto('/field');
    await expect(page.getByText('A newer version is ready.')).toBeVisible();
    await page.screenshot({ path: screenshotPath('field-update-390') });
    await page.getByRole('button', { name: 'Update now' }).click();
    await expect(page.getByText('A newer version is ready.')).toHaveCount(0, { timeout: 20_000 });
    await page.goto(recorder);
    await expect(page.getByText('Cell 1', { exact: true })).toBeVisible();
    await pressAll(page, ['Capped']);
    await untilSent(page);
    await context.close();
  });
});
