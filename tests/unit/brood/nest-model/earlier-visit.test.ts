import { describe, expect, it } from 'vitest';
import type { DateRange } from '@/lib/brood/answer';
import type { BroodMark, BroodReading } from '@/lib/brood/input';
import { COARSE, estimate, reading } from '@/tests/unit/brood/support';

const cell = (q: number, state: BroodMark['state']): BroodMark => ({ q, r: 0, state });
const KNOWN = [
  reading('2026-06-01T12:00:00Z', [cell(0, 'large'), cell(1, 'egg')]),
  reading('2026-06-12T12:00:00Z', [cell(0, 'capped'), cell(1, 'small')]),
];
/** Reaches the office after the others, though it was made before them. */
const EARLIER = reading('2026-05-20T12:00:00Z', [cell(0, 'small')]);

const dated = (readings: readonly BroodReading[]) =>
  estimate(readings, { settings: COARSE, zone: 'UTC', asOf: Date.parse('2026-06-12T12:00:00Z') });
const width = (range: DateRange | null | undefined) =>
  Date.parse(range?.utc.p95[1] ?? '') - Date.parse(range?.utc.p95[0] ?? '');

describe('a visit dated before the first', () => {
  const [without, together] = [dated(KNOWN), dated([...KNOWN, EARLIER])];

  it('is taken at its own place in time, in whatever order it comes', () => {
    expect(dated([EARLIER, ...KNOWN])).toEqual(together);
  });

  it('bounds laying: the larva it saw was laid before it, and its range narrows', () => {
    const [before, after] = [without, together].map(({ cells }) => cells[0]?.laid);
    expect(after && after.utc.p95[1] < '2026-05-20').toBe(true);
    expect(width(after)).toBeLessThan(width(before));
  });

  it('shows a cell that it does not hold as not built yet: her egg there came after it', () => {
    expect((together.cells[1]?.laid?.utc.p95[0] ?? '') > '2026-05-20').toBe(true);
  });

  it('founds the nest before it', () => {
    const { founded } = together.nest;
    expect(founded && founded.utc.p95[1] < '2026-05-20').toBe(true);
  });

  it('changes no date when it could look into no cell', () => {
    const blind = reading('2026-05-20T12:00:00Z', [cell(0, 'unread'), cell(1, 'webbed')]);
    const { cells, nest } = dated([blind, ...KNOWN]);
    expect({ cells, nest }).toEqual({ cells: without.cells, nest: without.nest });
  });
});
