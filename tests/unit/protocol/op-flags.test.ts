import { describe, expect, it } from 'vitest';
import {
  formatFlags,
  hasClockFlag,
  isDoubtfulPlace,
  opsWithMonoFlag,
  parseFlags,
  placeOf,
} from '@/lib/protocol/op-flags';

const RECEIVED = Date.parse('2026-06-16T06:00:00-04:00');
const BOOT = '5f0c3a52-8a2f-4d0c-9f0a-0a6f5a1c2b3d';

function at(wall: string, skewMs: number | null = null) {
  return { wall, mono: 1, boot: BOOT, skewMs };
}

describe('the clock flag', () => {
  it.each([
    ['two minutes and a bit ahead', at('2026-06-16T06:02:01-04:00'), true],
    ['just two minutes ahead', at('2026-06-16T06:02:00-04:00'), false],
    ['401 days back', at('2025-05-11T06:00:00-04:00'), true],
    ['399 days back', at('2025-05-13T06:00:00-04:00'), false],
    ['measured wrong', at('2026-06-16T05:41:07-04:00', -120_001), true],
    ['measured nearly right', at('2026-06-16T05:41:07-04:00', 120_000), false],
    ['without an offset', at('2026-06-16T05:41:07'), true],
    ['at 24:00', at('2026-06-15T24:00:00-04:00'), true],
  ])('%s', (_what, time, flagged) => {
    expect(hasClockFlag(time, RECEIVED)).toBe(flagged);
  });
});

describe('the place flag', () => {
  const home = { lat: 43.6, lon: -77.6 };

  it.each([
    ['null island', { lat: 0, lon: 0 }, true],
    ['near home', { lat: 43.5785, lon: -77.5985 }, false],
    ['latitude and longitude swapped', { lat: -77.6, lon: 43.6 }, true],
    ['far away, and further still when swapped', { lat: 51.5, lon: -0.1 }, false],
    ['a longitude that can be no latitude', { lat: 10, lon: 170 }, false],
  ])('%s', (_what, place, flagged) => {
    expect(isDoubtfulPlace(place, home)).toBe(flagged);
  });

  it('cannot tell swapped ones without a home', () => {
    expect(isDoubtfulPlace({ lat: -77.6, lon: 43.6 }, null)).toBe(false);
  });

  it('reads a place only from a place', () => {
    expect(placeOf({ lat: 1, lon: 2 })).toEqual({ lat: 1, lon: 2, accuracyM: null });
    for (const value of [null, undefined, 'x', 5, [1, 2], { lat: 1 }]) expect(placeOf(value)).toBeNull();
  });
});

describe('the mono flag', () => {
  it('marks negative readings and steps back within one boot', () => {
    const op = (opId: string, mono: number, boot = BOOT) => ({ opId, at: { wall: '', mono, boot, skewMs: null } });
    const other = '00000000-0000-4000-8000-000000000001';
    const ops = [op('a', 5), op('b', 3), op('c', 4), op('d', 1, other), op('e', -1, other), op('f', 4)];
    expect([...opsWithMonoFlag(ops)]).toEqual(['b', 'e']);
  });
});

describe('stored flags', () => {
  it('read back', () => {
    expect(parseFlags(formatFlags(['clock', 'late']))).toEqual(['clock', 'late']);
    expect(parseFlags(formatFlags([]))).toEqual([]);
  });
});
