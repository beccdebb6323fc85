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

/** The addresses of all marks in the phone's storage. */
async function storedCells(page: Page): Promise<string[]> {
  return page.evaluate(async () => {
    const names = (await indexedDB.databases()).map(({ name }) => name ?? '');
    const name = names.find((candidate) => /^undereave-[0-9a-f]{8}-/.test(candidate)) ?? '';
    const db = await new Promise<IDBDatabase>((resolve, reject) => {
      const open = indexedDB.open(name);
      open.onsuccess = () => resolve(open.result);
      open.onerror = () => reject(open.error);
    });
    const rows = await new Promise<{ op: { kind: string; body: { q: number; r: number } } }[]>((resolve, reject) => {
      const all = db.transaction('ops').objectStore('ops').getAll();
      all.onsuccess = () => resolve(all.result);
      all.onerror = () => reject(all.error);
    });
    db.close();
    return rows.filter(({ op }) => op.kind === 'cell.mark').map(({ op }) => `${op.body.q},${op.body.r}`);
  });
}

test.describe('a browser killed at random moments of reading', () => {
  test.setTimeout(process.env.LONG === '1' ? 3_600_000 : 420_000);
  let profile: string;

  test.beforeAll(() => {
    profile = mkdtempSync(join(tmpdir(), 'undereave-kill-'));
  });

  test.afterAll(() => rmSync(profile, { recursive: true, force: true }));

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

    const shown = new Set<string>();
    for (let round = 0; round < ROUNDS; round++) {
      const phone = await open(recorder, shown);
      const killed = sleep(150 + random() * 900).then(() => killPhone(profile, phone));
      for (let press = 0; press < 12; press++) {
        const letter = LETTERS[Math.floor(random() * LETTERS.length)] ?? 'o';
        // The browser may die under any press; that is the point.
        await phone.page.keyboard.press(letter).catch(() => undefined);
      }
      await killed;
      const after = await open(recorder, new Set());
      const stored = new Set(await storedCells(after.page));
      expect(
        [...shown].filter((key) => !stored.has(key)),
        `round ${round}, seed ${SEED}`,
      ).toEqual([]);
      await after.context.close();
    }
    test.info().annotations.push({ type: 'marks shown as saved', description: String(shown.size) });
    expect(shown.size).toBeGreaterThan(ROUNDS);

    const last = await open(recorder, new Set());
    await untilSent(last.page);
    const local = await storedCells(last.page);
    await last.context.close();
    const reviewer = new WireClient(origin());
    await reviewer.signIn('reviewer@tarrow.example');
    const id = recorder.split('/').at(-1) ?? '';
    const { marks } = await reviewer.get<{ marks: { q: number; r: number }[] }>(`/api/readings/${id}`);
    expect(marks.map(({ q, r }) => `${q},${r}`).sort()).toEqual(local.sort());
  });
});
