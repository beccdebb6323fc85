import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import AxeBuilder from '@axe-core/playwright';
import { type BrowserContext, type Page, expect, test } from '@playwright/test';
import { STATE_LETTERS } from '@/lib/comb/states';
import { createDemoDatabase } from '@/tests/support/demo-database';
import { killPhone, phoneOn } from '@/tests/support/pages/phone';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { type TestServer, startTestServer } from '@/tests/support/server';
import { combStates, readAgain, readInField } from '@/tests/support/wire/read-comb';
import { WireClient } from '@/tests/support/wire/wire-client';

const CELLS = 60;
/** Stands in a note on every mark of the first reading, and nowhere else. */
const CANARY = 'PIERCED-CAP-CANARY';
const DESKTOP = { width: 1280, height: 800 };

/** The letters of the second reading: cell 7 is seen differently, one cell cannot be told. */
function letters(): string[] {
  const typed = combStates(CELLS).map((state) => STATE_LETTERS[state]);
  typed[7] = 'p';
  typed[59] = 'u';
  return typed;
}

/** Everything a browser receives, as text. */
function listenTo(context: BrowserContext): { text: () => Promise<string> } {
  const bodies: Promise<string>[] = [];
  context.on('requestfinished', (request) => {
    const body = request.response().then((response) => response?.body());
    bodies.push(
      body
        .then((bytes) => `${request.url()}\n${bytes?.toString('utf8') ?? ''}`)
        // A redirect has no body to read.
        .catch(() => request.url()),
    );
  });
  return { text: async () => (await Promise.all(bodies)).join('\n') };
}

/** Everything the browser keeps of its own records, as text. */
async function storedText(page: Page): Promise<string> {
  return page.evaluate(async () => {
    const stores: unknown[] = [];
    for (const { name } of await indexedDB.databases()) {
      if (!name) continue;
      const db = await new Promise<IDBDatabase>((resolve, reject) => {
        const request = indexedDB.open(name);
        request.onsuccess = () => resolve(request.result);
        request.onerror = () => reject(new Error('cannot open'));
      });
      for (const store of db.objectStoreNames) {
        stores.push(
          await new Promise((resolve) => {
            const request = db.transaction(store).objectStore(store).getAll();
            request.onsuccess = () => resolve(request.result);
          }),
        );
      }
      db.close();
    }
    return JSON.stringify(stores);
  });
}

/** Presses Tab until the control of this name has the focus; answers how many presses that took. */
async function tabTo(page: Page, name: string): Promise<number> {
  for (let presses = 1; presses <= 120; presses++) {
    await page.keyboard.press('Tab');
    const focused = await page.evaluate(() => {
      const element = document.activeElement;
      return element?.getAttribute('aria-label') ?? element?.textContent ?? '';
    });
    if (focused.trim() === name) return presses;
  }
  throw new Error(`Tab never reaches ${name}`);
}

