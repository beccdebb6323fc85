import { afterEach, describe, expect, test, vi } from 'vitest';
import { RecordsDatabase } from '@/lib/offline/dexie-database';
import { FieldSession } from '@/lib/offline/field-session';
import { HandedPhone } from '@/tests/support/sim/handed-phone';

const open: HandedPhone[] = [];

afterEach(() => {
  for (const phone of open.splice(0)) phone.session?.standing.get().records?.close();
});

/** A phone on which a person is at work and the office takes nothing. */
async function atWork(who = 'tobiah') {
  const phone = new HandedPhone(1);
  open.push(phone);
  Object.assign(phone.office, { cookie: who, takesPushes: false });
  await phone.open();
  const nest = await phone.records().commands.openNest({ code: 'N01' });
  return { phone, nest };
}

const waiting = async (phone: HandedPhone) => (await phone.records().store.counts()).queued;
const databases = async (phone: HandedPhone) => (await phone.idb.databases()).map(({ name }) => name ?? '').sort();

describe('a session that has run out', () => {
  test('keeps everything for weeks and asks the same person to sign in', async () => {
    const { phone } = await atWork();
    phone.office.cookie = null;
    phone.clock.set(phone.clock.now() + 40 * 24 * 3_600_000);
    const session = await phone.open();
    expect(session.standing.get().view).toMatchObject({ kind: 'needs-sign-in', person: { userId: 'tobiah' } });
    expect(await waiting(phone)).toBe(1);
    phone.office.cookie = 'tobiah';
    await session.refresh();
    expect(session.standing.get().view.kind).toBe('ready');
    expect(await waiting(phone)).toBe(1);
  });

  test('gives another person who signs in nothing of it, and the first one all of it afterwards', async () => {
    const { phone } = await atWork();
    phone.office.cookie = null;
    await phone.open();
    phone.office.cookie = 'oriel';
    await phone.open();
    expect(phone.shown()).toBe('oriel');
    expect(await phone.records().db.ops.count()).toBe(0);
    phone.office.cookie = 'tobiah';
    await phone.open();
    expect(await waiting(phone)).toBe(1);
  });
});

describe('copying and deleting at sign-out', () => {
  test('takes the work and the person off the phone, and ends the session', async () => {
    const { phone } = await atWork();
    const keys = await phone.records().db.ops.toCollection().primaryKeys();
    expect(await phone.session?.signOutAndDelete(new Set(keys))).toBe(true);
    expect(phone.session?.standing.get().view).toEqual({ kind: 'signed-out', reachable: true });
    expect(await databases(phone)).toEqual(['undereave-device']);
    expect(phone.office.cookie).toBeNull();
    phone.office.cookie = 'tobiah';
    const session = await phone.open();
    expect(session.standing.get().view).toMatchObject({ kind: 'ready', storageCleared: false });
    expect(await waiting(phone)).toBe(0);
  });

  test('is not cut short when the page hears, meanwhile, that its person has left', async () => {
    const { phone } = await atWork();
    const keys = await phone.records().db.ops.toCollection().primaryKeys();
    const leaving = phone.session?.signOutAndDelete(new Set(keys));
    await Promise.all([phone.session?.follow(), phone.session?.follow()]);
    expect(await leaving).toBe(true);
    expect(await databases(phone)).toEqual(['undereave-device']);
  });

  test('deletes nothing when something was recorded after the copy: it stays, closed', async () => {
    const { phone } = await atWork();
    const keys = await phone.records().db.ops.toCollection().primaryKeys();
    await phone.records().commands.openNest({ code: 'N02' });
    expect(await phone.session?.signOutAndDelete(new Set(keys))).toBe(false);
    expect(phone.shown()).toBeNull();
    phone.office.cookie = 'tobiah';
    await phone.open();
    expect(await waiting(phone)).toBe(2);
  });
});

describe('another tab', () => {
  test('of the same phone closes the records when their person leaves, and opens those of who comes', async () => {
    const { phone } = await atWork();
    const other = new FieldSession(phone.edges);
    await other.start();
    await other.follow();
    expect(other.standing.get().view).toMatchObject({ person: { userId: 'tobiah' } });
    await phone.session?.signOut();
    await other.follow();
    expect(other.standing.get().records).toBeNull();
    expect(other.standing.get().view.kind).toBe('signed-out');
    phone.office.cookie = 'oriel';
    await phone.open();
    await other.follow();
    expect(other.standing.get().view).toMatchObject({ person: { userId: 'oriel' } });
    other.standing.get().records?.close();
  });

  test('with a newer version takes the database over: the old one lets go and shows no press as saved', async () => {
    const { phone } = await atWork();
    const { db } = phone.records();
    const newer = phone.idb.open(db.name, 999);
    await new Promise((resolve) => newer.addEventListener('success', resolve));
    newer.result.close();
    expect(phone.session?.standing.get().tab).toBe('taken-over');
    const saving = phone.records().commands.openNest({ code: 'N02' });
    const failed = expect(saving).rejects.toMatchObject({ name: 'NotSavedError' });
    await phone.clock.pass(60_000);
    await failed;
  });

  test('with an older version that does not let go is named, and the app goes on once it does', async () => {
    const phone = new HandedPhone(1);
    open.push(phone);
    phone.office.cookie = 'tobiah';
    const name = new RecordsDatabase('undereave-team-tobiah', phone.edges.dexie).name;
    const older = phone.idb.open(name, 1);
    await new Promise((resolve) => older.addEventListener('success', resolve));
    const session = new FieldSession(phone.edges);
    phone.session = session;
    const started = session.start();
    await vi.waitFor(() => expect(session.standing.get().tab).toBe('blocked'));
    older.result.close();
    await started;
    expect(session.standing.get()).toMatchObject({ tab: 'alone', view: { kind: 'ready' } });
  });
});

test('a connection that died in the background is opened anew, and the next press is kept', async () => {
  const { phone } = await atWork();
  phone.records().db.close();
  await phone.records().resume();
  await phone.records().commands.openNest({ code: 'N02' });
  expect(await waiting(phone)).toBe(2);
});
