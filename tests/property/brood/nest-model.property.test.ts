import { describe, expect, it } from 'vitest';
import { type Random, seededRandom } from '@/lib/kit/random';
import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { GENUS_ROW } from '@/lib/brood/durations';
import type { BroodMark, BroodReading } from '@/lib/brood/input';
import { byKey } from '@/lib/brood/hmm/brood-states';
import { DEFAULT_CONFUSION } from '@/lib/brood/nest-model/confusion';
import { type DatedNest, datedNest } from '@/lib/brood/nest-model/dated-nest';
import { cumulated } from '@/lib/brood/nest-model/mixed-group';
import { nestHistory } from '@/lib/brood/nest-model/nest-history';
import type { BroodSettings } from '@/lib/brood/settings';
import { denseCell } from '@/tests/support/brood/dense-nest';
import { classAt, recorded, simulateCell } from '@/tests/unit/brood/nest-model/simulate-cell';
import { settingsWith } from '@/tests/unit/brood/support';

const SEEDS = Array.from({ length: 24 }, (_, i) => i + 1);
const DAY_MS = 86_400_000;
const START = Date.parse('2026-06-01T12:00:00Z');
const PRIOR_SPAN = 40;

/** Few phases and a short search, so that dense matrices stay small; the same code as with more. */
const SMALL = settingsWith({ cvEgg: 0.4, cvInstar: 0.9, cvCapped: 0.4, generations: 2, priorSpan: PRIOR_SPAN });

const between = (random: Random, low: number, high: number) => low + random() * (high - low);
const whole = (random: Random, low: number, high: number) => Math.floor(between(random, low, high + 1));

/** Readings of two or three simulated cells at two or three visits, some cells unread. */
function smallNest(random: Random, settings: BroodSettings, rho: number): BroodReading[] {
  const gaps = Array.from({ length: whole(random, 1, 2) }, () => whole(random, 8, 48) / 4);
  const days = gaps.reduce<number[]>((all, gap) => [...all, (all.at(-1) ?? 0) + gap], [0]);
  const cells = spiral(whole(random, 2, 3)).map((at, i) => {
    const built = between(random, -38, i === 0 ? -1 : 4);
    return { at, cell: simulateCell(random, { row: GENUS_ROW, settings, rho }, built) };
  });
  return days.map((day) => ({
    id: `day-${day}`,
    at: START + day * DAY_MS,
    marks: cells.flatMap(({ at, cell }): BroodMark[] => {
      const seen = recorded(random, { confusion: DEFAULT_CONFUSION, floor: 0 }, classAt(cell, day));
      const state = random() < 0.12 ? 'unread' : seen;
      return seen === 'absent' ? [] : [{ ...at, state: state as CellState }];
    }),
  }));
}

/** Straight between the edges of the timeline. */
function straightAt(edges: Float64Array, values: Float64Array, day: number): number {
  const next = edges.findIndex((edge) => edge >= day - 1e-9);
  if (next <= 0) return values[0] ?? NaN;
  const [low, high] = [edges[next - 1] ?? 0, edges[next] ?? 0];
  const share = Math.min(1, (day - low) / (high - low));
  return (values[next - 1] ?? 0) + share * ((values[next] ?? 0) - (values[next - 1] ?? 0));
}

/** How far the product and the dense implementation are apart over the cells of one nest. */
interface Gaps {
  logLik: number;
  states: number;
  first: number;
  present: number;
}

function widest(gaps: readonly number[]): number {
  return Math.max(0, ...gaps);
}

function groupGaps(
  { timeline, groups, posterior }: DatedNest,
  g: number,
  world: { settings: BroodSettings; speed: number },
): Gaps {
  const group = groups[g];
  const answer = posterior.nodes[0]?.groups[g];
  if (!group || !answer) throw new Error(`no group ${g}`);
  const { edges, looks } = timeline;
  const dense = denseCell({
    ...world,
    row: GENUS_ROW,
    confusion: DEFAULT_CONFUSION,
    looks: group.looks.map((atVisit, visit) => ({ day: looks[visit] ?? NaN, seen: atVisit[0]?.state ?? null })),
    from: -PRIOR_SPAN,
    absentAt: (day) => straightAt(edges, group.prior.absent, day),
  });
  const days = [...edges].filter((edge) => edge <= group.lastLook);
  const [first, laid] = [cumulated(answer.first), cumulated(answer.laid)];
  const { states } = posterior.best.model;
  return {
    logLik: Math.abs(answer.forward.logLik - dense.logLik),
    states: widest(
      answer.forward.atLooks.flatMap((mass, look) =>
        Object.entries(byKey(states, mass)).map(([key, p]) => Math.abs(p - (dense.atLooks[look]?.[key] ?? NaN))),
      ),
    ),
    first: widest(days.map((day, i) => Math.abs((first[i] ?? NaN) - dense.firstBy(day)))),
    present:
      answer.outlook && answer.outlook.alive > 1e-6
        ? widest(days.map((day, i) => Math.abs((laid[i] ?? NaN) - dense.presentBy(day))))
        : 0,
  };
}

/** One random nest at a fixed nest factor and a steady clock, by both implementations. */
function nestGaps(seed: number): Gaps[] {
  const random = seededRandom(seed);
  const [rho, rate] = [between(random, 0.7, 1.4), between(random, 0.6, 1.2)];
  const factor = {
    taxon: GENUS_ROW.taxon,
    logMean: Math.log(rho),
    logSd: 0,
    trust: 'assumption' as const,
    source: 'test',
  };
  const settings = { ...SMALL, durationFactors: [factor] };
  const history = nestHistory(smallNest(random, settings, rho * rate));
  if (!history) return [];
  const nest = datedNest(history, { row: GENUS_ROW, settings, clock: { between: () => rate, end: -Infinity } });
  return nest.groups.map((_, g) => groupGaps(nest, g, { settings, speed: rho * rate }));
}

describe('the nest model against dense matrix exponentials (second implementation)', { timeout: 60_000 }, () => {
  it('agrees on 24 small nests in likelihood, states and both laying laws, as far as its quarter days allow', () => {
    let cells = 0;
    for (const seed of SEEDS) {
      for (const { logLik, states, first, present } of nestGaps(seed)) {
        cells += 1;
        const isClose = logLik < 0.01 && states < 0.004 && first < 0.004 && present < 0.004;
        expect(isClose, `seed ${seed}: ${logLik}, ${states}, ${first}, ${present}`).toBe(true);
      }
    }
    expect(cells).toBeGreaterThan(48);
  });
});
