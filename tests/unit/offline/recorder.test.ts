import { describe, expect, test, vi } from 'vitest';
import { cellKey } from '@/lib/comb/axial';
import { spiral } from '@/lib/comb/walk';
import { commitOps } from '@/lib/offline/commit-op';
import { createCommands } from '@/lib/offline/commands';
import { loadRecorder } from '@/lib/offline/load-recorder';
import { NotSavedError } from '@/lib/offline/not-saved';
import { CombRecorder, type RecorderPorts } from '@/lib/offline/recorder';
import type { RecorderMark } from '@/lib/offline/recorder-view';
import type { Store } from '@/lib/offline/store';
import { ME, OTHER, countingMaker, meta } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { MemoryDisk } from '@/tests/support/sim/memory-disk';
import { memoryStore } from '@/tests/support/sim/memory-store';

/** A phone with one nest, one visit and one reading, and the recorder of that reading. */
async function phone(kind: 'field' | 'second' = 'field') {
  const disk = new MemoryDisk();
  disk.meta = meta();
  const store = memoryStore(disk);
  const clock = new ManualTimers();
  const maker = countingMaker(clock);
  const ports: RecorderPorts & { maker: typeof maker } = {
    maker,
    commit: (entry) => commitOps({ store, clock, timers: clock }, entry),
  };
  const commands = createCommands(ports);
  const nest = await commands.openNest({ code: 'N01' });
  const visit = await commands.openVisit({ nest, purpose: 'take-down' });
  const reading = await commands.openReading({ nest, visit, kind, source: 'phone' });
  return {
    disk,
    store,
    clock,
    ports,
    commands,
    nest,
    visit,
    reading,
    recorder: await recorderOf({ store, ports }, reading),
  };
}

type Where = { store: Store; ports: RecorderPorts; me?: string };

/** A recorder of a reading, fresh from the disk. */
async function recorderOf({ store, ports, me = ME }: Where, reading: string): Promise<CombRecorder> {
  const loaded = await loadRecorder(store, me, reading);
  if (!loaded) throw new Error('no such reading');
  return new CombRecorder(ports, loaded);
}

/** Lets everything be saved that is on its way. */
const saved = (recorder: CombRecorder) => vi.waitFor(() => expect(recorder.view.get().pending).toBe(0));

const marksOf = (recorder: CombRecorder) => [...recorder.view.get().marks].map(([key, { state }]) => `${key} ${state}`);

describe('a press', () => {
  test('marks the current cell, steps on, counts and says what it did', async () => {
    const { recorder } = await phone();
    expect(recorder.view.get()).toMatchObject({ current: { q: 0, r: 0 }, undoWords: null, mayMark: true });
    recorder.press('egg');
    recorder.press('small');
    const view = recorder.view.get();
    expect(marksOf(recorder)).toEqual(['0,0 egg', '0,-1 small']);
    expect(view).toMatchObject({ current: { q: 1, r: -1 }, tally: { cellsTotal: 2, egg: 1, small: 1 } });
    expect(view.lastWords).toBe('Cell 1: small larva');
    expect(view.undoWords).toBe('Cell 1 was unread');
  });

  test('counts as saved only when its transaction has completed', async () => {
    const { recorder, disk } = await phone();
    recorder.press('egg');
    expect(recorder.view.get()).toMatchObject({ pending: 1, saved: 0 });
    expect(recorder.view.get().marks.get('0,0')?.saved).toBe(false);
    await saved(recorder);
    expect(recorder.view.get()).toMatchObject({ pending: 0, saved: 1 });
    expect(recorder.view.get().marks.get('0,0')?.saved).toBe(true);
    expect([...disk.ops.values()].filter(({ kind }) => kind === 'cell.mark')).toHaveLength(1);
  });

  test('carries the toggles, which then fall back', async () => {
    const { recorder } = await phone();
    recorder.toggle('nectar');
    recorder.toggle('unsure');
    recorder.toggle('unsure');
    recorder.press('empty', { note: 'dry' });
    recorder.press('egg');
    const marks = recorder.view.get().marks;
    expect(marks.get('0,0')).toMatchObject({ nectar: true, unsure: false, note: 'dry' });
    expect(marks.get('0,-1')).toMatchObject({ nectar: false });
    expect(recorder.view.get().tally.nectarCells).toBe(1);
  });

  test('does nothing when the walk is over', async () => {
    const { recorder } = await phone();
    recorder.expect(1);
    recorder.press('egg');
    expect(recorder.view.get().current).toBeNull();
    recorder.press('egg');
    expect(marksOf(recorder)).toEqual(['0,0 egg']);
  });

  test('is sent in the order of the fingers', async () => {
    const { recorder, disk } = await phone();
    for (const state of ['egg', 'small', 'medium', 'large'] as const) recorder.press(state);
    await saved(recorder);
    const rows = [...disk.ops.values()].filter(({ kind }) => kind === 'cell.mark').sort((a, b) => a.n - b.n);
    expect(rows.map(({ op }) => op.body.state)).toEqual(['egg', 'small', 'medium', 'large']);
    const hlcs = rows.map(({ op }) => op.hlc);
    expect(new Set(hlcs).size).toBe(4);
  });
});