test.describe('the lab', () => {
  test.setTimeout(300_000);
  let server: TestServer;
  let profile: string;
  let drop: () => Promise<void>;

  test.beforeAll(async () => {
    const database = await createDemoDatabase();
    drop = database.drop;
    server = await startTestServer({ database: database.name });
    profile = mkdtempSync(join(tmpdir(), 'undereave-lab-'));
  });

  test.afterAll(async () => {
    await server.close();
    await drop();
    rmSync(profile, { recursive: true, force: true });
  });

  test('a comb of 60 cells is read blind by keyboard alone, survives a kill, and nothing of the first reading comes', async () => {
    const field = await readInField(server.origin, {
      code: 'BLIND-60',
      states: combStates(CELLS),
      more: { note: CANARY },
    });
    const secrets = [CANARY, ...field.marks.flatMap(({ opId, bodyHash }) => [opId, bodyHash])];
    let lab = await phoneOn(profile, server.origin);
    await lab.page.setViewportSize(DESKTOP);
    let received = listenTo(lab.context);
    await signInByForm(lab.page, 'reviewer@tarrow.example');
    await lab.page.goto('/review');
    let keys = await tabTo(lab.page, 'Read BLIND-60 a second time');
    await lab.page.keyboard.press('Enter');
    await expect(lab.page.getByRole('heading', { name: /Second reading of BLIND-60/ })).toBeVisible();
    await expect(lab.page.getByRole('button', { name: 'Begin the blind reading' })).toBeVisible();
    keys += await tabTo(lab.page, 'Begin the blind reading');
    await lab.page.keyboard.press('Enter');
    keys += 2;
    await expect(lab.page.getByRole('group', { name: 'States' })).toBeVisible();

    const typed = letters();
    let seconds = 0;
    const timed = async (act: () => Promise<void>): Promise<void> => {
      const began = performance.now();
      await act();
      seconds += (performance.now() - began) / 1000;
    };
    await timed(async () => {
      for (const letter of typed.slice(0, 25)) await lab.page.keyboard.press(letter);
      await lab.page.keyboard.press('Backspace');
      await lab.page.keyboard.press('Control+y');
      await expect(lab.page.getByText('Cell 25', { exact: true })).toBeVisible();
    });
    keys += 27;
    await expect(lab.page.getByText(/at the office|waiting to send|sending/i).first()).toBeVisible();
    let bytes = (await received.text()) + (await storedText(lab.page));
    await killPhone(profile, lab);

    lab = await phoneOn(profile, server.origin);
    await lab.page.setViewportSize(DESKTOP);
    received = listenTo(lab.context);
    await lab.page.goto(`/review/${field.ids.visit}/read`);
    // The browser writes its cookies every half minute: after a kill a person may have to sign in again.
    if (lab.page.url().includes('/sign-in')) {
      await signInByForm(lab.page, 'reviewer@tarrow.example');
      await lab.page.goto(`/review/${field.ids.visit}/read`);
    }
    await expect(lab.page.getByText('Cell 25', { exact: true })).toBeVisible({ timeout: 30_000 });
    await timed(async () => {
      for (const letter of typed.slice(25)) await lab.page.keyboard.press(letter);
      await expect(lab.page.getByText(`${CELLS} cells`).first()).toBeVisible();
    });
    keys += typed.length - 25;
    await lab.page.screenshot({ path: screenshotPath('second-bench-1280') });
    // The nest's own pages and files keep quiet too, while the reading is open.
    for (const path of [
      `/nests/${field.ids.nest}`,
      `/nests/${field.ids.nest}/readings/${field.ids.reading}`,
      '/nests',
      '/review',
    ]) {
      const other = await lab.context.newPage();
      await other.goto(path);
      await other.close();
    }
    bytes += (await received.text()) + (await storedText(lab.page));
    for (const secret of secrets) expect(bytes).not.toContain(secret);
    expect(bytes).toContain('BLIND-60');

    await lab.page.keyboard.press('f');
    await expect(lab.page.getByRole('dialog')).toBeVisible();
    await lab.page.keyboard.press('Enter');
    keys += 2;
    await expect(lab.page.getByRole('link', { name: 'Compare both readings' })).toBeVisible({ timeout: 60_000 });
    test.info().annotations.push({ type: 'keys and seconds', description: `${keys} keys, ${seconds.toFixed(1)} s` });
    process.stdout.write(`60 cells by keyboard alone: ${keys} keys, ${seconds.toFixed(1)} s of typing\n`);
    expect(seconds).toBeLessThan(60);

    await lab.page.getByRole('link', { name: 'Compare both readings' }).click();
    await expect(lab.page.getByText('58 of 59 cells are read alike')).toBeVisible();
    await expect(lab.page.getByText('The lead biologist settles this, as third reader.')).toBeVisible();

    const own = new WireClient(server.origin);
    await own.signIn('biologist@tarrow.example');
    const nest = await own.get<{ visits: { readings: { kind: string; id: string }[] }[] }>(
      `/api/nests/${field.ids.nest}`,
    );
    const second = nest.visits[0]?.readings.find(({ kind }) => kind === 'second');
    const read = await own.get<{ marks: { state: string }[] }>(`/api/readings/${second?.id}`);
    const words = new Map(Object.entries(STATE_LETTERS).map(([state, letter]) => [letter, state]));
    expect(read.marks.map(({ state }) => state)).toEqual(typed.map((letter) => words.get(letter)));
    await lab.context.close();
  });

  test('two reviewers who settle one reading at once get one result and one clear message', async ({ browser }) => {
    const states = combStates(20);
    const field = await readInField(server.origin, { code: 'BOTH-20', states });
    // Cell 5 is a large larva in the field: 19 of 20 are read alike, so a reviewer settles alone.
    await readAgain(server.origin, field.ids, states.with(5, 'medium'));
    const pages = await Promise.all(
      ['reviewer@tarrow.example', 'reviewer2@tarrow.example'].map(async (email) => {
        const context = await browser.newContext({ viewport: DESKTOP, baseURL: server.origin });
        const page = await context.newPage();
        await signInByForm(page, email);
        await page.goto(`/review/${field.ids.visit}`);
        await page.getByRole('radio', { name: 'lab: medium larva' }).check();
        await page.getByLabel('Reason').fill(`Seen by ${email}.`);
        return page;
      }),
    );
    await Promise.all(pages.map((page) => page.getByRole('button', { name: 'Settle cell 5' }).click()));
    await Promise.all(pages.map((page) => expect(page.getByText('Settled: medium larva (lab).')).toBeVisible()));
    const told = pages.map((page) => page.getByText('Somebody else settled this reading while you did.'));
    await expect(async () => {
      const counts = await Promise.all(told.map((message) => message.count()));
      expect(counts.reduce((sum, count) => sum + count, 0)).toBe(1);
    }).toPass({ timeout: 10_000 });
    const page = pages[0] as Page;
    await page.getByRole('button', { name: 'Lock the final reading' }).click();
    await expect(page.getByText(/SHA-256 [0-9a-f]{64}/)).toBeVisible();
    await Promise.all(pages.map((open) => open.context().close()));
  });

  test('the bench fits a phone, a tablet and a desk, with nothing for axe to find', async ({ page }) => {
    const field = await readInField(server.origin, { code: 'FIT-7', states: combStates(7) });
    await signInAt(page, server.origin);
    await page.goto(`${server.origin}/review`);
    await page.getByRole('button', { name: 'Read FIT-7 a second time' }).click();
    await page.getByRole('button', { name: 'Begin the blind reading' }).click();
    await expect(page.getByRole('group', { name: 'States' })).toBeVisible();
    for (const letter of ['c', 'l', '5', 'm', 's', '?', 'o', "'", '-']) await page.keyboard.press(letter);
    for (const size of [{ width: 390, height: 844 }, { width: 820, height: 1180 }, DESKTOP]) {
      await page.setViewportSize(size);
      await page.screenshot({ path: screenshotPath(`second-reading-${size.width}`), fullPage: true });
      const wider = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(wider, 'the page is wider than the screen').toBeLessThanOrEqual(0);
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual([]);
    }
    expect(page.url()).toContain(field.ids.visit);
  });

  for (const count of [1, 7, 61, 500]) {
    test(`two readings of ${count} cells are compared, with nothing for axe to find`, async ({ page }) => {
      const states = combStates(count);
      const field = await readInField(server.origin, { code: `SIZE-${count}`, states });
      await readAgain(server.origin, field.ids, states.with(-1, 'dead'));
      await signInAt(page, server.origin);
      for (const size of [{ width: 390, height: 844 }, { width: 820, height: 1180 }, DESKTOP]) {
        await page.setViewportSize(size);
        await page.goto(`${server.origin}/review/${field.ids.visit}`);
        await expect(page.getByText(`${count - 1} of ${count} cells are read alike`)).toBeVisible();
        await page.screenshot({ path: screenshotPath(`review-${count}-${size.width}`), fullPage: true });
        const wider = await page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        );
        expect(wider, 'the page is wider than the screen').toBeLessThanOrEqual(0);
      }
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual([]);
    });
  }
});

async function signInAt(page: Page, at: string): Promise<void> {
  const client = new WireClient(at);
  await client.signIn('biologist@tarrow.example');
  const cookies = client.jar
    .header()
    .split('; ')
    .map((pair) => ({ name: pair.slice(0, pair.indexOf('=')), value: pair.slice(pair.indexOf('=') + 1), url: at }));
  await page.context().addCookies(cookies);
}
