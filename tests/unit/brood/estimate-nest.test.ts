import { describe, expect, it } from 'vitest';
import { CELL_STATES } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodMark } from '@/lib/brood/input';
import { ZONE, cellsOf, estimate, reading, settingsWith } from './support';

const AT = '2026-06-10T14:00:00Z';
const cell = (state: BroodMark['state'], rest: Partial<BroodMark> = {}): BroodMark => ({ q: 0, r: 0, state, ...rest });

describe('the shape of an answer', () => {
  const answer = estimate([reading(AT, cellsOf({ capped: 1, egg: 2 }))]);

  it('has exactly the members of the contract', () => {
    expect(Object.keys(answer).sort()).toEqual(
      [
        ...['asOf', 'assumptions', 'cells', 'durations', 'flags', 'information', 'inputDigest', 'model', 'nest'],
        ...['readings', 'settings', 'temperature', 'zone'],
      ].sort(),
    );
    expect(Object.keys(answer.cells[0] ?? {}).sort()).toEqual(
      ['capped', 'emerges', 'generation', 'laid', 'lost', 'q', 'r', 'state'].sort(),
    );
    expect(Object.keys(answer.nest).sort()).toEqual(
      ['emergencePerDay', 'expectedLosses', 'firstEmergence', 'founded', 'id', 'rateMultiplier', 'season'].sort(),
    );
  });

  it('nests its ranges: the median within 50, 80 and 95 %', () => {
    for (const { laid, capped, emerges } of answer.cells) {
      for (const range of [laid, capped, emerges]) {
        const { utc } = range ?? { utc: null };
        const order = [utc?.p95[0], utc?.p80[0], utc?.p50[0], utc?.median, utc?.p50[1], utc?.p80[1], utc?.p95[1]].map(
          String,
        );
        expect(order).toEqual([...order].sort());
        expect(new Set(order).size).toBe(7);
      }
    }
  });

  it('says local dates of the nest beside UTC instants', () => {
    const instant = answer.cells[0]?.laid?.utc.median ?? '';
    const local = new Intl.DateTimeFormat('en-CA', { timeZone: ZONE }).format(new Date(instant));
    expect(answer.cells[0]?.laid?.median).toBe(local);
    expect(answer.zone).toBe(ZONE);
  });

  it('orders laid, capped and out for every class', () => {
    for (const state of ['egg', 'small', 'medium', 'large', 'capped'] as const) {
      const [dated] = estimate([reading(AT, [cell(state)])]).cells;
      expect((dated?.laid?.median ?? '') < (dated?.capped?.median ?? '')).toBe(true);
      expect((dated?.capped?.median ?? '') < (dated?.emerges?.median ?? '')).toBe(true);
    }
  });
});

describe('cells without a datable brood', () => {
  it.each(['empty', 'unread', 'webbed', 'damaged', 'dead', 'parasitised', 'opened'] as const)(
    'gives %s no dates',
    (state) => {
      const answer = estimate([reading(AT, [cell(state)])]);
      expect(answer.cells).toMatchObject([{ state, laid: null, capped: null, emerges: null }]);
    },
  );

  it('counts dead and parasitised brood as lost, an opened cell as not', () => {
    const lost = (state: BroodMark['state']) => estimate([reading(AT, [cell(state)])]).cells[0]?.lost.probability;
    const chances = (['dead', 'parasitised', 'empty', 'opened'] as const).map(lost);
    expect(chances[0]).toBeGreaterThan(0.999);
    expect(chances[1]).toBeGreaterThan(0.999);
    expect(chances[3]).toBeLessThan(0.01);
  });

  it('turns grey and says so when nothing can be dated', () => {
    const { nest, flags } = estimate([reading(AT, cellsOf({ empty: 3 }))]);
    expect(nest).toMatchObject({ season: 'grey', founded: null, firstEmergence: null });
    expect(flags.map(({ code }) => code)).toEqual(['nothing-dated']);
  });

  it('answers a nest without any reading', () => {
    const answer = estimateNest({ nest: 'n', zone: ZONE, asOf: Date.parse(AT), taxon: null, readings: [] });
    expect(answer).toMatchObject({ cells: [], readings: [], nest: { season: 'grey' } });
    expect(answer.nest.emergencePerDay).toHaveLength(60);
    expect(answer.information.posteriorSd).toBe(answer.information.priorSd);
  });
});

