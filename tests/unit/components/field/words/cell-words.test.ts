import { describe, expect, test } from 'vitest';
import { cellLine, cellTitle, earlierLine, unsavedReason, unsavedWords } from '@/components/field/words/cell-words';
import { earlierMark, openRecorder } from '../recorder/open-recorder';

describe('the line under the current cell', () => {
  test('says its ring and how far the walk is', () => {
    const { now } = openRecorder();
    expect(cellTitle(now().view.current)).toBe('Cell 0');
    expect(cellLine(now().view)).toBe('pedicel cell · 0 read');
    now().expect(33);
    now().press('egg');
    expect(cellTitle(now().view.current)).toBe('Cell 1');
    expect(cellLine(now().view)).toBe('ring 1 · 1 of 33');
  });

  test('says what the cell holds once it bears a mark', () => {
    const { now } = openRecorder();
    now().toggle('nectar');
    now().press('small', { instar: 2, note: 'pale' });
    now().jump({ q: 0, r: 0 });
    expect(cellLine(now().view)).toBe('pedicel cell · small larva, instar 2, nectar, note');
  });

  test('says that nothing is left', () => {
    const { now } = openRecorder();
    now().expect(1);
    now().press('egg');
    expect(cellTitle(now().view.current)).toBe('All read');
    expect(cellLine(now().view)).toBe('1 of 1');
  });
});

describe('the line about the last visit', () => {
  test('is left out at a first reading', () => {
    expect(earlierLine(openRecorder().now().view)).toBeNull();
  });

  test('says what the cell held, and stays blank for a new cell so that nothing moves', () => {
    const { now } = openRecorder([earlierMark({ q: 0, r: 0 }, 'large', 1)]);
    expect(earlierLine(now().view)).toBe('last time large larva');
    now().press('capped');
    expect(earlierLine(now().view)).toBe('\u00a0');
  });
});

test('a press that was not kept is called out with its cell and its reason', () => {
  expect(unsavedWords({ words: 'Cell 13: egg' })).toBe('cell 13, egg');
  expect(unsavedReason({ reason: 'full' })).toMatch(/storage is full/);
});
