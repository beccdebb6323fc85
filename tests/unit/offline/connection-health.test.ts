import { describe, expect, test, vi } from 'vitest';
import { checkConnection } from '@/lib/offline/connection-health';
import type { Store } from '@/lib/offline/store';
import { watchStore } from '@/lib/offline/watch-store';
import { meta } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { MemoryDisk } from '@/tests/support/sim/memory-disk';
import { memoryStore } from '@/tests/support/sim/memory-store';

/** A connection that the phone dropped in the background: it hangs or fails until it is opened anew. */
function dropped(how: () => Promise<never>): Store {
  const disk = new MemoryDisk();
  disk.meta = meta();
  const store = memoryStore(disk);
  let dead = true;
  return {
    ...store,
    probe: () => (dead ? how() : store.probe()),
    readMeta: () => (dead ? how() : store.readMeta()),
    reopen: async () => {
      dead = false;
    },
  };
}

const fails = () => Promise.reject(new Error('the connection is closing'));
const hangs = () => new Promise<never>(() => undefined);

describe('the connection to the storage', () => {
  test.each([
    ['fails', fails],
    ['hangs', hangs],
  ])('is opened anew when a cheap read %s after the app comes back', async (_how, how) => {
    const timers = new ManualTimers();
    const store = dropped(how);
    const reopen = vi.spyOn(store, 'reopen');
    const checked = checkConnection({ store, timers });
    await timers.pass(10_000);
    expect(await checked).toBe(true);
    expect(reopen).toHaveBeenCalledTimes(1);
  });

  test('is left alone when it lives', async () => {
    const timers = new ManualTimers();
    const store = memoryStore(new MemoryDisk());
    const reopen = vi.spyOn(store, 'reopen');
    expect(await checkConnection({ store, timers })).toBe(true);
    expect(reopen).not.toHaveBeenCalled();
  });

  test('is given up when it cannot be opened', async () => {
    const timers = new ManualTimers();
    const store = { ...dropped(fails), reopen: fails };
    expect(await checkConnection({ store, timers })).toBe(false);
  });

  test('holds up nothing for ever: a call that hangs fails', async () => {
    const timers = new ManualTimers();
    const call = watchStore(dropped(hangs), timers).readMeta();
    const failed = expect(call).rejects.toMatchObject({ name: 'TimedOut' });
    await timers.pass(10_000);
    await failed;
  });
});
