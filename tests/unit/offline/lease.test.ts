import { describe, expect, test, vi } from 'vitest';
import { dexieStore } from '@/lib/offline/dexie-store';
import { HEARTBEAT_MS, type HeldLease, LEASE_MS, type LeasePorts, noWebLock, withLease } from '@/lib/offline/lease';
import { freshDatabase } from '@/tests/support/sim/fresh-database';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { MemoryDisk } from '@/tests/support/sim/memory-disk';
import { memoryStore } from '@/tests/support/sim/memory-store';

function tabs(part: Partial<LeasePorts> = {}) {
  const disk = new MemoryDisk();
  const timers = new ManualTimers();
  const base = { store: memoryStore(disk), clock: timers, timers, lock: noWebLock, ...part };
  return { disk, timers, first: { ...base, holder: 'first' }, second: { ...base, holder: 'second' } };
}

/** Work that ends when the test says so. */
function endless() {
  let end = (): void => undefined;
  const leases: HeldLease[] = [];
  const work = (lease: HeldLease) =>
    new Promise<string>((resolve) => {
      leases.push(lease);
      end = () => resolve('worked');
    });
  return { work, end: () => end(), lease: () => leases[0] };
}

describe('the lease', () => {
  test('lets one tab work and turns the other away, until the first is done', async () => {
    const { timers, first, second } = tabs();
    const { work, end } = endless();
    const running = withLease(first, work);
    await timers.pass(0);
    expect(await withLease(second, async () => 'too')).toBeNull();
    end();
    expect(await running).toBe('worked');
    expect(await withLease(second, async () => 'now')).toBe('now');
  });

  test('holds as long as its holder renews it', async () => {
    const { timers, first, second } = tabs();
    const { work, end } = endless();
    const running = withLease(first, work);
    await timers.pass(5 * LEASE_MS);
    expect(await withLease(second, async () => 'too')).toBeNull();
    end();
    await running;
  });

  test('of a dead tab runs out after twenty seconds', async () => {
    const { timers, disk, second } = tabs();
    disk.lease = { holder: 'dead', until: timers.now() + LEASE_MS };
    expect(await withLease(second, async () => 'early')).toBeNull();
    await timers.pass(LEASE_MS);
    expect(await withLease(second, async () => 'late')).toBe('late');
  });

  test('that ends further ahead than any could comes from a clock set back, and does not hold', async () => {
    const { timers, disk, second } = tabs();
    disk.lease = { holder: 'other', until: timers.now() + LEASE_MS };
    timers.set(timers.now() - 400 * 86_400_000);
    expect(await withLease(second, async () => 'works')).toBe('works');
  });

  test('tells a holder that thaws that another has taken over', async () => {
    const { timers, disk, first } = tabs();
    const { work, end, lease } = endless();
    const running = withLease(first, work);
    await timers.pass(1);
    expect(lease()?.lost()).toBe(false);
    disk.lease = { holder: 'second', until: timers.now() + LEASE_MS };
    await timers.pass(HEARTBEAT_MS);
    expect(lease()?.lost()).toBe(true);
    end();
    await running;
    expect(disk.lease).toMatchObject({ holder: 'second' });
  });

  test('is given back when the work fails', async () => {
    const { disk, first } = tabs();
    await expect(withLease(first, () => Promise.reject(new Error('broken')))).rejects.toThrow('broken');
    expect(disk.lease).toBeNull();
  });

  test('is taken from a dead tab at once where the browser says that its lock is free', async () => {
    const { timers, disk, second } = tabs({ lock: (run) => run(true) });
    disk.lease = { holder: 'dead', until: timers.now() + LEASE_MS };
    expect(await withLease(second, async () => 'works')).toBe('works');
  });

  test('decides alone when the browser says that its lock is taken: a frozen tab keeps it', async () => {
    const { timers, disk, second } = tabs({ lock: (run) => run(false) });
    disk.lease = { holder: 'frozen', until: timers.now() + LEASE_MS };
    expect(await withLease(second, async () => 'early')).toBeNull();
    await timers.pass(LEASE_MS);
    expect(await withLease(second, async () => 'late')).toBe('late');
  });

  test('works the same in IndexedDB', async () => {
    const { timers, first, second } = tabs({ store: dexieStore(freshDatabase()) });
    const { work, end, lease } = endless();
    const running = withLease(first, work);
    await vi.waitFor(() => expect(lease()).toBeDefined());
    expect(await withLease(second, async () => 'too')).toBeNull();
    await timers.pass(0);
    end();
    expect(await running).toBe('worked');
    expect(await withLease(second, async () => 'now')).toBe('now');
  });
});
