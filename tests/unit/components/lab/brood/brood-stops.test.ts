import { describe, expect, it } from 'vitest';
import { broodStops, stopHref } from '@/components/lab/brood/brood-stops';
import type { NestView } from '@/components/lab/lab-shapes';
import { emptyTally } from '@/lib/comb/tally';

const ZONE = 'America/New_York';
const at = (text: string) => Date.parse(text);

const visit = (id: string, startedAt: string, readings: readonly string[]) => ({
  id,
  purpose: 'check',
  startedAt,
  readings: readings.map((reading) => ({
    id: reading,
    kind: 'field',
    observer: 'Tobiah Marsh',
    openedAt: startedAt,
    submittedAt: startedAt,
    lockedVersion: null,
    tally: emptyTally(),
  })),
});

const NEST: NestView = {
  id: 'nest',
  code: 'N12',
  name: null,
  taxon: null,
  place: null,
  visits: [
    visit('v1', '2026-06-10T12:00:00Z', ['r1']),
    visit('v2', '2026-06-16T12:00:00Z', ['r2', 'r2b']),
    visit('v3', '2026-06-18T12:00:00Z', []),
  ],
};
const READINGS = [
  { id: 'r2', at: at('2026-06-16T12:00:00Z') },
  { id: 'r1', at: at('2026-06-10T12:00:00Z') },
];
const keys = (nowMs: number) => broodStops({ nest: NEST, readings: READINGS, nowMs, zone: ZONE }).map(({ key }) => key);

describe('the stops one can look back to', () => {
  it('are the visits with a reading, oldest first, and today while the last reading is fresh', () => {
    expect(keys(at('2026-06-20T12:00:00Z'))).toEqual(['v1', 'v2', 'now']);
  });

  it('end with the last reading when that is long ago, of today, or dated ahead of today', () => {
    expect(keys(at('2026-12-01T12:00:00Z'))).toEqual(['v1', 'v2']);
    expect(keys(at('2026-06-16T18:00:00Z'))).toEqual(['v1', 'v2']);
    expect(keys(at('2026-06-12T18:00:00Z'))).toEqual(['v1', 'v2']);
  });

  it('are none before the first reading', () => {
    expect(broodStops({ nest: NEST, readings: [], nowMs: at('2026-06-20T12:00:00Z'), zone: ZONE })).toEqual([]);
  });

  it('say the purpose and the local time of the visit', () => {
    const [first] = broodStops({ nest: NEST, readings: READINGS, nowMs: at('2026-06-20T12:00:00Z'), zone: ZONE });
    expect(first).toMatchObject({ label: 'Check, 10 June, 08:00', day: '2026-06-10' });
    expect(stopHref('nest', 'v1')).toBe('/nests/nest/brood?visit=v1');
  });
});
