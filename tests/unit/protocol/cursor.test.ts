import { describe, expect, it } from 'vitest';
import { formatCursor, parseCursor } from '@/lib/protocol/pull';

describe('a pull cursor', () => {
  it('reads back', () => {
    expect(parseCursor(formatCursor(3, 12_345))).toEqual({ epoch: 3, seq: 12_345 });
  });

  it.each(['abc', '1:-5', '1', ':1', '1:', '1:2:3', '1:1e3', ' 1:2', '1:2 ', `1:${'9'.repeat(1_000_000)}`])(
    'is nothing else',
    (text) => {
      expect(parseCursor(text)).toBeNull();
    },
  );
});
