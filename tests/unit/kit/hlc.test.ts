import { describe, expect, it } from 'vitest';
import { HLC_MAX_AHEAD_MS, type Hlc, compareHlc, formatHlc, parseHlc, receiveHlc, tickHlc } from '@/lib/kit/hlc';
import vectors from '@/tests/fixtures/kit/ids-clocks.json';

function reading([ms = 0, counter = 0]: readonly number[]): Hlc {
  return { ms, counter };
}

describe('the hybrid logical clock', () => {
  it('follows the published rules through a whole trace (Kulkarni et al. 2014)', () => {
    const clocks = new Map<string, Hlc>();
    for (const { node, event, physical, message, result } of vectors.hlc_trace) {
      const last = clocks.get(node) ?? { ms: 0, counter: 0 };
      const next = event === 'recv' && message ? receiveHlc(last, reading(message), physical) : tickHlc(last, physical);
      expect([next.ms, next.counter]).toEqual(result);
      clocks.set(node, next);
    }
  });

  it('does not follow a phone that is more than five minutes ahead', () => {
    const last = { ms: 1_000, counter: 0 };
    const wild = { ms: 2_000 + HLC_MAX_AHEAD_MS + 1, counter: 7 };
    expect(receiveHlc(last, wild, 2_000)).toEqual({ ms: 2_000, counter: 0 });
    expect(receiveHlc(last, { ...wild, ms: wild.ms - 1 }, 2_000).ms).toBe(2_000 + HLC_MAX_AHEAD_MS);
  });

  it('reads back what it writes and nothing else', () => {
    expect(parseHlc(formatHlc({ ms: 1781602867120, counter: 12 }))).toEqual({ ms: 1781602867120, counter: 12 });
    for (const text of ['', '1', '1.', '.1', '1.2.3', '-1.0', '1.0x', ' 1.0', '1e3.0'])
      expect(parseHlc(text)).toBeNull();
  });

  it('compares as integers, not as text', () => {
    expect(compareHlc('9.0', '10.0')).toBeLessThan(0);
    expect(compareHlc('10.9', '10.10')).toBeLessThan(0);
    expect(compareHlc('10.10', '10.10')).toBe(0);
  });
});
