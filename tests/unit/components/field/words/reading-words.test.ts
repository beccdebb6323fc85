import { describe, expect, test } from 'vitest';
import { progressWords, purposeWord, readingState, readingTitle } from '@/components/field/words/reading-words';
import { spokenWords } from '@/components/field/words/spoken-words';

describe('how far a reading has come', () => {
  const at = '2026-06-16T05:52:00.000-04:00';
  test.each([
    [{ submittedAt: null, standing: 'waiting', mine: true }, 'not handed in yet'],
    [{ submittedAt: null, standing: 'at-office', mine: false }, 'still being read'],
    [{ submittedAt: at, standing: 'waiting', mine: true }, 'handed in, waiting to send'],
    [{ submittedAt: at, standing: 'at-office', mine: true }, 'handed in, at the office'],
    [{ submittedAt: at, standing: 'not-accepted', mine: true }, 'not accepted by the office'],
  ] as const)('%o', (reading, words) => {
    expect(readingState(reading)).toBe(words);
  });
});

test('a reading is called by its reader and its source', () => {
  expect(readingTitle({ mine: true, kind: 'field', source: 'phone' }, '')).toBe('Your reading, at the comb');
  expect(readingTitle({ mine: false, kind: 'second', source: 'photo' }, 'Halloran Pike')).toBe(
    'Halloran Pike’s second reading, from a photo',
  );
});

test('a visit is called by its purpose', () => {
  expect(purposeWord('take-down')).toBe('Take-down');
});

test('progress is said with the count when there is one', () => {
  expect(progressWords(12, 33)).toBe('12 of 33');
  expect(progressWords(12, null)).toBe('12 read');
});

test('a press is read out with its cell, its state and the progress', () => {
  expect(spokenWords('Cell 13: medium larva', 12, 33)).toBe('cell 13 medium larva, 12 of 33');
  expect(spokenWords('Cell 13 is unread again', 12, null)).toBe('cell 13 is unread again, 12 read');
  expect(spokenWords(null, 0, null)).toBe('');
});
