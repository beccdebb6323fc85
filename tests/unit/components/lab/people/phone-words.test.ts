import { expect, it } from 'vitest';
import { letterWords } from '@/components/lab/people/letter-words';
import { unsentWarning, unsentWords } from '@/components/lab/people/phone-words';

it('says what goes with a lost phone only as far as the office knows', () => {
  expect(unsentWarning(null)).toContain('never said');
  expect(unsentWarning(0)).toContain('since is not here');
  expect(unsentWarning(7)).toContain('7 items that are not at the office');
  expect([unsentWords(null), unsentWords(0), unsentWords(1)]).toEqual(['not said', 'nothing', '1 item']);
});

it('does not say that a letter went out when it did not', () => {
  expect(letterWords('sent', 'a@b.example')).toContain('on its way');
  expect(letterWords('kept', 'a@b.example')).toContain('among the letters of this demo');
  for (const other of ['failed', null, 'x']) expect(letterWords(other, 'a@b.example')).toContain('did not go out');
});
