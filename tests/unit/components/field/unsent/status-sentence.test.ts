import { expect, test } from 'vitest';
import { statusSentence } from '@/components/field/unsent/status-sentence';

test('unsent work is never said to be lost, whatever hinders it', () => {
  expect(statusSentence({ kind: 'waiting', waiting: 7, trouble: null })).toMatch(/Nothing is lost/);
  expect(statusSentence({ kind: 'waiting', waiting: 7, trouble: 'office-busy' })).toMatch(/Nothing is lost.*busy/);
  expect(statusSentence({ kind: 'needs-you', needs: [{ what: 'sign-in' }], waiting: 1 })).toBe(
    'Nothing is lost. 1 item waiting.',
  );
});

test('everything is at the office only when nothing waits', () => {
  expect(statusSentence({ kind: 'at-office', at: 0, trouble: null })).toBe('Everything is at the office.');
  expect(statusSentence({ kind: 'saved-here' })).not.toMatch(/at the office\./);
  expect(statusSentence({ kind: 'sending', k: 3, n: 7 })).toBe('Sending 3 of 7.');
});
