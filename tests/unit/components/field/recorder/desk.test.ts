import { describe, expect, test } from 'vitest';
import { besideInWalk, chooseState, pressPlace, runCommand, stepTo, stopsOf } from '@/components/field/recorder/desk';
import { cellKey } from '@/lib/comb/axial';
import { cellNumber, spiral } from '@/lib/comb/walk';
import { earlierMark, openDesk } from './open-recorder';

const state = (desk: ReturnType<typeof openDesk>, key: string) => desk.now().view.marks.get(key)?.state;

/** A desk with the first cells of the spiral marked as eggs. */
function readTo(count: number) {
  const opened = openDesk();
  for (let cell = 0; cell < count; cell++) chooseState(opened.desk(), 'egg');
  return opened;
}

describe('walking', () => {
  test('goes one cell back and forward in walk order, over marked cells and open places alike', () => {
    const { now } = readTo(5);
    expect(now().view.current).toEqual(spiral(6)[5]);
    const back = besideInWalk(now().view, -1);
    expect(back && cellNumber(back)).toBe(4);
    const forward = besideInWalk(now().view, 1);
    expect(forward && cellNumber(forward)).toBe(6);
  });

  test('ends at the pedicel cell on the way back and at the last open place on the way forward', () => {
    const { now } = readTo(1);
    now().jump({ q: 0, r: 0 });
    expect(besideInWalk(now().view, -1)).toBeNull();
    now().jump({ q: -1, r: 0 });
    expect(besideInWalk(now().view, 1)).toBeNull();
  });

  test('goes back to the last stop when the walk is over, and never forward', () => {
    const { now } = readTo(7);
    now().expect(7);
    expect(now().view.current).toBeNull();
    expect(besideInWalk(now().view, 1)).toBeNull();
    const numbers = stopsOf(now().view).map(cellNumber);
    const back = besideInWalk(now().view, -1);
    expect(back && cellNumber(back)).toBe(Math.max(...numbers));
  });

  test('passes by places that were said to hold no cell', () => {
    const { now, desk } = readTo(1);
    runCommand(desk(), { do: 'no-cell' });
    expect(stopsOf(now().view).map(cellKey)).not.toContain('0,-1');
  });

  test('stops at cells known from the last visit', () => {
    const { now } = openDesk([earlierMark({ q: 3, r: 0 }, 'egg', 1)]);
    expect(stopsOf(now().view).map(cellKey)).toContain('3,0');
  });

  test('leads by the arrows to neighbours, and nowhere when there is none', () => {
    const { now } = readTo(7);
    now().jump({ q: 0, r: 0 });
    expect(stepTo(now().view, { key: 'ArrowRight', shift: false })).toEqual({ q: 1, r: 0 });
    expect(stepTo(now().view, { key: 'ArrowUp', shift: false })).toEqual({ q: 1, r: -1 });
    expect(stepTo(now().view, { key: 'ArrowUp', shift: true })).toEqual({ q: 0, r: -1 });
    now().jump({ q: 2, r: 0 });
    expect(stepTo(now().view, { key: 'ArrowRight', shift: false })).toBeNull();
  });
});

describe('a pressed place', () => {
  test('becomes the current cell in the walk', () => {
    const { now, desk } = readTo(2);
    pressPlace(desk(), { q: -1, r: 0 });
    expect(now().view.current).toEqual({ q: -1, r: 0 });
    expect(now().view.tally.cellsTotal).toBe(2);
  });

  test('is opened again after "no cell here"', () => {
    const { now, desk } = readTo(1);
    runCommand(desk(), { do: 'no-cell' });
    expect(now().view.skipped.has('0,-1')).toBe(true);
    pressPlace(desk(), { q: 0, r: -1 });
    expect(now().view.skipped.has('0,-1')).toBe(false);
    expect(now().view.current).toEqual({ q: 0, r: -1 });
  });

  test('is painted while painting, with the state the keys chose', () => {
    const opened = readTo(1);
    opened.box.mode = { kind: 'paint', state: 'egg' };
    runCommand(opened.desk(), { do: 'mark', state: 'large' });
    expect(opened.box.mode).toEqual({ kind: 'paint', state: 'large' });
    expect(opened.now().view.tally.cellsTotal).toBe(1);
    pressPlace(opened.desk(), { q: 0, r: -1 });
    expect(state(opened, '0,-1')).toBe('large');
  });
});

describe('no cell here', () => {
  test('passes an unmarked place at once', () => {
    const { now, desk, box } = readTo(1);
    runCommand(desk(), { do: 'no-cell' });
    expect(box.asked).toBe(0);
    expect(now().view.current).toEqual({ q: 1, r: -1 });
  });

  test('asks first on a marked cell, because undo cannot bring its marks back', () => {
    const opened = readTo(2);
    opened.now().jump({ q: 0, r: -1 });
    runCommand(opened.desk(), { do: 'no-cell' });
    expect(opened.box.asked).toBe(1);
    expect(state(opened, '0,-1')).toBe('egg');
  });

  test('says nothing while painting', () => {
    const opened = readTo(1);
    opened.box.mode = { kind: 'paint', state: 'egg' };
    runCommand(opened.desk(), { do: 'no-cell' });
    expect(opened.now().view.skipped.size).toBe(0);
  });
});

describe('the keyboard', () => {
  test('marks, toggles, undoes and steps', () => {
    const opened = openDesk();
    runCommand(opened.desk(), { do: 'toggle', mark: 'nectar' });
    runCommand(opened.desk(), { do: 'mark', state: 'small' });
    expect(opened.now().view.marks.get('0,0')).toMatchObject({ state: 'small', nectar: true });
    runCommand(opened.desk(), { do: 'step', step: { key: 'PageUp', shift: false } });
    expect(opened.now().view.current).toEqual({ q: 0, r: 0 });
    runCommand(opened.desk(), { do: 'undo' });
    expect(opened.now().view.marks.size).toBe(0);
  });

  test('does not toggle the current cell while painting', () => {
    const opened = readTo(1);
    opened.box.mode = { kind: 'paint', state: 'egg' };
    runCommand(opened.desk(), { do: 'toggle', mark: 'unsure' });
    expect(opened.now().view.toggles.unsure).toBe(false);
  });
});
