import { describe, expect, it } from 'vitest';
import { stageLaws } from '@/lib/brood/stages';
import { DEFAULT_DURATIONS, GENUS_ROW, durationsFor } from '@/lib/brood/durations';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { estimate, reading } from './support';

/** The mean time from egg to adult that the model works with. */
function modelTotal(egg: number, larva: number, capped: number): number {
  const row = { ...GENUS_ROW, egg, larva, capped };
  return stageLaws(row, DEFAULT_SETTINGS).reduce((total, { meanDays }) => total + meanDays, 0);
}

const sum = ({ egg, larva, capped }: { egg: number; larva: number; capped: number }) => egg + larva + capped;

describe('published stage durations (P rows: biology)', () => {
  it('P C01: exclamans adds up to 45 days (Rabb 1960)', () => {
    const { row } = durationsFor('Polistes exclamans', DEFAULT_DURATIONS);
    expect(row).toMatchObject({ egg: 11, larva: 20, capped: 14, trust: 'medium' });
    expect(sum(row)).toBe(45);
    expect(modelTotal(11, 20, 14)).toBeCloseTo(45, 10);
  });

  it('P C01: fuscatus and hunteri have the same days, called similar by Rabb 1960', () => {
    for (const name of ['fuscatus', 'hunteri']) expect(sum(durationsFor(name, DEFAULT_DURATIONS).row)).toBe(45);
  });

  it('P C02: simillimus adds up to 54.2 days, 2.3 more than printed for the whole, and says so (Bioikos 969)', () => {
    const { row } = durationsFor('Polistes simillimus', DEFAULT_DURATIONS);
    expect(sum(row)).toBeCloseTo(54.2, 10);
    expect(sum(row) - (row.publishedTotal ?? NaN)).toBeCloseTo(2.3, 10);
    const { assumptions } = estimate([reading('2026-06-06T12:00:00Z', [])], { taxon: 'Polistes simillimus' });
    expect(assumptions.join(' ')).toContain('add up to 54.2 days, while the same source prints 51.9');
  });

  it('P C03: consimilis adds up to 69.7 days (Montagna et al. 2010)', () => {
    expect(modelTotal(14.9, 36, 18.8)).toBeCloseTo(69.7, 10);
  });

  it('P C04: Vespula adds up to 32.3 days, and never serves a Polistes (indoor queen colonies)', () => {
    expect(modelTotal(7, 10.5, 14.8)).toBeCloseTo(32.3, 10);
    expect(DEFAULT_DURATIONS.every(({ taxon }) => taxon.startsWith('Polistes'))).toBe(true);
  });
});

describe('the row that serves a taxon', () => {
  it.each(['Polistes fuscatus', 'polistes fuscatus', 'P. fuscatus', 'fuscatus', 'fuscatus group'])(
    'finds fuscatus for %s',
    (name) => {
      expect(durationsFor(name, DEFAULT_DURATIONS)).toMatchObject({
        match: 'exact',
        row: { taxon: 'Polistes fuscatus' },
      });
    },
  );

  it.each(['Polistes metricus', 'Polistes', 'Polistes sp.', 'Fuscopolistes', '', null])(
    'falls back on the genus for %s, low trust',
    (name) => {
      expect(durationsFor(name, DEFAULT_DURATIONS)).toMatchObject({
        match: 'genus',
        row: { taxon: 'Polistes', trust: 'low' },
      });
    },
  );

  it('says that another genus is a guess', () => {
    const choice = durationsFor('Dolichovespula arenaria', DEFAULT_DURATIONS);
    expect(choice).toMatchObject({ match: 'other-genus', row: { trust: 'very low' } });
  });

  it('prefers a row the team has put in its own settings', () => {
    const own = { ...GENUS_ROW, taxon: 'Polistes metricus', egg: 12 };
    expect(durationsFor('metricus', [...DEFAULT_DURATIONS, own]).row).toBe(own);
  });

  it('still has a genus row when the settings have none', () => {
    expect(durationsFor('metricus', []).row).toBe(GENUS_ROW);
  });
});