describe('a nest whose adults have come out', () => {
  it.each([
    ['an opened cell', [cell('opened'), { q: 1, r: 0, state: 'capped' as const }]],
    ['a cell marked reused', [cell('egg', { reused: true }), { q: 1, r: 0, state: 'capped' as const }]],
  ])('says past instead of estimating first emergence: %s', (_, marks) => {
    const { nest, flags } = estimate([reading(AT, marks)]);
    expect(nest).toMatchObject({ firstEmergence: null, season: 'red' });
    expect(flags.map(({ code }) => code)).toContain('past');
    expect(nest.emergencePerDay.some(({ expected }) => expected > 0.01)).toBe(true);
  });

  it('remembers an opened cell from an earlier reading', () => {
    const { nest } = estimate([reading(AT, [cell('opened')]), reading('2026-06-20T14:00:00Z', [cell('egg')])]);
    expect(nest.firstEmergence).toBeNull();
  });

  it('founds the nest about a whole development before an opened cell, or earlier', () => {
    const { nest } = estimate([reading(AT, [cell('opened')])]);
    expect(nest.founded && nest.founded.p95[0] < '2026-04-27').toBe(true);
    expect(nest.founded && nest.founded.median < '2026-05-05').toBe(true);
  });

  it('M C31: capped, empty, egg is a later brood; its age restarts and the founding stays', () => {
    const first = reading('2026-06-01T12:00:00Z', cellsOf({ capped: 4, large: 4, egg: 8 }));
    const before = estimate([first]);
    const after = estimate([
      first,
      reading('2026-06-20T12:00:00Z', [cell('empty')]),
      reading('2026-06-26T12:00:00Z', [cell('egg')]),
    ]);
    expect(after.cells[0]?.state).toBe('egg');
    expect(after.cells[0]?.generation).toBeGreaterThanOrEqual(2);
    expect((after.cells[0]?.laid?.p95[0] ?? '') > '2026-06-01').toBe(true);
    const shift = Date.parse(after.nest.founded?.utc.median ?? '') - Date.parse(before.nest.founded?.utc.median ?? '');
    expect(Math.abs(shift)).toBeLessThan(7 * 86_400_000);
  });
});

describe('several readings', () => {
  const early = reading('2026-05-20T12:00:00Z', [cell('egg'), { q: 1, r: 0, state: 'egg' }]);
  const late = reading('2026-06-10T12:00:00Z', [cell('large')]);

  it('takes all readings of a cell together: an egg and a large larva three weeks later narrow each other', () => {
    const width = (readings: Parameters<typeof estimate>[0]) => {
      const { p95 } = estimate(readings).cells[0]?.laid?.utc ?? { p95: ['', ''] };
      return Date.parse(p95[1]) - Date.parse(p95[0]);
    };
    expect(width([late, early])).toBeLessThan(0.8 * width([late]));
    expect(estimate([late, early]).readings).toEqual([early.id, late.id]);
  });

  it('does not look at readings after the day that is asked for', () => {
    const asOf = Date.parse('2026-06-01T12:00:00Z');
    expect(estimate([early, late], { asOf })).toEqual(estimate([early], { asOf }));
  });

  it('leaves everything as it was when a later visit could not look in', () => {
    const unread = reading('2026-05-25T12:00:00Z', [cell('unread'), { q: 1, r: 0, state: 'unread' }]);
    const asOf = unread.at;
    expect(estimate([early, unread], { asOf }).cells).toEqual(estimate([early], { asOf }).cells);
    expect(estimate([early, unread], { asOf }).nest).toEqual(estimate([early], { asOf }).nest);
  });

  it('shows webbing over a cell but keeps the dates of the look before, and says so', () => {
    const webbed = reading('2026-05-25T12:00:00Z', [cell('webbed')]);
    const { cells, flags } = estimate([early, webbed]);
    expect(cells[0]).toMatchObject({ state: 'webbed', laid: estimate([early]).cells[0]?.laid });
    expect(flags).toMatchObject([{ cell: { q: 0, r: 0 }, code: 'not-looked-at' }]);
  });

  it('counts an egg that is gone as lost', () => {
    const { cells } = estimate([early, reading('2026-05-25T12:00:00Z', [cell('empty')])]);
    expect(cells[0]).toMatchObject({ state: 'empty', generation: 1, laid: null });
    expect(cells[0]?.lost.probability).toBeGreaterThan(0.99);
  });
});

