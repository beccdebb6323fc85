import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { v7 } from 'uuid';
import type { Edges } from '@/lib/offline/edges';
import { FieldSession } from '@/lib/offline/field-session';
import { noWebLock } from '@/lib/offline/lease';
import { readReading } from '@/lib/offline/read-records';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { freshIndexedDb } from '@/tests/support/sim/fresh-database';
import { HandlerNetwork } from '@/tests/support/sim/handler-network';
import { sha256 } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

const open: FieldSession[] = [];

afterEach(() => {
  for (const session of open.splice(0)) session.standing.get().records?.close();
});

/** A phone in a person's hand, with its app open. */
async function phoneOf(person: TestMember) {
  const clock = new ManualTimers();
  const network = new HandlerNetwork(person);
  const edges: Edges = {
    clock,
    timers: clock,
    random: () => 0.5,
    network,
    sha256,
    newId: v7,
    webLock: () => noWebLock,
    askForWake: async () => undefined,
    dexie: freshIndexedDb(),
    page: v7(),
    label: 'Pixel 7',
  };
  const session = new FieldSession(edges);
  open.push(session);
  await session.start();
  const { records } = session.standing.get();
  if (!records) throw new Error('the phone has nothing open');
  /** Sends and pulls until nothing waits, in real time. */
  const drain = () =>
    vi.waitFor(
      async () => {
        records.wake('online');
        await clock.pass(10);
        expect(records.activity.get()).toMatchObject({ progress: null, lastEnd: { kind: 'done' } });
        expect((await records.store.counts()).queued).toBe(0);
      },
      { timeout: 15_000, interval: 30 },
    );
  return { records, network, drain };
}

const opsInLog = () => database().models.Op.count({ where: { team_id: toBinary(team.teamId) } });

describe('a phone and the office', () => {
  it('agree on a reading of sixty cells, with every change of mind, and a second phone draws the same comb', async () => {
    const { records, network, drain } = await phoneOf(team.members.technician);
    const nest = await records.commands.openNest({ code: 'N61', place: { lat: 43.612, lon: -77.651, accuracyM: 8 } });
    const visit = await records.commands.openVisit({ nest, purpose: 'take-down' });
    const reading = await records.commands.openReading({ nest, visit, kind: 'field', source: 'phone' });
    const recorder = await records.recorder(reading);
    if (!recorder) throw new Error('no recorder');
    for (let i = 0; i < 60; i++) recorder.press((['egg', 'small', 'medium', 'capped'] as const)[i % 4] ?? 'egg');
    recorder.undo();
    recorder.toggle('nectar');
    recorder.press('empty', { note: 'dry rim' });
    recorder.jump({ q: 0, r: 0 });
    recorder.press('dead');
    await recorder.submit();
    network.loseAnswers = true;
    records.wake('online');
    await vi.waitFor(async () => expect(await opsInLog()).toBeGreaterThan(0));
    network.loseAnswers = false;
    await drain();

    const here = await readReading(records.db, records.person.userId, reading);
    expect(here?.tally).toMatchObject({ cellsTotal: 60, dead: 1, empty: 1, nectarCells: 1 });
    expect(here?.marks.every(({ standing }) => standing === 'at-office')).toBe(true);
    expect(await opsInLog()).toBe(3 + 60 + 1 + 1 + 1 + 1);

    const second = await phoneOf(team.members.technician2);
    await second.drain();
    const there = await readReading(second.records.db, second.records.person.userId, reading);
    expect(there).toMatchObject({ tally: here?.tally, mine: false, submittedAt: here?.submittedAt });
    expect(there?.marks.map(({ opId }) => opId)).toEqual(here?.marks.map(({ opId }) => opId));
  });

  it('tell a withdrawn phone from one that a restore has forgotten', async () => {
    const { records, drain } = await phoneOf(team.members.reviewer);
    await drain();
    const { Device } = database().models;
    await Device.update({ revoked_at: new Date(0) }, { where: { user_id: toBinary(team.members.reviewer.userId) } });
    await records.commands.openNest({ code: 'N62' });
    records.wake('manual');
    await vi.waitFor(() => expect(records.activity.get().lastEnd).toEqual({ kind: 'revoked' }), { timeout: 5_000 });
    expect((await records.store.counts()).queued).toBe(1);
  });

  it('let a coordinator read without a device of their own', async () => {
    const { records, drain } = await phoneOf(team.members.coordinator);
    await drain();
    expect((await records.store.readMeta())?.cursor).toBe(await opsInLog());
  });
});
