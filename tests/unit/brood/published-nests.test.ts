import { describe, expect, it } from 'vitest';
import { addDays, daysBetween } from '@/lib/kit/local-date';
import type { BroodMark } from '@/lib/brood/input';
import { NO_SPREAD, cellsOf, estimate, reading } from './support';

/** Do two date ranges share a day? */
function overlap([from, to]: readonly [string, string], [first, last]: readonly [string, string]): boolean {
  return from <= last && first <= to;
}

describe('P C13: a printed young nest of 26 cells, seen 6 June (one nest, cool wet June)', () => {
  // 15 eggs and 11 larvae; the split of the larvae into 5 small, 3 medium and 3 large is invented.
  const marks = cellsOf({ large: 3, medium: 3, small: 5, egg: 15 });
  const { cells, nest } = estimate([reading('2026-06-06T16:00:00Z', marks)], { taxon: null });

  it('represents all 26 cells, each with dates', () => {
    expect(cells).toHaveLength(26);
    expect(cells.every(({ laid, capped, emerges }) => laid && capped && emerges)).toBe(true);
  });

  it('lays the oldest egg in a range that overlaps 6–26 May', () => {
    const laid = cells[0]?.laid;
    expect(laid && overlap(laid.p50, ['2026-05-06', '2026-05-26'])).toBe(true);
    expect(laid && laid.median >= '2026-05-06' && laid.median <= '2026-05-26').toBe(true);
  });

  it('brings the first adult out in a range that overlaps 20 June–10 July', () => {
    const { firstEmergence } = nest;
    expect(firstEmergence && overlap(firstEmergence.p50, ['2026-06-20', '2026-07-10'])).toBe(true);
    expect(firstEmergence && firstEmergence.median >= '2026-06-20' && firstEmergence.median <= '2026-07-10').toBe(true);
  });

  it('dates the first adult no later than any cell, and the founding no later than any egg', () => {
    const first = nest.firstEmergence?.utc.median ?? '';
    expect(cells.every(({ emerges }) => first <= (emerges?.utc.median ?? ''))).toBe(true);
    expect(cells.every(({ laid }) => (nest.founded?.utc.median ?? '') < (laid?.utc.median ?? ''))).toBe(true);
  });
});

describe('published founding-to-worker times (P rows: biology)', () => {
  it('P C05: a first egg laid on founding gives a worker within 7 days of the published 42 (Enteman 1902)', () => {
    const { nest } = estimate([reading('2026-05-20T12:00:00Z', cellsOf({ egg: 1 }))], { settings: NO_SPREAD });
    const days = daysBetween(nest.founded?.median ?? '', nest.firstEmergence?.median ?? '');
    expect(Math.abs(days - 42)).toBeLessThanOrEqual(7);
  });

  it('P C06: a fuscatus nest 48 days old without adults is accepted without a flag (fuscatus defence study)', () => {
    const first = reading('2026-05-01T12:00:00Z', [{ q: 0, r: 0, state: 'egg' }]);
    const last = reading('2026-06-18T12:00:00Z', [{ q: 0, r: 0, state: 'capped' }]);
    expect(estimate([first, last], { taxon: 'Polistes fuscatus' }).flags).toEqual([]);
  });

  it('common practice: eggs at the rim, large larvae in the middle, nothing capped, late May, is dated mid-April to mid-May', () => {
    const { nest } = estimate([reading('2026-05-27T15:00:00Z', cellsOf({ large: 1, medium: 3, small: 4, egg: 6 }))]);
    expect(nest.founded && nest.founded.median >= '2026-04-15' && nest.founded.median <= '2026-05-15').toBe(true);
  });
});

