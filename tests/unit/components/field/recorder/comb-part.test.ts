import { describe, expect, test } from 'vitest';
import { combPart } from '@/components/field/recorder/comb-part';
import { cellKey } from '@/lib/comb/axial';
import { spiral } from '@/lib/comb/walk';
import { earlierMark, openRecorder } from './open-recorder';

const WINDOW = { centre: { q: 0, r: 0 }, across: 7, down: 5 };

describe('the part of a comb that is drawn', () => {
  test('is everything without a window: each cell once, and the free places around', () => {
    const { now } = openRecorder();
    for (const _ of spiral(7)) now().press('egg');
    const { cells, ghosts } = combPart(now().view, null);
    expect(cells).toHaveLength(7);
    expect(ghosts).toHaveLength(12);
  });

  test('does not grow with the comb behind a window', () => {
    const { now } = openRecorder();
    for (const cell of spiral(500)) now().paint(cell, 'egg');
    const { cells } = combPart(now().view, WINDOW);
    expect(cells.length).toBeLessThan(80);
    expect(cells.map(cellKey)).toContain('3,0');
    expect(cells.map(cellKey)).not.toContain('8,0');
  });

  test('draws cells of the last visit as unread until they are marked or said to be gone', () => {
    const { now } = openRecorder([earlierMark({ q: 0, r: 0 }, 'egg', 1), earlierMark({ q: 1, r: 0 }, 'egg', 2)]);
    const stateOf = (key: string) => combPart(now().view, null).cells.find((cell) => cellKey(cell) === key)?.state;
    expect(stateOf('1,0')).toBe('unread');
    now().press('small');
    expect(stateOf('0,0')).toBe('small');
    now().jump({ q: 1, r: 0 });
    now().skip();
    expect(stateOf('1,0')).toBeUndefined();
  });

  test('keeps places said to hold no cell among the free ones', () => {
    const { now } = openRecorder();
    now().press('egg');
    now().skip();
    expect(combPart(now().view, null).ghosts.map(cellKey)).toContain('0,-1');
  });

  test('shows a press that is not kept yet as pending', () => {
    const { now } = openRecorder();
    now().press('egg');
    expect(combPart(now().view, null).cells[0]?.pending).toBe(true);
  });
});
