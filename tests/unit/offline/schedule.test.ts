import { afterEach, describe, expect, test, vi } from 'vitest';
import type { DrainEnd } from '@/lib/offline/drain-ports';
import { NEWS_MS, PROBE_EVERY_MS, type Schedule, TICK_MS, backoffMs, startSchedule } from '@/lib/offline/schedule';
import { ManualTimers } from '@/tests/support/sim/manual-timers';

const running: Schedule[] = [];

afterEach(() => {
  for (const schedule of running.splice(0)) schedule.stop();
});

const AGAIN: DrainEnd = { kind: 'again', trouble: 'no-answer', afterMs: null };

function start(ends: DrainEnd[], { waiting = false, reachable = false } = {}) {
  const timers = new ManualTimers();
  const drain = vi.fn(async () => ends.shift() ?? { kind: 'done' as const });
  const facts = { waiting, reachable };
  const schedule = startSchedule({
    drain,
    timers,
    random: () => 0.999,
    isWaiting: async () => facts.waiting,
    probe: async () => facts.reachable,
    ended: () => undefined,
  });
  running.push(schedule);
  return { timers, drain, schedule, facts };
}

describe('the waits after failures', () => {
  test('grow from one second to five minutes and are spread over their whole length', () => {
    const longest = [1, 2, 3, 8, 9, 30].map((failures) => backoffMs(failures, () => 1));
    expect(longest).toEqual([1_000, 2_000, 4_000, 128_000, 256_000, 300_000]);
    expect(backoffMs(9, () => 0)).toBe(0);
  });

  test('grow while the trouble is the same and start anew when it changes', async () => {
    const busy: DrainEnd = { kind: 'again', trouble: 'office-busy', afterMs: null };
    const { timers, drain } = start([AGAIN, AGAIN, AGAIN, busy]);
    await timers.pass(1_000 + 2_000 + 4_000);
    expect(drain).toHaveBeenCalledTimes(4);
    await timers.pass(1_000);
    expect(drain).toHaveBeenCalledTimes(5);
  });

  test('are as long as a busy office asks', async () => {
    const { timers, drain, facts } = start([{ kind: 'again', trouble: 'office-busy', afterMs: 40_000 }]);
    facts.reachable = true;
    await timers.pass(39_000);
    expect(drain).toHaveBeenCalledTimes(1);
    await timers.pass(1_000);
    expect(drain).toHaveBeenCalledTimes(2);
  });

  test('end early once a small question finds the office there again', async () => {
    const { timers, drain, facts } = start(Array.from({ length: 8 }, () => AGAIN));
    await timers.pass(127_000);
    expect(drain).toHaveBeenCalledTimes(8);
    facts.reachable = true;
    await timers.pass(PROBE_EVERY_MS + 1_000);
    expect(drain).toHaveBeenCalledTimes(9);
  });
});

describe('a pass starts', () => {
  test('with the app', async () => {
    const { timers, drain } = start([]);
    await timers.pass(0);
    expect(drain).toHaveBeenCalledTimes(1);
  });

  test('within seconds after something was saved', async () => {
    const { timers, drain, facts } = start([]);
    await timers.pass(3 * TICK_MS);
    expect(drain).toHaveBeenCalledTimes(1);
    facts.waiting = true;
    await timers.pass(TICK_MS);
    expect(drain).toHaveBeenCalledTimes(2);
  });

  test.each(['elsewhere', 'cleared'] as const)('within seconds after one that ended with %s', async (kind) => {
    const { timers, drain } = start([{ kind }]);
    await timers.pass(TICK_MS);
    expect(drain).toHaveBeenCalledTimes(2);
  });

  test('every minute for news', async () => {
    const { timers, drain } = start([]);
    await timers.pass(NEWS_MS);
    expect(drain).toHaveBeenCalledTimes(2);
  });

  test.each(['online', 'visible', 'signed-in', 'manual'] as const)('at once when woken by %s', async (reason) => {
    const { timers, drain, schedule } = start([{ kind: 'sign-in' }]);
    await timers.pass(10_000);
    expect(drain).toHaveBeenCalledTimes(1);
    schedule.wake(reason);
    await timers.pass(0);
    expect(drain).toHaveBeenCalledTimes(2);
    expect(drain).toHaveBeenLastCalledWith({ all: reason === 'manual' });
  });

  test('again when it was woken while one was running', async () => {
    const { timers, drain, schedule } = start([]);
    schedule.wake('online');
    await timers.pass(0);
    expect(drain).toHaveBeenCalledTimes(2);
  });

  test('never again after the schedule was stopped', async () => {
    const { timers, drain, schedule } = start([], { waiting: true });
    await timers.pass(0);
    schedule.stop();
    await timers.pass(10 * NEWS_MS);
    expect(drain).toHaveBeenCalledTimes(1);
  });
});

test('nothing is hammered while a person is needed', async () => {
  const { timers, drain } = start([{ kind: 'sign-in' }], { waiting: true });
  await timers.pass(200_000);
  expect(drain).toHaveBeenCalledTimes(1);
});
