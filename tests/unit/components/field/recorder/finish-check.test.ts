import { describe, expect, test } from 'vitest';
import { finishCheck } from '@/components/field/recorder/finish-check';
import { cellNumber } from '@/lib/comb/walk';
import { earlierMark, openRecorder } from './open-recorder';

describe('before a reading is handed in', () => {
  test('nothing is open when every cell bears a mark up to the counted number', () => {
    const { now } = openRecorder();
    now().expect(7);
    for (let cell = 0; cell < 7; cell++) now().press('egg');
    expect(finishCheck(now().view)).toEqual({ unread: [], passed: [], missing: 0 });
  });

  test('cells marked unread are listed in walk order', () => {
    const { now } = openRecorder();
    for (const state of ['egg', 'unread', 'egg', 'unread'] as const) now().press(state);
    expect(finishCheck(now().view).unread.map(cellNumber)).toEqual([1, 3]);
  });

  test('a place that was walked past without a word is named; one said to hold no cell is not', () => {
    const { now } = openRecorder();
    now().press('egg');
    now().skip();
    now().jump({ q: 1, r: 0 });
    now().press('egg');
    expect(finishCheck(now().view).passed.map(cellNumber)).toEqual([2]);
  });

  test('a cell of the last visit without a mark is named wherever it lies', () => {
    const { now } = openRecorder([earlierMark({ q: 0, r: 0 }, 'egg', 1), earlierMark({ q: 3, r: 0 }, 'egg', 2)]);
    now().press('egg');
    expect(finishCheck(now().view).passed).toContainEqual({ q: 3, r: 0 });
  });

  test('the count is compared both ways', () => {
    const { now } = openRecorder();
    for (let cell = 0; cell < 3; cell++) now().press('egg');
    now().expect(5);
    expect(finishCheck(now().view).missing).toBe(2);
    now().expect(1);
    expect(finishCheck(now().view).missing).toBe(-2);
  });

  test('an empty reading has nothing to check', () => {
    expect(finishCheck(openRecorder().now().view)).toEqual({ unread: [], passed: [], missing: 0 });
  });
});
