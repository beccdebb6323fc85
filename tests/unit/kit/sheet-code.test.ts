import { describe, expect, test } from 'vitest';
import { plainCode, sheetCode } from '@/lib/kit/sheet-code';

describe('the code of a paper sheet', () => {
  // By hand: the last 60 bits of the id are fifteen hexadecimal digits; five bits are one sign, 0 is "2" and 31 is "Z".
  test.each([
    ['01890000-0000-7000-8000-000000000000', '2222-2222-2222'],
    ['01890000-0000-7000-8000-00000000001f', '2222-2222-222Z'],
    ['01890000-0000-7000-8fff-ffffffffffff', 'ZZZZ-ZZZZ-ZZZZ'],
    ['01890000-0000-7000-8000-000000000020', '2222-2222-2232'],
  ])('of %s is %s', (id, code) => {
    expect(sheetCode(id)).toBe(code);
  });

  test('holds no sign that a hand mixes up', () => {
    for (let n = 0; n < 64; n++) {
      expect(sheetCode(`01890000-0000-7000-8000-0000000000${n.toString(16).padStart(2, '0')}`)).not.toMatch(/[01IO]/);
    }
  });

  test('does not tell when the nest was opened: the time in the id is not in it', () => {
    expect(sheetCode('01890000-0000-7000-8abc-123456789abc')).toBe(sheetCode('0199ffff-ffff-7fff-8abc-123456789abc'));
  });

  test('is found however it is typed', () => {
    expect(plainCode(' k7qf 2m9x-rtwb ')).toBe('K7QF2M9XRTWB');
  });
});
