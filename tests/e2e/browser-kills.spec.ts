import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { type Page, expect, test } from '@playwright/test';
import { seededRandom } from '@/lib/kit/random';
import { openField, startReading, untilInstalled, untilSent } from '@/tests/support/pages/field';
import { type Phone, killPhone, phoneOn } from '@/tests/support/pages/phone';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { origin } from '@/tests/support/running-server';
import { WireClient } from '@/tests/support/wire/wire-client';

const ROUNDS = process.env.LONG === '1' ? 200 : 20;
const SEED = 424242;
const LETTERS = ['o', 's', 'm', 'l', 'c'] as const;

/** Tells the test at once of every cell the page shows as saved: a drawn mark that is no longer pending. */
function watchSaved(): void {
  const report = () => {
    const cells = document.querySelectorAll('.comb-cell[data-cell]:not([data-pending])');
    const keys = [...cells].map((cell) => cell.getAttribute('data-cell') ?? '');
    void (window as unknown as { shownSaved: (keys: string[]) => void }).shownSaved(keys);
  };
  new MutationObserver(report).observe(document, {
    subtree: true,
    childList: true,
    attributes: true,
    attributeFilter: ['data-pending'],
  });
}

/** The addresses of the marks of one reading in the phone's storage. */
async function storedCells(page: Page, reading: string): Promise<string[]> {
  return page.evaluate(async (of) => {
    const names = (await indexedDB.databases()).map(({ name }) => name ?? '');
    const name = names.find((candidate) => /^undereave-[0-9a-f]{8}-/.test(candidate)) ?? '';
    const db = await new Promise<IDBDatabase>((resolve, reject) => {
      const open = indexedDB.open(name);
      open.onsuccess = () => resolve(open.result);
      open.onerror = () => reject(open.error);
    });
    const rows = await new Promise<{ op: { kind: string; reading: string; body: { q: number; r: number } } }[]>(
      (resolve, reject) => {
        const all = db.transaction('ops').objectStore('ops').getAll();
        all.onsuccess = () => resolve(all.result);
        all.onerror = () => reject(all.error);
      },
    );
    db.close();
    const marks = rows.filter(({ op }) => op.kind === 'cell.mark' && op.reading === of);
    return marks.map(({ op }) => `${op.body.q},${op.body.r}`);
  }, reading);
}

/** Everything that was ever shown as saved is in the phone's storage. */
async function expectStored(page: Page, reading: string, shown: ReadonlySet<string>): Promise<void> {
  const stored = new Set(await storedCells(page, reading));
  expect(
    [...shown].filter((key) => !stored.has(key)),
    `seed ${SEED}`,
  ).toEqual([]);
}

test.describe('a browser killed at random moments of reading', () => {
  test.setTimeout(process.env.LONG === '1' ? 3_600_000 : 420_000);
  let profile: string;

  test.beforeAll(() => {
    profile = mkdtempSync(join(tmpdir(), 'undereave-kill-'));
  });

  // A killed browser's helpers may still be writing their last files.
  test.afterAll(() => rmSync(profile, { recursive: true, force: true, maxRetries: 10, retryDelay: 200 }));

  async function open(recorder: string, shown: Set<string>): Promise<Phone> {
    const phone = await phoneOn(profile, origin());
    await phone.page.exposeFunction('shownSaved', (keys: string[]) => keys.forEach((key) => shown.add(key)));
    await phone.page.addInitScript(watchSaved);
    await phone.page.goto(recorder);
    await expect(phone.page.getByRole('group', { name: 'Keys' })).toBeVisible();
    return phone;
  }

  test(`${ROUNDS} times: every mark that was shown as saved is there again, and reaches the office once`, async () => {
    const random = seededRandom(SEED);
    const first = await phoneOn(profile, origin());
    await signInByForm(first.page, 'technician2@tarrow.example');
    await openField(first.page);
    await untilInstalled(first.page);
    const recorder = await startReading(first.page, { code: 'KILLED' });
    await first.context.close();

    const reading = recorder.split('/').at(-1) ?? '';
    const shown = new Set<string>();
    for (let round = 0; round < ROUNDS; round++) {
      const phone = await open(recorder, shown);
      await expectStored(phone.page, reading, shown);
      const killed = sleep(150 + random() * 900).then(() => killPhone(profile, phone));
      for (let press = 0; press < 12; press++) {
        const letter = LETTERS[Math.floor(random() * LETTERS.length)] ?? 'o';
        // The browser may die under any press; that is the point.
        await phone.page.keyboard.press(letter).catch(() => undefined);
      }
      await killed;
    }
    test.info().annotations.push({ type: 'marks shown as saved', description: String(shown.size) });
    expect(shown.size).toBeGreaterThan(ROUNDS);

    const last = await open(recorder, new Set());
    await expectStored(last.page, reading, shown);
    await untilSent(last.page);
    const local = await storedCells(last.page, reading);
    await last.context.close();
    const reviewer = new WireClient(origin());
    await reviewer.signIn('reviewer@tarrow.example');
    const { marks } = await reviewer.get<{ marks: { q: number; r: number }[] }>(`/api/readings/${reading}`);
    expect(marks.map(({ q, r }) => `${q},${r}`).sort()).toEqual(local.sort());
  });
});