describe('an instar given by a reviewer', () => {
  const width = (marks: BroodMark[]) => {
    const { p95 } = estimate([reading(AT, marks)]).cells[0]?.laid?.utc ?? { p95: ['', ''] };
    return Date.parse(p95[1]) - Date.parse(p95[0]);
  };

  it('narrows the range of a small larva', () => {
    expect(width([cell('small', { instar: 2 })])).toBeLessThan(width([cell('small')]));
  });

  it('is set aside with a flag when it does not belong to the class', () => {
    const { cells, flags } = estimate([reading(AT, [cell('small', { instar: 5 })])]);
    expect(cells[0]?.laid).toEqual(estimate([reading(AT, [cell('small')])]).cells[0]?.laid);
    expect(flags.map(({ code }) => code)).toContain('instar-mismatch');
  });
});

describe('probabilities', () => {
  it('lets an adult come out with what the losses leave', () => {
    for (const state of ['egg', 'small', 'medium', 'large', 'capped'] as const) {
      const [dated] = estimate([reading(AT, [cell(state)])]).cells;
      expect((dated?.emerges?.probability ?? 0) + (dated?.lost.probability ?? 0)).toBeCloseTo(1, 12);
    }
  });

  it('adds expected losses up to those of the cells', () => {
    const { cells, nest } = estimate([reading(AT, cellsOf({ capped: 2, large: 3, egg: 5 }))]);
    const byCell = cells.reduce((sum, { lost }) => sum + lost.probability, 0);
    const { egg, larva, capped } = nest.expectedLosses;
    expect(egg + larva + capped).toBeCloseTo(byCell, 10);
  });

  it('loses nothing without loss rates', () => {
    const settings = settingsWith({ lossEgg: 0, lossLarva: 0, lossCapped: 0 });
    expect(estimate([reading(AT, [cell('egg')])], { settings }).cells[0]?.emerges?.probability).toBeCloseTo(1, 8);
  });
});

describe('time of day and year', () => {
  it('crosses a year', () => {
    const [dated] = estimate([reading('2026-01-03T12:00:00Z', [cell('large')])], { zone: 'Pacific/Auckland' }).cells;
    expect(dated?.laid?.median.slice(0, 4)).toBe('2025');
    expect(dated?.emerges?.median.slice(0, 4)).toBe('2026');
  });

  it('counts days of 24 hours across the night the clocks change', () => {
    const settings = settingsWith({ nestFactorCv: 0 });
    const before = estimate([reading('2026-10-31T12:00:00-04:00', [cell('egg')])], { settings });
    const utc = estimate([reading('2026-10-31T12:00:00-04:00', [cell('egg')])], { settings, zone: 'UTC' });
    expect(before.cells[0]?.emerges?.utc).toEqual(utc.cells[0]?.emerges?.utc);
    expect(before.nest.emergencePerDay.map(({ date }) => date).slice(0, 3)).toEqual([
      '2026-10-31',
      '2026-11-01',
      '2026-11-02',
    ]);
  });
});

describe('inputs that change an answer', () => {
  it('names unsure cells and a foreign genus', () => {
    const rest = { taxon: 'Dolichovespula arenaria' };
    const { flags, assumptions } = estimate([reading(AT, [cell('egg', { unsure: true })])], rest);
    expect(flags.map(({ code }) => code)).toEqual(['other-genus']);
    expect(assumptions.join(' ')).toContain('unsure: 1 cell');
  });

  it('hands the canonical text to the digest it is given', () => {
    const input = [reading(AT, [cell('egg')])];
    const { inputDigest } = estimate(input, { digest: (text) => `#${text.length}` });
    expect(inputDigest).toBe(`#${estimate(input).inputDigest.length}`);
  });

  it('takes every state there is in one comb of 500 cells', () => {
    const marks = spiral(500).map((at, i) => ({ ...at, state: CELL_STATES[i % CELL_STATES.length] ?? 'unread' }));
    const { cells, nest } = estimate([reading(AT, marks)]);
    expect(cells).toHaveLength(500);
    expect(nest.emergencePerDay).toHaveLength(60);
  }, 120_000);
});
