import { describe, expect, test } from 'vitest';
import { createProgress, seconds } from '@/lib/cli/progress';

/** A terminal and a clock that the test moves by hand. */
function stage() {
  const lines: string[] = [];
  const ticks = new Set<() => void>();
  const edges = {
    time: 0,
    now: () => edges.time,
    write: (line: string) => void lines.push(line),
    every: (_ms: number, tick: () => void) => {
      ticks.add(tick);
      return () => void ticks.delete(tick);
    },
  };
  return { edges, lines, ticks, progress: createProgress(edges) };
}

describe('progress', () => {
  test('announces a step, says when it takes long, and says how long it took', async () => {
    const { edges, lines, ticks, progress } = stage();
    edges.time = 1_000;
    const value = await progress.step('building', async () => {
      edges.time = 16_000;
      for (const tick of ticks) tick();
      edges.time = 21_500;
      return 'built';
    });
    expect(value).toBe('built');
    expect(lines).toEqual([
      '[      1.0 s] building ...',
      '[     16.0 s] building: still at it after 15.0 s',
      '[     21.5 s] building: done in 20.5 s',
    ]);
    expect(ticks.size).toBe(0);
  });

  test('says that a step failed, passes the error on and stops its heartbeat', async () => {
    const { lines, ticks, progress } = stage();
    await expect(progress.step('building', () => Promise.reject(new Error('no')))).rejects.toThrow('no');
    expect(lines.at(-1)).toMatch(/building: failed after 0\.0 s/);
    expect(ticks.size).toBe(0);
  });
});

test.each([
  [7_430, '7.4 s'],
  [59_900, '59.9 s'],
  [60_000, '1 min 00 s'],
  [185_400, '3 min 05 s'],
])('%i ms reads %s', (ms, words) => {
  expect(seconds(ms)).toBe(words);
});
