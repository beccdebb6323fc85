import { afterEach, describe, expect, test, vi } from 'vitest';
import type { Edges } from '@/lib/offline/edges';
import { FieldSession } from '@/lib/offline/field-session';
import { noWebLock } from '@/lib/offline/lease';
import type { NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import { freshIndexedDb } from '@/tests/support/sim/fresh-database';
import { countingMaker, sha256 } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { NO_ANSWER, ScriptedNetwork, jsonAnswer, problemAnswer } from '@/tests/support/sim/scripted-network';

const TIME = '2026-06-16T09:41:00.000Z';

/** Who is signed in at the office, and with which role. */
interface Cookie {
  user: string | null;
  role: string;
  online: boolean;
}

function office(cookie: Cookie) {
  return (request: NetworkRequest): NetworkAnswer => {
    const ours = { protocol: 1, epoch: 1, serverTime: TIME };
    if (!cookie.online) return NO_ANSWER;
    if (request.path === '/api/health') return jsonAnswer(200, { ok: true, epoch: 1 });
    if (request.path === '/api/auth/csrf') return jsonAnswer(200, { csrfToken: 'token' });
    if (request.path === '/api/auth/signout') {
      cookie.user = null;
      return jsonAnswer(200, { url: '/sign-in' });
    }
    if (cookie.user === null) return problemAnswer(401, 'signin');
    if (request.path === '/api/me') {
      const user = { id: cookie.user, name: `Name of ${cookie.user}` };
      const team = { id: 'team', name: 'Quillard Field Room', zone: 'America/New_York' };
      return jsonAnswer(200, { user, team, role: cookie.role, members: [user], serverTime: TIME });
    }
    if (request.path.endsWith('/enrol'))
      return jsonAnswer(200, { deviceId: `device-of-${cookie.user}`, deviceKey: 'k', epoch: 1, serverTime: TIME });
    if (request.deviceId !== `device-of-${cookie.user}`) return problemAnswer(403, 'device-revoked');
    if (request.path.includes('/pull'))
      return jsonAnswer(200, { ...ours, safeSeq: 0, rows: [], next: '1:0', more: false });
    const { ops }: { ops: { opId: string; bodyHash: string }[] } = JSON.parse(request.body ?? '{}');
    const results = ops.map(({ opId, bodyHash }, i) => ({ opId, bodyHash, r: 'applied', seq: i + 1 }));
    return jsonAnswer(200, { ...ours, safeSeq: 0, results });
  };
}

const open: FieldSession[] = [];

afterEach(() => {
  for (const session of open.splice(0)) session.standing.get().records?.close();
});

function phone(part: Partial<Cookie> = {}) {
  const cookie: Cookie = { user: 'tobiah', role: 'technician', online: true, ...part };
  const network = new ScriptedNetwork(office(cookie));
  const clock = new ManualTimers();
  const { newId } = countingMaker(clock);
  const dexie = freshIndexedDb();
  const edges: Edges = {
    clock,
    timers: clock,
    random: () => 0.5,
    network,
    sha256,
    newId,
    webLock: () => noWebLock,
    askForWake: async () => undefined,
    dexie,
    page: 'page',
    label: 'Android',
  };
  /** Opens the app in a fresh page of the same phone. */
  const openApp = async () => {
    const session = new FieldSession(edges);
    open.push(session);
    await session.start();
    return session;
  };
  return { cookie, network, clock, openApp };
}

const viewOf = (session: FieldSession) => session.standing.get().view;

function recordsOf(session: FieldSession) {
  const { records } = session.standing.get();
  if (!records) throw new Error('no records are open');
  return records;
}

const queued = async (session: FieldSession) => (await recordsOf(session).store.counts()).queued;

/** Waits for real storage, letting simulated time pass. */
async function until(clock: ManualTimers, check: () => void | Promise<void>): Promise<void> {
  const step = async () => {
    await clock.pass(20);
    await check();
  };
  await vi.waitFor(step, { timeout: 8_000, interval: 5 });
}

describe('the field app', () => {
  test('opens the records of the person who is signed in and enrols the phone', async () => {
    const { clock, openApp } = phone();
    const session = await openApp();
    expect(viewOf(session)).toMatchObject({
      kind: 'ready',
      person: { userId: 'tobiah', displayName: 'Name of tobiah', role: 'technician' },
    });
    await until(clock, () => expect(viewOf(session)).toMatchObject({ enrolled: true }));
    expect(recordsOf(session).db.name).toBe('undereave-team-tobiah');
  });

  test('opens the last person without any network, with everything that was saved', async () => {
    const { cookie, openApp } = phone();
    const first = await openApp();
    cookie.online = false;
    await recordsOf(first).commands.openNest({ code: 'N01' });
    recordsOf(first).close();
    const session = await openApp();
    expect(viewOf(session)).toMatchObject({ kind: 'ready', person: { userId: 'tobiah' }, storageCleared: false });
    expect(await queued(session)).toBe(1);
  });

  test('asks a phone that knows nobody to sign in, and tells whether the office is there', async () => {
    expect(viewOf(await phone({ user: null }).openApp())).toEqual({ kind: 'signed-out', reachable: true });
    expect(viewOf(await phone({ online: false }).openApp())).toEqual({ kind: 'signed-out', reachable: false });
  });

  test('goes on recording when the session has run out, and sends after the same person signed in (F57)', async () => {
    const { cookie, clock, openApp } = phone();
    const first = await openApp();
    await until(clock, () => expect(viewOf(first)).toMatchObject({ enrolled: true }));
    recordsOf(first).close();
    cookie.user = null;
    const session = await openApp();
    expect(viewOf(session)).toMatchObject({ kind: 'needs-sign-in', person: { userId: 'tobiah' } });
    await recordsOf(session).commands.openNest({ code: 'N01' });
    await clock.pass(60_000);
    expect(await queued(session)).toBe(1);
    cookie.user = 'tobiah';
    await session.refresh();
    expect(viewOf(session).kind).toBe('ready');
    await until(clock, async () => expect(await queued(session)).toBe(0));
  });

  test('notices during a pass that the session has run out', async () => {
    const { cookie, clock, openApp } = phone();
    const session = await openApp();
    await until(clock, () => expect(viewOf(session)).toMatchObject({ enrolled: true }));
    cookie.user = null;
    recordsOf(session).wake('online');
    await until(clock, () => expect(viewOf(session).kind).toBe('needs-sign-in'));
  });
});

describe('a shared phone (F60)', () => {
  test('never shows one person what the other has not sent, nor sends it in their name', async () => {
    const { cookie, clock, network, openApp } = phone();
    const first = await openApp();
    await until(clock, () => expect(viewOf(first)).toMatchObject({ enrolled: true }));
    cookie.online = false;
    await recordsOf(first).commands.openNest({ code: 'N01' });
    await first.signOut();
    expect(viewOf(first).kind).toBe('signed-out');
    Object.assign(cookie, { online: true, user: 'oriel' });
    const asked = network.asked.length;
    const second = await openApp();
    expect(viewOf(second)).toMatchObject({ kind: 'ready', person: { userId: 'oriel' } });
    expect(await queued(second)).toBe(0);
    await clock.pass(60_000);
    expect(network.asked.slice(asked).filter(({ path }) => path.endsWith('/push'))).toEqual([]);
    recordsOf(second).close();
    cookie.user = 'tobiah';
    expect(await queued(await openApp())).toBe(1);
  });

  test('opens the right records when somebody else has signed in under an open app', async () => {
    const { cookie, clock, openApp } = phone();
    const session = await openApp();
    await until(clock, () => expect(viewOf(session)).toMatchObject({ enrolled: true }));
    cookie.user = 'oriel';
    await recordsOf(session).commands.openNest({ code: 'N01' });
    recordsOf(session).wake('online');
    await until(clock, () => expect(viewOf(session)).toMatchObject({ person: { userId: 'oriel' } }));
    expect(await queued(session)).toBe(0);
  });

  test('ends a session at the office that was left with no signal', async () => {
    const { cookie, network, openApp } = phone();
    const session = await openApp();
    cookie.online = false;
    await session.signOut();
    cookie.online = true;
    expect(viewOf(await openApp())).toEqual({ kind: 'signed-out', reachable: true });
    expect(network.paths()).toContain('/api/auth/signout');
    expect(cookie.user).toBeNull();
  });
});

describe('storage that the browser has emptied (F26)', () => {
  test('is noticed when the app opens, and the phone goes on with a new enrolment', async () => {
    const { clock, openApp } = phone();
    const first = await openApp();
    await until(clock, () => expect(viewOf(first)).toMatchObject({ enrolled: true }));
    await recordsOf(first).db.delete();
    const session = await openApp();
    expect(viewOf(session)).toMatchObject({ kind: 'ready', storageCleared: true });
    await recordsOf(session).commands.openNest({ code: 'N01' });
    recordsOf(session).wake('online');
    await until(clock, async () => expect(await queued(session)).toBe(0));
  });

  test('is noticed under an open app: the press is not shown as saved, and the next one is kept', async () => {
    const { clock, openApp } = phone();
    const session = await openApp();
    await until(clock, () => expect(viewOf(session)).toMatchObject({ enrolled: true }));
    const { db, commands } = recordsOf(session);
    await db.transaction('rw', db.tables, () => Promise.all(db.tables.map((table) => table.clear())));
    await expect(commands.openNest({ code: 'N01' })).rejects.toMatchObject({ reason: 'cleared' });
    expect(viewOf(session)).toMatchObject({ storageCleared: true });
    await commands.openNest({ code: 'N02' });
  });
});

test('refused operations are offered again once the person has another role', async () => {
  const { cookie, clock, openApp } = phone({ role: 'researcher' });
  const session = await openApp();
  const { store, commands } = recordsOf(session);
  await commands.openNest({ code: 'N01' });
  const [row] = await store.queued(1);
  if (!row) throw new Error('nothing was saved');
  await store.transact([], () => ({ result: null, ops: [{ ...row, state: 'refused', code: 'role' }] }));
  cookie.role = 'technician';
  await session.refresh();
  expect(viewOf(session)).toMatchObject({ person: { role: 'technician' } });
  recordsOf(session).wake('online');
  await until(clock, async () =>
    expect(await recordsOf(session).store.counts()).toMatchObject({ queued: 0, refused: 0 }),
  );
});

test('a recorder is the same for everyone who asks, and is kept while it has something unsaved', async () => {
  const { openApp } = phone();
  const records = recordsOf(await openApp());
  const nest = await records.commands.openNest({ code: 'N01' });
  const visit = await records.commands.openVisit({ nest, purpose: 'check' });
  const reading = await records.commands.openReading({ nest, visit, kind: 'field', source: 'phone' });
  const recorder = await records.recorder(reading);
  expect(await records.recorder(reading)).toBe(recorder);
  recorder?.press('egg');
  records.closeRecorder(reading);
  expect(await records.recorder(reading)).toBe(recorder);
  expect(records.notSaved()).toHaveLength(1);
  await vi.waitFor(() => expect(records.notSaved()).toEqual([]));
  records.closeRecorder(reading);
  expect(await records.recorder(reading)).not.toBe(recorder);
});