describe('arithmetic of the default durations with next to no spread (M rows: coded as written, no biology)', () => {
  const capped = estimate([reading('2026-06-15T12:00:00Z', cellsOf({ capped: 1 }))], {
    settings: NO_SPREAD,
    zone: 'UTC',
  });

  it('M C14: a capped cell on 15 June was laid 1–15 May and comes out 15–29 June', () => {
    const [cell] = capped.cells;
    const within = (range: readonly [string, string] | undefined, from: string, to: string) => {
      expect(Math.abs(daysBetween(from, range?.[0] ?? ''))).toBeLessThanOrEqual(1);
      expect(Math.abs(daysBetween(to, range?.[1] ?? ''))).toBeLessThanOrEqual(1);
    };
    within(cell?.laid?.p95, '2026-05-01', '2026-05-15');
    within(cell?.emerges?.p95, '2026-06-15', '2026-06-29');
  });

  it('M C14: the same cell was capped 1–15 June', () => {
    const range = capped.cells[0]?.capped?.p95 ?? ['', ''];
    expect(range[0] >= '2026-06-01' && range[1] <= '2026-06-15').toBe(true);
  });

  it('M C15: an egg today is capped in 20–31 days and comes out in 34–45', () => {
    const [cell] = estimate([reading('2026-06-01T12:00:00Z', cellsOf({ egg: 1 }))], {
      settings: NO_SPREAD,
      zone: 'UTC',
    }).cells;
    const days = (range: readonly [string, string] | undefined) =>
      range?.map((date) => daysBetween('2026-06-01', date));
    const [firstCap = 0, lastCap = 0] = days(cell?.capped?.p95) ?? [];
    const [firstOut = 0, lastOut = 0] = days(cell?.emerges?.p95) ?? [];
    expect([firstCap >= 19, lastCap <= 32, lastCap - firstCap >= 9]).toEqual([true, true, true]);
    expect([firstOut >= 33, lastOut <= 46, lastOut - firstOut >= 9]).toEqual([true, true, true]);
  });

  it('M C33: stored nectar beside an egg has no effect on any date', () => {
    const at = '2026-06-01T12:00:00Z';
    const egg: BroodMark = { q: 0, r: 0, state: 'egg' };
    expect(estimate([reading(at, [{ ...egg, nectar: true }])])).toEqual(estimate([reading(at, [egg])]));
  });
});

describe('the 33 cells of Fennel Green bandstand (nest N12 of the demo season, final reading of 16 June)', () => {
  const marks = cellsOf({ capped: 6, parasitised: 1, large: 7, medium: 3, small: 6, egg: 10 });
  const { cells, nest, flags } = estimate([reading('2026-06-16T05:35:00-04:00', marks)], {
    taxon: 'Polistes fuscatus',
  });

  it('dates every living brood between February and October', () => {
    const dates = cells.flatMap(({ laid, emerges }) => [...(laid?.p95 ?? []), ...(emerges?.p95 ?? [])]);
    expect(dates).toHaveLength(32 * 4);
    expect(dates.every((date) => date > '2026-02-01' && date < '2026-10-01')).toBe(true);
  });

  it('brings the first adult out within two weeks, as its one capped stage asks', () => {
    expect(nest.firstEmergence && nest.firstEmergence.median > '2026-06-16').toBe(true);
    expect(nest.firstEmergence && nest.firstEmergence.median <= addDays('2026-06-16', 14)).toBe(true);
  });

  it('covers the day on which an adult did come out of the oldest cell in the scenario, 27 June', () => {
    const [from, to] = cells[0]?.emerges?.p95 ?? ['', ''];
    expect(from <= '2026-06-27' && '2026-06-27' <= to).toBe(true);
  });

  it('is amber: workers are due within the week of the gate', () => {
    expect(nest.season).toBe('amber');
    expect(flags.map(({ code }) => code)).toEqual(['guard']);
  });

  it('gives a parasitised cell no date and counts it as lost', () => {
    const parasitised = cells.find(({ state }) => state === 'parasitised');
    expect(parasitised).toMatchObject({ laid: null, emerges: null });
    expect(parasitised?.lost.probability).toBeGreaterThan(0.999);
  });
});
