import { describe, expect, test } from 'vitest';
import { troubleWords } from '@/components/field/words/trouble-words';
import { OP_CODES } from '@/lib/protocol/op-codes';

describe('an item that is held up', () => {
  test('says what to do when only the reader may mark', () => {
    expect(troubleWords('refused', 'right').todo).toMatch(/a reading of your own/);
  });

  test('has words for every code of the office and for codes of later versions', () => {
    for (const code of [...OP_CODES, 'of-a-later-version', null]) {
      for (const why of ['refused', 'suspect', 'set-aside'] as const) {
        const { what, todo } = troubleWords(why, code);
        expect(`${what} ${todo}`).toMatch(/\w.*\./);
      }
    }
  });

  test('is not misled by names that every object has', () => {
    expect(troubleWords('refused', 'constructor')).toEqual(troubleWords('refused', null));
  });
});
