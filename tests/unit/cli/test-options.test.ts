import { expect, test } from 'vitest';
import { CommandError } from '@/lib/cli/command-error';
import { TEST_PARTS, readTestOptions } from '@/lib/cli/test-options';

test('no argument means every part', () => {
  expect([...readTestOptions([])]).toEqual([...TEST_PARTS]);
});

test('--only takes the named parts', () => {
  expect([...readTestOptions(['--only=unit,e2e'])]).toEqual(['unit', 'e2e']);
});

test.each([['--only=units'], ['--only='], ['unit'], ['--watch'], ['--only=unit', 'x']])(
  '%s is refused with the usage',
  (...args) => {
    expect(() => readTestOptions(args)).toThrow(CommandError);
    expect(() => readTestOptions(args)).toThrow(/usage: npm test/);
  },
);
