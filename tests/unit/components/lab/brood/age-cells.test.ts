import { describe, expect, it } from 'vitest';
import { ageBand } from '@/components/comb/comb-cell';
import { cellName } from '@/components/comb/comb-view';
import { ageCells, ageLines } from '@/components/lab/brood/age-cells';
import { figureFacts } from '@/components/lab/brood/figure-facts';
import { estimateNest } from '@/lib/brood/estimate-nest';

const AT = Date.parse('2026-06-16T12:00:00Z');
const estimate = estimateNest({
  nest: 'n',
  zone: 'UTC',
  asOf: AT,
  taxon: 'Polistes fuscatus',
  readings: [
    {
      id: 'r',
      at: AT,
      marks: [
        { q: 0, r: 0, state: 'capped' },
        { q: 0, r: -1, state: 'egg' },
        { q: 1, r: -1, state: 'empty' },
      ],
    },
  ],
});

describe('the comb by age', () => {
  const cells = ageCells(estimate);

  it('gives a brood whole days since it was laid, and an empty cell none', () => {
    const [capped, egg, empty] = cells;
    // Rabb 1960: 11 days as egg, 20 as larva, 14 capped: a capped brood is 31 to 45 days old on average.
    expect(capped?.ageDays).toBeGreaterThan(28);
    expect(capped?.ageDays).toBeLessThan(48);
    expect(egg?.ageDays).toBeLessThan(12);
    expect(empty?.ageDays).toBeUndefined();
  });

  it('says the age aloud, after the word for what was seen', () => {
    const [capped] = cells;
    expect(capped && cellName(capped)).toMatch(/^cell 0, ring 0, capped, about \d+ days old$/);
  });

  it.each([
    [0, 0],
    [6, 0],
    [7, 1],
    [41, 5],
    [42, 6],
    [400, 6],
  ])('colours %i days with band %i', (days, band) => {
    expect(ageBand(days)).toBe(band);
  });
});

describe('what is said of a picked cell', () => {
  const lines = ageLines(estimate, '2026');

  it('gives every date with a range, never a bare one', () => {
    const dates = (lines['0,0'] ?? []).filter((line) => /^(Laid|Capped|Adult)/.test(line));
    expect(dates.length).toBeGreaterThanOrEqual(3);
    for (const line of dates) expect(line).toMatch(/between .* and |within the day/);
  });

  it('says that an empty cell holds nothing to date', () => {
    expect(lines['1,-1']).toEqual(['No brood that can be dated']);
  });
});

describe('a downloaded figure', () => {
  it('says below the drawing whose it is, of when, and by which model', () => {
    const { caption } = figureFacts('brood-comb', { code: 'N12', day: '2026-06-16', estimate });
    expect(caption[0]).toContain('N12, estimate as known on 16 June 2026.');
    expect(caption.at(-1)).toBe(
      `Model ${estimate.model.name} ${estimate.model.version}, settings version ${estimate.settings.version}.`,
    );
  });
});
