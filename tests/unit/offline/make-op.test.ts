import { describe, expect, test } from 'vitest';
import { beginOp, makeOp } from '@/lib/offline/make-op';
import { measureSkew } from '@/lib/offline/measure-skew';
import { wallText } from '@/lib/offline/phone-clock';
import { hashedText } from '@/lib/protocol/op-hash';
import { NEST, READING, VISIT, countingMaker, id, sha256 } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';

const clock = new ManualTimers(Date.UTC(2026, 5, 16, 9, 41, 7, 120));

const place = { nest: NEST, visit: VISIT, reading: READING };

describe('an operation', () => {
  test('carries every clock of the phone and the hash of its body', async () => {
    const body = { q: 0, r: 0, state: 'egg' as const, nectar: false, unsure: true };
    const draft = await makeOp({ ...countingMaker(clock), skewMs: () => -840 }, { kind: 'cell.mark', ...place, body });
    expect(draft).toEqual({
      v: 1,
      opId: id(1),
      kind: 'cell.mark',
      kindV: 1,
      ...place,
      at: { wall: '2026-06-16T05:41:07.120-04:00', mono: clock.mono(), boot: clock.boot(), skewMs: -840 },
      deps: [],
      body,
      bodyHash: await sha256(hashedText(draft)),
    });
  });

  test('leaves out what was not said', () => {
    const body = { q: 0, r: 0, state: 'egg' as const, nectar: false, unsure: false, note: undefined };
    expect(Object.keys(beginOp(countingMaker(clock), { kind: 'cell.mark', ...place, body }).body)).not.toContain(
      'note',
    );
  });

  test('is not made from a body that its kind does not allow', () => {
    const wrong = { purpose: 'check' as const, startedAt: 'now', mood: 'calm' };
    expect(() => beginOp(countingMaker(clock), { kind: 'visit.open', ...place, body: wrong })).toThrow('mood');
  });
});

describe('wall time', () => {
  const at = (offsetMinutes: number) =>
    wallText(
      { now: () => 0, mono: () => 0, boot: () => '', offsetMinutes: () => offsetMinutes },
      Date.UTC(2026, 0, 1, 0, 30),
    );

  test('is local and says how far it is from UTC', () => {
    expect(at(0)).toBe('2026-01-01T00:30:00.000+00:00');
    expect(at(-300)).toBe('2025-12-31T19:30:00.000-05:00');
    expect(at(345)).toBe('2026-01-01T06:15:00.000+05:45');
    expect(at(-30)).toBe('2026-01-01T00:00:00.000-00:30');
  });

  test('names the same instant wherever the phone is', () => {
    for (const offset of [-720, -210, 0, 330, 840]) expect(Date.parse(at(offset))).toBe(Date.UTC(2026, 0, 1, 0, 30));
  });
});

describe('the difference to the office clock', () => {
  test('counts half the round trip', () => {
    expect(measureSkew('2026-06-16T09:41:07.000Z', 400, Date.UTC(2026, 5, 16, 9, 41, 8))).toBe(-800);
  });

  test('is unknown when the office gives no time', () => {
    expect(measureSkew('soon', 400, 0)).toBeNull();
  });
});
