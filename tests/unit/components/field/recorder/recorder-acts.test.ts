import { describe, expect, test } from 'vitest';
import { flipToggle, paintCell, pressState, putDetail, shownToggles } from '@/components/field/recorder/recorder-acts';
import { openRecorder } from './open-recorder';

const PEDICEL = { q: 0, r: 0 };

describe('a toggle', () => {
  test('waits for the next press on a cell that bears no mark', () => {
    const { now } = openRecorder();
    flipToggle(now(), 'nectar');
    expect(now().view.tally.cellsTotal).toBe(0);
    expect(shownToggles(now().view).nectar).toBe(true);
    pressState(now(), 'egg');
    expect(now().view.marks.get('0,0')).toMatchObject({ state: 'egg', nectar: true });
    expect(shownToggles(now().view).nectar).toBe(false);
  });

  test('acts at once on a marked cell, which keeps its state, its note and the place', () => {
    const { now } = openRecorder();
    pressState(now(), 'egg', { note: 'low on the wall' });
    now().jump(PEDICEL);
    flipToggle(now(), 'unsure');
    expect(now().view.marks.get('0,0')).toMatchObject({ state: 'egg', unsure: true, note: 'low on the wall' });
    expect(now().view.current).toEqual(PEDICEL);
    flipToggle(now(), 'unsure');
    expect(now().view.marks.get('0,0')).toMatchObject({ unsure: false });
  });

  test('shows what the marked cell bears, not what waits for another', () => {
    const { now } = openRecorder();
    flipToggle(now(), 'nectar');
    pressState(now(), 'egg');
    flipToggle(now(), 'scrap');
    now().jump(PEDICEL);
    expect(shownToggles(now().view)).toEqual({ nectar: true, unsure: false, reused: false, scrap: false });
  });
});

describe('a corrected state', () => {
  test('keeps nectar and note, and lets go of the instar of the old state', () => {
    const { now } = openRecorder();
    flipToggle(now(), 'nectar');
    pressState(now(), 'small', { note: 'curled', instar: 2 });
    now().jump(PEDICEL);
    pressState(now(), 'medium');
    expect(now().view.marks.get('0,0')).toMatchObject({ state: 'medium', nectar: true, note: 'curled', instar: null });
  });

  test('does not take over toggles that were waiting for another cell', () => {
    const { now } = openRecorder();
    pressState(now(), 'egg');
    flipToggle(now(), 'scrap');
    now().jump(PEDICEL);
    pressState(now(), 'empty');
    expect(now().view.marks.get('0,0')).toMatchObject({ state: 'empty', scrap: false });
  });
});

test('an instar put on a marked cell leaves all else as it was', () => {
  const { now } = openRecorder();
  flipToggle(now(), 'unsure');
  pressState(now(), 'small', { note: 'pale' });
  now().jump(PEDICEL);
  putDetail(now(), { instar: 3 });
  expect(now().view.marks.get('0,0')).toMatchObject({ state: 'small', unsure: true, note: 'pale', instar: 3 });
});

describe('painting', () => {
  test('marks a free cell and leaves the walk where it is', () => {
    const { now } = openRecorder();
    pressState(now(), 'egg');
    paintCell(now(), { q: -1, r: 0 }, 'capped');
    expect(now().view.marks.get('-1,0')?.state).toBe('capped');
    expect(now().view.current).toEqual({ q: 0, r: -1 });
  });

  test('keeps nectar and note of a marked cell, and writes nothing when the state is the same', () => {
    const { now } = openRecorder();
    flipToggle(now(), 'nectar');
    pressState(now(), 'egg', { note: 'torn wall' });
    const before = now().view;
    paintCell(now(), PEDICEL, 'egg');
    expect(now().view).toBe(before);
    paintCell(now(), PEDICEL, 'empty');
    expect(now().view.marks.get('0,0')).toMatchObject({ state: 'empty', nectar: true, note: 'torn wall' });
  });
});