describe('the person may also', () => {
  test('jump to a cell, change their mind there, and be led back to the walk', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.press('egg');
    recorder.jump({ q: 0, r: 0 });
    expect(recorder.view.get().current).toEqual({ q: 0, r: 0 });
    recorder.press('capped');
    expect(marksOf(recorder)).toEqual(['0,0 capped', '0,-1 egg']);
    expect(recorder.view.get()).toMatchObject({ current: { q: 1, r: -1 }, undoWords: 'Cell 0 was egg' });
  });

  test('paint cells without moving the walk', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.paint({ q: 1, r: 0 }, 'capped');
    recorder.paint({ q: 2, r: 0 }, 'capped');
    expect(recorder.view.get().current).toEqual({ q: 0, r: -1 });
    expect(marksOf(recorder)).toEqual(['0,0 egg', '1,0 capped', '2,0 capped']);
  });

  test('say that there is no cell, and take that back', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.skip();
    expect(recorder.view.get()).toMatchObject({ current: { q: 1, r: -1 }, lastWords: 'No cell at 1' });
    expect(recorder.view.get().skipped).toEqual(new Set(['0,-1']));
    expect(recorder.view.get().rim.map(cellKey)).not.toContain('0,-1');
    recorder.unskip({ q: 0, r: -1 });
    expect(recorder.view.get()).toMatchObject({ current: { q: 0, r: -1 }, skipped: new Set() });
  });

  test('say that a marked cell is not there after all', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.jump({ q: 0, r: 0 });
    recorder.press('small');
    recorder.jump({ q: 0, r: 0 });
    recorder.skip();
    expect(marksOf(recorder)).toEqual([]);
    await saved(recorder);
  });

  test('mark a cell that was found missing: then it is there', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.skip();
    recorder.paint({ q: 0, r: -1 }, 'egg');
    expect(recorder.view.get().skipped.size).toBe(0);
  });
});

describe('undo', () => {
  test('takes back press by press, back to the first, and says so', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.press('small');
    recorder.jump({ q: 0, r: 0 });
    recorder.press('capped');
    const words: (string | null)[] = [];
    while (recorder.view.get().undoWords) {
      recorder.undo();
      words.push(recorder.view.get().lastWords);
    }
    expect(words).toEqual(['Cell 0 is egg again', 'Cell 1 is unread again', 'Cell 0 is unread again']);
    expect(marksOf(recorder)).toEqual([]);
    recorder.undo();
    expect(recorder.view.get().lastWords).toBe('Cell 0 is unread again');
  });

  test('goes back to the cell, so that the right key follows', async () => {
    const { recorder } = await phone();
    recorder.press('egg');
    recorder.press('small');
    recorder.undo();
    expect(recorder.view.get().current).toEqual({ q: 0, r: -1 });
  });

  test('adds to the history and removes nothing from it', async () => {
    const { recorder, disk } = await phone();
    recorder.press('egg');
    recorder.undo();
    await saved(recorder);
    const kinds = [...disk.ops.values()].map(({ kind }) => kind);
    expect(kinds.filter((kind) => kind.startsWith('cell.'))).toEqual(['cell.mark', 'cell.retract']);
  });

  test('still works, in the same order, after the phone was killed', async () => {
    const { recorder, store, ports, reading } = await phone();
    for (const state of ['egg', 'small', 'medium'] as const) recorder.press(state);
    await saved(recorder);
    const reborn = await recorderOf({ store, ports }, reading);
    reborn.undo();
    expect(reborn.view.get().lastWords).toBe('Cell 2 is unread again');
    reborn.undo();
    expect(marksOf(reborn)).toEqual(['0,0 egg']);
  });
});

describe('after the phone was killed', () => {
  test('the reading stands at the same cell, with the same toggles and gaps', async () => {
    const { recorder, store, ports, reading } = await phone();
    recorder.expect(19);
    recorder.press('egg');
    recorder.skip();
    recorder.press('small');
    recorder.toggle('nectar');
    recorder.jump({ q: 2, r: -2 });
    await saved(recorder);
    const reborn = await recorderOf({ store, ports }, reading);
    const { current, toggles, skipped, expectedTotal, marks } = recorder.view.get();
    expect(reborn.view.get()).toMatchObject({ current, toggles, skipped, expectedTotal });
    const content = (mark: RecorderMark) => ({ ...mark, hlc: null });
    expect([...reborn.view.get().marks.values()].map(content)).toEqual([...marks.values()].map(content));
  });
});

