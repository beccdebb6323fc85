import { setTimeout as sleep } from 'node:timers/promises';
import { expect, test } from '@playwright/test';
import { seededRandom } from '@/lib/kit/random';
import { uuidToBytes } from '@/lib/kit/uuid';
import { spiral } from '@/lib/comb/walk';
import type { Op } from '@/lib/protocol/op';
import { type OwnStack, startOwnStack } from '@/tests/support/own-stack';
import { type VisitIds, freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { WireClient } from '@/tests/support/wire/wire-client';

const ROUNDS = process.env.LONG === '1' ? 200 : 20;
const CELLS_PER_ROUND = 40;
const SEED = 20260616;
/** First guess at how long a push takes to its commit; the rounds then feel their way around that moment. */
const FIRST_WINDOW_MS = 250;

test.describe('a server killed at random moments of a push', () => {
  test.describe.configure({ mode: 'serial', timeout: process.env.LONG === '1' ? 3_600_000 : 420_000 });
  let stack: OwnStack;
  let phone: WireClient;

  test.beforeAll(async () => {
    stack = await startOwnStack();
    phone = new WireClient(stack.origin);
    await phone.signIn('technician@tarrow.example');
    await phone.enrol();
  });

  test.afterAll(async () => stack.close());

  /** Sends one batch and does something fatal a few milliseconds later; says whether the answer still came. */
  async function pushAndKill(ops: readonly Op[], kill: () => Promise<void>, afterMs: number): Promise<boolean> {
    const answer = phone.push(ops).then(
      ({ results }) => Array.isArray(results) && results.length === ops.length,
      () => false,
    );
    await sleep(afterMs);
    await kill();
    return answer;
  }

  async function stored(ids: VisitIds): Promise<number> {
    const [row] = await stack.rows('SELECT COUNT(*) AS n FROM marks WHERE reading_id = ?', [
      Buffer.from(uuidToBytes(ids.reading)),
    ]);
    return Number(row?.n);
  }

  async function expectGaplessLog(): Promise<void> {
    const [row] = await stack.rows(
      'SELECT COUNT(*) AS n, MAX(o.seq) AS top, MAX(c.seq) AS counted FROM ops o JOIN team_counters c USING (team_id) WHERE team_id = (SELECT team_id FROM devices LIMIT 1)',
    );
    expect(Number(row?.n)).toBe(Number(row?.top));
    expect(Number(row?.counted)).toBe(Number(row?.top));
  }

  async function rounds(kill: () => Promise<void>, revive: () => Promise<void>): Promise<void> {
    const random = seededRandom(SEED);
    let before = 0;
    let after = 0;
    let windowMs = FIRST_WINDOW_MS;
    for (let round = 0; round < ROUNDS; round++) {
      const ids = freshIds();
      const ops = [
        ...openingOps(ids, `K${round}`),
        ...spiral(CELLS_PER_ROUND).map((cell) => markOp(ids, { ...cell, state: 'egg' })),
      ];
      const answered = await pushAndKill(ops, kill, windowMs * (0.5 + random()));
      await revive();
      const kept = await stored(ids);
      expect(kept === 0 || kept === CELLS_PER_ROUND, `all or nothing, but ${kept} marks`).toBe(true);
      if (answered) expect(kept).toBe(CELLS_PER_ROUND);
      if (kept === 0) before += 1;
      else after += 1;
      windowMs *= kept === 0 ? 1.4 : 0.7;
      const again = await phone.push(ops);
      const expected = kept === 0 ? 'applied' : 'duplicate';
      expect(again.results.map(({ r }) => r)).toEqual(ops.map(() => expected));
      expect(await stored(ids)).toBe(CELLS_PER_ROUND);
    }
    await expectGaplessLog();
    test
      .info()
      .annotations.push({ type: 'kills', description: `${before} before the commit, ${after} after it, seed ${SEED}` });
    expect(before, 'no kill fell before a commit: widen the window').toBeGreaterThan(0);
    expect(after, 'no kill fell after a commit: widen the window').toBeGreaterThan(0);
  }

  test(`the web server, ${ROUNDS} times: nothing doubled, nothing lost`, async () => {
    await rounds(stack.killServer, stack.startServer);
  });

  test(`MariaDB, ${ROUNDS} times: what was answered is there, the rest arrives on the next try`, async () => {
    await rounds(stack.killDatabase, async () => {
      await stack.startDatabase();
      const health = () =>
        phone.fetch('/api/health').then(
          ({ status }) => status,
          () => null,
        );
      await expect.poll(health, { timeout: 30_000 }).toBe(200);
    });
  });
});
