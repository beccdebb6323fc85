import { describe, expect, it } from 'vitest';
import { opsInCycles } from '@/lib/protocol/check-deps';

describe('operations that wait for themselves', () => {
  it('are found in a ring of any length, and those that merely wait for the ring are not', () => {
    const waits = new Map([
      ['a', ['b']],
      ['b', ['c']],
      ['c', ['a', 'x']],
      ['d', ['a']],
      ['e', []],
    ]);
    expect([...opsInCycles(['a', 'b', 'c', 'd', 'e'], waits)]).toEqual(['a', 'b', 'c']);
  });

  it('are looked for among the given ones only', () => {
    const waits = new Map([
      ['new', ['parked']],
      ['parked', ['new']],
    ]);
    expect([...opsInCycles(['new'], waits)]).toEqual(['new']);
  });
});
