import { describe, expect, test, vi } from 'vitest';
import { createDrain } from '@/lib/offline/drain';
import type { DrainPorts } from '@/lib/offline/drain-ports';
import { noWebLock } from '@/lib/offline/lease';
import type { LocalOp } from '@/lib/offline/local-op';
import type { NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import { SUSPECT_RETRY_MS } from '@/lib/offline/retry-suspects';
import type { Op } from '@/lib/protocol/op';
import { id, meta, row } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { MemoryDisk } from '@/tests/support/sim/memory-disk';
import { memoryStore } from '@/tests/support/sim/memory-store';
import { NO_ANSWER, ScriptedNetwork, jsonAnswer, problemAnswer } from '@/tests/support/sim/scripted-network';

const TIME = '2026-06-16T09:41:00.000Z';

function opsOf({ body = '{}' }: NetworkRequest): Op[] {
  const { ops = [] }: { ops?: Op[] } = JSON.parse(body);
  return ops;
}

/** An office that takes everything. */
function willing(request: NetworkRequest): NetworkAnswer {
  const ours = { protocol: 1, epoch: 1, serverTime: TIME };
  if (request.path === '/api/health') return jsonAnswer(200, { ok: true, epoch: 1 });
  if (request.path.endsWith('/enrol'))
    return jsonAnswer(200, { deviceId: 'minted', deviceKey: 'k', epoch: 1, serverTime: TIME });
  if (request.path.includes('/pull'))
    return jsonAnswer(200, { ...ours, safeSeq: 0, rows: [], next: '1:0', more: false });
  const results = opsOf(request).map(({ opId, bodyHash, n }) => ({ opId, bodyHash, r: 'applied', seq: n }));
  return jsonAnswer(200, { ...ours, safeSeq: 0, results });
}

/** A willing office that fails over every batch with one of these numbers in it. */
function failingOver(bad: readonly number[], status = 500) {
  return (request: NetworkRequest) =>
    opsOf(request).some(({ n }) => bad.includes(n))
      ? problemAnswer(status, status === 500 ? 'internal' : 'shape')
      : willing(request);
}

function phone(count: number, script = willing, part: Partial<DrainPorts> = {}) {
  const disk = new MemoryDisk();
  disk.meta = meta();
  for (let n = 1; n <= count; n++) disk.ops.set(id(n), row({ kind: 'cell.mark', n }));
  const timers = new ManualTimers();
  const network = new ScriptedNetwork(script);
  const report = vi.fn();
  const ports: DrainPorts = {
    store: memoryStore(disk),
    clock: timers,
    timers,
    network,
    lock: noWebLock,
    holder: 'tab',
    label: 'phone',
    enrols: true,
    report,
    keepDevice: async () => undefined,
    ...part,
  };
  const rows = (state: LocalOp['state']) => [...disk.ops.values()].filter((found) => found.state === state);
  const numbers = (state: LocalOp['state']) => rows(state).map(({ n }) => n);
  return { disk, timers, network, report, drain: createDrain(ports), numbers };
}

const pass = { all: false };

describe('a pass of the drain', () => {
  test('sends the whole queue in order, pulls, and notes when', async () => {
    const { disk, timers, network, drain, numbers } = phone(60);
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(numbers('held')).toHaveLength(60);
    expect(network.asked.flatMap(opsOf).map(({ n }) => n)).toEqual(Array.from({ length: 60 }, (_, i) => i + 1));
    expect(network.paths().at(-1)).toBe('/api/sync/v1/pull');
    expect(disk.meta?.lastSync).toBe(timers.now());
  });

  test('sends nothing twice at once, and never more than a hundred operations', async () => {
    const { network, drain } = phone(500);
    await drain(pass);
    const sizes = network.asked.map((request) => opsOf(request).length);
    expect(Math.max(...sizes)).toBe(100);
    expect(sizes.reduce((sum, size) => sum + size)).toBe(500);
  });

  test('tells the office with each request how much it still holds', async () => {
    const { network, drain } = phone(60);
    await drain(pass);
    expect(network.asked.map(({ unsent }) => unsent)).toEqual([60, 35, 0]);
  });

  test('reports how far it is while a push is on its way', async () => {
    const { report, drain } = phone(60);
    await drain(pass);
    expect(report.mock.calls.map(([progress]) => progress)).toEqual([{ k: 25, n: 60 }, { k: 60, n: 60 }, null]);
  });

  test('keeps everything when nobody answers', async () => {
    const { drain, numbers } = phone(3, () => NO_ANSWER);
    expect(await drain(pass)).toEqual({ kind: 'again', trouble: 'no-answer', afterMs: null });
    expect(numbers('queued')).toEqual([1, 2, 3]);
  });

  test.each([
    [401, 'signin', 'sign-in'],
    [403, 'role', 'role'],
    [426, 'client-too-old', 'update'],
  ])('stops at %i %s and keeps everything', async (status, code, kind) => {
    const { drain, numbers } = phone(3, () => problemAnswer(status, code));
    expect(await drain(pass)).toEqual({ kind });
    expect(numbers('queued')).toEqual([1, 2, 3]);
  });

  test('does not go round and round over an answer that settles nothing (F12)', async () => {
    const empty = { protocol: 1, epoch: 1, serverTime: TIME, safeSeq: 0, results: [] };
    const { network, drain, numbers } = phone(3, () => jsonAnswer(200, empty));
    expect(await drain(pass)).toMatchObject({ kind: 'again', trouble: 'no-real-connection' });
    expect(network.asked).toHaveLength(1);
    expect(numbers('queued')).toEqual([1, 2, 3]);
  });

  test('carries less after a request ran out of time (F07)', async () => {
    const { network, drain } = phone(25, () => ({ kind: 'none', why: 'timeout' }));
    for (let i = 0; i < 6; i++) await drain(pass);
    expect(network.asked.map((request) => opsOf(request).length)).toEqual([25, 12, 6, 3, 1, 1]);
  });

  test('ends when the storage was emptied', async () => {
    const { disk, drain } = phone(1);
    disk.clear();
    expect(await drain(pass)).toEqual({ kind: 'cleared' });
  });

  test('survives a storage that fails', async () => {
    const { drain } = phone(1, willing, {
      store: { ...memoryStore(new MemoryDisk()), readMeta: () => Promise.reject(new Error('dead')) },
    });
    expect(await drain(pass)).toEqual({ kind: 'again', trouble: null, afterMs: null });
  });
});

describe('an operation that the office fails over (F62)', () => {
  test.each([400, 413, 415])('is narrowed down at once by %i, and the others pass', async (status) => {
    const { drain, numbers } = phone(30, failingOver([7, 22], status));
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(numbers('suspect')).toEqual([7, 22]);
    expect(numbers('held')).toHaveLength(28);
  });

  test('is narrowed down by 500 only once the same batch has failed twice', async () => {
    const { network, drain, numbers } = phone(30, failingOver([7]));
    expect(await drain(pass)).toMatchObject({ kind: 'again', trouble: 'office-busy' });
    expect(network.asked).toHaveLength(1);
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(numbers('suspect')).toEqual([7]);
    expect(numbers('held')).toHaveLength(29);
  });

  test('is not suspected while the office fails over everything', async () => {
    const { drain, numbers } = phone(3, () => problemAnswer(500, 'internal'));
    for (let i = 0; i < 8; i++) expect(await drain(pass)).toMatchObject({ kind: 'again' });
    expect(numbers('queued')).toEqual([1, 2, 3]);
  });

  test('is tried again after a day, and at once when a person asks', async () => {
    const { timers, network, drain, numbers } = phone(2, failingOver([1], 400));
    await drain(pass);
    expect(numbers('suspect')).toEqual([1]);
    const count = () => network.asked.flatMap(opsOf).filter(({ n }) => n === 1).length;
    const before = count();
    await timers.pass(SUSPECT_RETRY_MS - 1_000);
    await drain(pass);
    expect(count()).toBe(before);
    await drain({ all: true });
    expect(count()).toBe(before + 1);
    await timers.pass(SUSPECT_RETRY_MS);
    network.script = willing;
    await drain(pass);
    expect(numbers('held')).toEqual([1, 2]);
  });
});

describe('after a restore of the office', () => {
  /** An office of epoch 2 that has only the first operation. */
  const restored = (request: NetworkRequest): NetworkAnswer => {
    const ours = { protocol: 1, epoch: 2, serverTime: TIME };
    if (request.path === '/api/health') return jsonAnswer(200, { ok: true, epoch: 2 });
    if (request.path.endsWith('/have')) return jsonAnswer(200, { ...ours, have: [id(1)] });
    if (request.path.endsWith('/enrol'))
      return jsonAnswer(200, { deviceId: 'minted', deviceKey: 'k', epoch: 2, serverTime: TIME });
    if (request.path.includes('/pull')) {
      const known = request.path.includes('cursor=2:');
      const page = { ...ours, safeSeq: 0, rows: [], next: '2:0', more: false };
      return known ? jsonAnswer(200, page) : problemAnswer(409, 'epoch-mismatch', { epoch: 2 });
    }
    const { epoch }: { epoch: number } = JSON.parse(request.body ?? '{}');
    if (epoch !== 2) return problemAnswer(409, 'epoch-mismatch', { epoch: 2 });
    const results = opsOf(request).map(({ opId, bodyHash, n }) => ({ opId, bodyHash, r: 'applied', seq: n }));
    return jsonAnswer(200, { ...ours, safeSeq: 0, results });
  };

  test('everything that it has lost is sent again', async () => {
    const { disk, drain, network } = phone(0, restored);
    for (const n of [1, 2, 3]) {
      disk.ops.set(id(n), row({ kind: 'cell.mark', n }, { state: 'held', outcome: 'applied', seq: n, epoch: 1 }));
    }
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(network.asked.flatMap(opsOf).map(({ n }) => n)).toEqual([2, 3]);
    expect(disk.meta).toMatchObject({ epoch: 2, reofferAfter: null, resync: false });
  });

  test('a phone it has forgotten enrols again', async () => {
    const { disk, drain, network } = phone(1, (request) =>
      request.deviceId === 'device' ? problemAnswer(403, 'device-revoked') : restored(request),
    );
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(disk.meta).toMatchObject({ epoch: 2, deviceId: 'minted' });
    expect(network.paths()).toContain('/api/sync/v1/enrol');
  });
});

test('a phone that lives in the new epoch with a name of the old one enrols again', async () => {
  // Two tabs enrolled at once while the office was restored in between, and the older name was written last.
  const { disk, drain, numbers } = phone(1, (request) => {
    const known = request.deviceId !== 'device' || !request.path.includes('/sync/');
    return known || request.path.endsWith('/enrol') ? willing(request) : problemAnswer(403, 'device-revoked');
  });
  disk.meta = meta({ deviceEpoch: 0 });
  expect(await drain(pass)).toEqual({ kind: 'done' });
  expect(disk.meta).toMatchObject({ deviceId: 'minted', deviceEpoch: 1 });
  expect(numbers('held')).toEqual([1]);
});

test('a phone that was withdrawn stays withdrawn and keeps everything', async () => {
  const { drain, network, numbers } = phone(1, (request) =>
    request.path === '/api/health' ? jsonAnswer(200, { ok: true, epoch: 1 }) : problemAnswer(403, 'device-revoked'),
  );
  expect(await drain(pass)).toEqual({ kind: 'revoked' });
  expect(network.paths()).not.toContain('/api/sync/v1/enrol');
  expect(numbers('queued')).toEqual([1]);
});

describe('a phone without a device', () => {
  test('enrols before it sends, and what was saved earlier goes under the new name', async () => {
    const { disk, drain, network } = phone(1);
    disk.meta = meta({ deviceId: null, epoch: 0 });
    disk.ops.set(id(1), row({ kind: 'cell.mark', n: 1, deviceId: '' }));
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(network.paths()[0]).toBe('/api/sync/v1/enrol');
    expect(network.asked.flatMap(opsOf)[0]?.deviceId).toBe('minted');
    expect(disk.meta).toMatchObject({ deviceId: 'minted', epoch: 1 });
  });

  test('of a person who may only read pulls without one', async () => {
    const { disk, drain, network } = phone(0, willing, { enrols: false });
    disk.meta = meta({ deviceId: null });
    expect(await drain(pass)).toEqual({ kind: 'done' });
    expect(network.paths()).toEqual(['/api/sync/v1/pull']);
  });
});

test('a cursor that the office no longer knows starts the log anew and leaves the queue alone', async () => {
  const { disk, drain, numbers } = phone(0, (request) =>
    request.path.includes('cursor=1:9') ? problemAnswer(410, 'gone') : willing(request),
  );
  disk.meta = meta({ cursor: 9 });
  disk.ops.set(id(1), row({ kind: 'cell.mark', n: 1 }, { state: 'refused' }));
  expect(await drain(pass)).toEqual({ kind: 'done' });
  expect(disk.meta?.cursor).toBe(0);
  expect(numbers('refused')).toEqual([1]);
});