describe('when the phone cannot save', () => {
  async function full() {
    const made = await phone();
    const { commit } = made.ports;
    const state = { full: true };
    made.ports.commit = (entry) =>
      state.full ? Promise.reject(new NotSavedError('full', entry.drafts, null)) : commit(entry);
    return { ...made, state, recorder: await recorderOf(made, made.reading) };
  }

  test('the press stays on the screen as not saved, with its words', async () => {
    const { recorder } = await full();
    recorder.press('egg');
    await saved(recorder);
    expect(recorder.view.get().unsaved).toMatchObject([{ words: 'Cell 0: egg', reason: 'full' }]);
    expect(recorder.view.get().marks.get('0,0')).toMatchObject({ state: 'egg', saved: false });
    expect(recorder.unsaved()).toHaveLength(1);
  });

  test('later presses wait behind it and reach the disk after it, in order', async () => {
    const { recorder, state, disk } = await full();
    recorder.press('egg');
    await saved(recorder);
    recorder.jump({ q: 0, r: 0 });
    recorder.press('small');
    await saved(recorder);
    expect(recorder.view.get().unsaved).toHaveLength(2);
    state.full = false;
    recorder.retryUnsaved();
    await vi.waitFor(() => expect(recorder.view.get().saved).toBe(2));
    expect(recorder.view.get().unsaved).toEqual([]);
    const [first, second] = [...disk.ops.values()].filter(({ kind }) => kind === 'cell.mark').sort((a, b) => a.n - b.n);
    expect(second?.op.body.supersedes).toBe(first?.op.opId);
  });

  test('handing in says so', async () => {
    const { recorder } = await full();
    await expect(recorder.submit()).rejects.toBeInstanceOf(NotSavedError);
  });
});

describe('a reading', () => {
  test('can be marked only by the person who opened it', async () => {
    const { store, ports, reading } = await phone();
    const theirs = await recorderOf({ store, ports, me: OTHER }, reading);
    expect(theirs.view.get().mayMark).toBe(false);
    expect(() => theirs.press('egg')).toThrow('only the person who opened');
  });

  test('is handed in once it is saved', async () => {
    const { recorder, disk } = await phone();
    await recorder.submit();
    expect(recorder.view.get().submitted).toBe(true);
    expect([...disk.ops.values()].some(({ kind }) => kind === 'reading.submit')).toBe(true);
  });

  test('that is not on this phone has no recorder', async () => {
    const { store } = await phone();
    expect(await loadRecorder(store, ME, 'elsewhere')).toBeNull();
  });

  test('begins from the map of the last visit, never from another reading of the same visit', async () => {
    const { recorder, clock, commands, nest, visit, store, ports } = await phone();
    for (const state of ['egg', 'small', 'capped'] as const) recorder.press(state);
    await saved(recorder);
    const beside = await commands.openReading({ nest, visit, kind: 'second', source: 'phone' });
    expect((await recorderOf({ store, ports }, beside)).view.get().last.size).toBe(0);
    await clock.pass(86_400_000);
    const next = await commands.openVisit({ nest, purpose: 'check' });
    const later = await commands.openReading({ nest, visit: next, kind: 'field', source: 'phone' });
    const { last, rim } = (await recorderOf({ store, ports }, later)).view.get();
    expect([...last.values()].map(({ state }) => state)).toEqual(['egg', 'small', 'capped']);
    expect(rim.length).toBeGreaterThan(4);
  });

  test('takes in what another tab has done, but not over a press on its way', async () => {
    const { recorder, store, ports, reading } = await phone();
    const other = await recorderOf({ store, ports }, reading);
    other.press('egg');
    await saved(other);
    const fresh = await loadRecorder(store, ME, reading);
    if (!fresh) throw new Error('no such reading');
    recorder.press('small');
    recorder.reload(fresh);
    expect(marksOf(recorder)).toEqual(['0,0 small']);
    await saved(recorder);
    recorder.reload((await loadRecorder(store, ME, reading)) ?? fresh);
    expect(recorder.view.get().saved).toBe(2);
  });
});

test('five hundred cells are read in the walk, and the last presses cost no more than a few milliseconds', async () => {
  const { recorder } = await phone();
  recorder.expect(500);
  let spentUs = 0;
  for (let i = 0; i < 500; i++) {
    const before = process.cpuUsage();
    recorder.press('egg');
    if (i >= 400) spentUs += process.cpuUsage(before).user;
  }
  expect(recorder.view.get().current).toBeNull();
  expect([...recorder.view.get().marks.keys()]).toEqual(spiral(500).map(cellKey));
  await saved(recorder);
  expect(spentUs / 100).toBeLessThan(12_000);
});
