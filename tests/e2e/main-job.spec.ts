import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type Page, chromium, expect, test } from '@playwright/test';
import { spiral } from '@/lib/comb/walk';
import { findChromium } from '@/lib/cli/chromium';
import { createDemoDatabase } from '@/tests/support/demo-database';
import { openField, pressAll, readCells, startReading, untilInstalled, untilSent } from '@/tests/support/pages/field';
import { phoneOn } from '@/tests/support/pages/phone';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { type TestServer, startTestServer } from '@/tests/support/server';
import { WireClient } from '@/tests/support/wire/wire-client';

const CELLS = 60;
const STATES = ['Capped', 'Large', 'Medium', 'Small', 'Egg', 'Empty'] as const;

/** Sixty states, oldest in the middle. */
function sixty(): string[] {
  return spiral(CELLS).map((_, index) => STATES[Math.floor((index * STATES.length) / CELLS)] ?? 'Egg');
}

interface NestAnswer {
  id: string;
  visits: { id: string; readings: { id: string; observer: string; kind: string; submittedAt: string | null }[] }[];
}

interface ReadingAnswer {
  marks: { cell: number; state: string; q: number; r: number; opId: string; at: string }[];
  tally: Record<string, number>;
}

test.describe('the main job', () => {
  test.setTimeout(300_000);
  let server: TestServer;
  let profile: string;
  let drop: () => Promise<void>;

  test.beforeAll(async () => {
    const database = await createDemoDatabase();
    drop = database.drop;
    server = await startTestServer({ database: database.name });
    profile = mkdtempSync(join(tmpdir(), 'undereave-phone-'));
  });

  test.afterAll(async () => {
    await server.close();
    await drop();
    rmSync(profile, { recursive: true, force: true });
  });

  test('sixty cells are read with the server gone, survive a restart, and end as dates, corrections and CSV', async () => {
    const code = 'LOCK-7';
    let phone = await phoneOn(profile, server.origin);
    await signInByForm(phone.page, 'technician@tarrow.example');
    await openField(phone.page);
    await untilInstalled(phone.page);

    await server.kill();
    await phone.page.reload();
    await expect(phone.page.getByText('N12').first()).toBeVisible();
    const recorder = await startReading(phone.page, { code, counted: CELLS });
    const states = sixty();
    await pressAll(phone.page, states.slice(0, 25));
    await expect(phone.page.getByText('Cell 25', { exact: true })).toBeVisible();
    await phone.context.close();

    phone = await phoneOn(profile, server.origin);
    await phone.page.goto(recorder);
    await expect(phone.page.getByText('Cell 25', { exact: true })).toBeVisible();
    await pressAll(phone.page, states.slice(25));
    await phone.page.getByRole('button', { name: 'Finish' }).click();
    await expect(phone.page.getByText(/Estimate/).first()).toBeVisible();
    await phone.page.getByRole('button', { name: 'Submit reading' }).click();
    await expect(phone.page.getByText(/waiting to send/i).first()).toBeVisible();

    await server.start();
    await untilSent(phone.page);

    const reviewer = new WireClient(server.origin);
    await reviewer.signIn('reviewer@tarrow.example');
    const list = await reviewer.get<{ nests: { id: string; cells: number }[] }>(`/api/nests?q=${code}`);
    expect(list.nests.map(({ cells }) => cells)).toEqual([CELLS]);
    const nest = await reviewer.get<NestAnswer>(`/api/nests/${list.nests[0]?.id}`);
    const visit = nest.visits[0];
    const field = visit?.readings[0];
    expect(field?.submittedAt).not.toBeNull();
    const reading = await reviewer.get<ReadingAnswer>(`/api/readings/${field?.id}`);
    expect(reading.marks.map(({ cell }) => cell)).toEqual(spiral(CELLS).map((_, index) => index));
    expect(reading.marks.map(({ state }) => state)).toEqual(states.map((state) => state.toLowerCase()));

    await test.step('a second phone reads the same visit differently, and both are kept', async () => {
      const other = await chromium.launch({ executablePath: findChromium(), args: ['--no-sandbox'] });
      const page = await other.newPage({ baseURL: server.origin, viewport: { width: 390, height: 844 } });
      await signInByForm(page, 'technician2@tarrow.example');
      await openField(page, code);
      await page.goto(`/field/visits/${visit?.id}`);
      await readCells(page, 3);
      await pressAll(page, ['Egg', 'Egg', 'Egg']);
      await untilSent(page);
      await other.close();
      const both = await reviewer.get<NestAnswer>(`/api/nests/${nest.id}`);
      expect(both.visits[0]?.readings.map(({ observer }) => observer).sort()).toEqual([
        'Oriel Webb-Nakada',
        'Tobiah Marsh',
      ]);
    });

    await test.step('a reviewer sees dates and changes three cells in the browser', async () => {
      const lab = await chromium.launch({ executablePath: findChromium(), args: ['--no-sandbox'] });
      const page = await lab.newPage({ baseURL: server.origin, viewport: { width: 1280, height: 800 } });
      await signInByForm(page, 'reviewer@tarrow.example');
      await page.goto(`/nests/${nest.id}`);
      await expect(page.getByText(/between .* and /).first()).toBeVisible();
      await page.goto(`/nests/${nest.id}/readings/${field?.id}`);
      for (const [cell, state] of [
        [0, 'large larva'],
        [10, 'capped'],
        [59, 'egg'],
      ] as const) {
        await correctCell(page, cell, state);
      }
      await page.getByRole('button', { name: 'Settle 3 cells' }).click();
      await expect(page.getByRole('heading', { name: `Final reading of ${code}` })).toBeVisible();
      await lab.close();
    });

    await test.step('the files show both, byte for byte', async () => {
      const tallies = await (await reviewer.fetch(`/api/export/tallies.csv?nest=${code}`)).text();
      const count = (state: string) => reading.tally[state] ?? 0;
      const fieldCounts = ['empty', 'egg', 'small', 'medium', 'large', 'capped'].map(count);
      const finalCounts = [
        count('empty') - 1,
        count('egg') + 1,
        count('small'),
        count('medium'),
        count('large'),
        count('capped'),
      ];
      const rows = tallies
        .split('\r\n')
        .slice(1, -1)
        .map((row) => row.split(','));
      expect(rows.map((row) => [row[5], row.slice(9, 15).map(Number)])).toEqual(
        expect.arrayContaining([
          ['field', fieldCounts],
          ['final', finalCounts],
        ]),
      );
      const cells = await (await reviewer.fetch(`/api/export/cells.csv?nest=${code}`)).text();
      const first = reading.marks[0];
      expect(cells).toContain(`,field,Tobiah Marsh,0,0,0,capped,,no,no,no,${first?.at},\r\n`);
      expect(cells).toContain(`,0,0,0,large,,no,no,no,${first?.at},${first?.opId}\r\n`);
      expect(await (await reviewer.fetch(`/api/export/cells.csv?nest=${code}`)).text()).toBe(cells);
    });
    await phone.context.close();
  });
});

async function correctCell(page: Page, cell: number, state: string): Promise<void> {
  await page.getByRole('gridcell', { name: new RegExp(`^cell ${cell}, `) }).click();
  await page.getByRole('radio', { name: state }).check();
  await page.getByLabel('Reason').fill('Seen in the photo.');
  await page.getByRole('button', { name: 'Add to the list' }).click();
}
