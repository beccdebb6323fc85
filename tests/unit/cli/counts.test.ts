import { describe, expect, test } from 'vitest';
import { addCounts, countPlaywright, countVitest, formatCounts, withExitCode } from '@/lib/cli/counts';

describe('countVitest', () => {
  test('takes the numbers of the report', () => {
    expect(countVitest({ numPassedTests: 12, numFailedTests: 2, testResults: [] })).toEqual({ passed: 12, failed: 2 });
  });

  test('counts a file that could not be loaded as one failure', () => {
    const testResults = [
      { status: 'failed', assertionResults: [] },
      { status: 'failed', assertionResults: [{}] },
      { status: 'passed', assertionResults: [{}] },
    ];
    expect(countVitest({ numPassedTests: 1, numFailedTests: 1, testResults })).toEqual({ passed: 1, failed: 2 });
  });
});

describe('countPlaywright', () => {
  test('takes expected as passed, and unexpected, flaky and outside errors as failed', () => {
    const report = { stats: { expected: 5, unexpected: 2, flaky: 1 }, errors: [{ message: 'set-up failed' }] };
    expect(countPlaywright(report)).toEqual({ passed: 5, failed: 4 });
  });
});

describe('withExitCode', () => {
  test('leaves a clean run and a run with named failures as they are', () => {
    expect(withExitCode({ passed: 3, failed: 0 }, 0)).toEqual({ passed: 3, failed: 0 });
    expect(withExitCode({ passed: 3, failed: 2 }, 1)).toEqual({ passed: 3, failed: 2 });
  });

  test('makes one failure of a part that ended badly without naming a test', () => {
    expect(withExitCode({ passed: 3, failed: 0 }, 1)).toEqual({ passed: 3, failed: 1 });
  });

  test('makes one failure of a part in which nothing ran', () => {
    expect(withExitCode({ passed: 0, failed: 0 }, 0)).toEqual({ passed: 0, failed: 1 });
  });
});

test('counts add up and are written as the last line of a run', () => {
  expect(formatCounts(addCounts({ passed: 3, failed: 0 }, { passed: 4, failed: 1 }))).toBe('7 passed, 1 failed');
});
