import { describe, expect, it } from 'vitest';
import { type Random, seededRandom } from '@/lib/kit/random';
import { chainOf } from '@/lib/brood/hmm/chain';
import { cellModel } from '@/lib/brood/hmm/cell-model';
import { type CellRecord, historyAnswer } from '@/lib/brood/hmm/history-answer';
import { erlangStage } from '@/lib/brood/hmm/stage-fit';
import { type Station, filterForward, posterior, valueBackward } from '@/lib/brood/hmm/stations';
import { type SpeedPiece, transitions } from '@/lib/brood/hmm/transitions';
import { denseSmooth, transitionMatrix } from '@/tests/support/brood/dense';

const SEEDS = Array.from({ length: 200 }, (_, seed) => seed + 1);

const between = (random: Random, low: number, high: number) => low + random() * (high - low);
const whole = (random: Random, low: number, high: number) => Math.floor(between(random, low, high + 1));

/** A chain of 2–9 states with moves in both directions, two clocks and up to four pieces. */
function randomChain(random: Random) {
  const states = whole(random, 2, 9);
  const pairs = Array.from({ length: states * states }, (_, i) => ({
    source: Math.floor(i / states),
    target: i % states,
  }));
  const moves = pairs
    .filter(({ source, target }) => source !== target && random() < 0.4)
    .map((pair) => ({ ...pair, clock: whole(random, 0, 1), rate: 10 ** between(random, -2, 0.7) }));
  const pieces = Array.from({ length: whole(random, 1, 4) }, (_, i) => ({
    from: i === 0 ? 0 : 3 * i + random(),
    speeds: [between(random, 0, 2), between(random, 0, 2)],
  }));
  return { moves: transitions(states, 2, moves), pieces };
}

/** Two to six looks at fractional times, some of them blind. */
function randomStations(random: Random, states: number): Station[] {
  const times = Array.from({ length: whole(random, 2, 6) }, () => between(random, 0, 15)).sort((a, b) => a - b);
  return times.map((time) => ({
    time,
    likelihood: random() < 0.2 ? null : Float64Array.from({ length: states }, () => random()),
  }));
}

/** The largest difference between two lists of numbers. */
function gap(a: Iterable<number>, b: readonly number[]): number {
  const left = [...a];
  return left.length === b.length ? Math.max(...left.map((x, i) => Math.abs(x - (b[i] ?? NaN)))) : Infinity;
}

/** How far the two implementations are apart on one random chain. */
function chainGaps(seed: number) {
  const random = seededRandom(seed);
  const { moves, pieces } = randomChain(random);
  const chain = chainOf(moves, pieces);
  const span = { from: between(random, 0, 4), to: between(random, 4, 16) };
  const first = whole(random, 0, moves.states - 1);
  const mass = new Float64Array(moves.states);
  mass[first] = 1;
  const dense = transitionMatrix(moves, pieces, span);
  const stations = randomStations(random, moves.states);
  const start = { time: 0, mass };
  const expected = denseSmooth({ moves, pieces, start }, stations);
  const { filtered, logLik } = filterForward(chain, start, stations);
  const smoothed = posterior(filtered, valueBackward(chain, new Float64Array(moves.states).fill(1), stations));
  return {
    forward: gap(chain.forward(mass, span), dense[first] ?? []),
    backward: gap(
      chain.backward(mass, span),
      dense.map((row) => row[first] ?? NaN),
    ),
    logLik: Math.abs(logLik - expected.logLik),
    smoothed: gap(
      smoothed.flatMap((at) => [...at]),
      expected.smoothed.flat(),
    ),
  };
}

describe('random chains against dense matrix exponentials (second implementation)', () => {
  it('agree on 200 seeds in masses, values, likelihood and smoothed states', () => {
    for (const seed of SEEDS) {
      const { forward, backward, logLik, smoothed } = chainGaps(seed);
      const isClose = forward < 1e-11 && backward < 1e-11 && logLik < 1e-10 && smoothed < 1e-10;
      expect(isClose, `seed ${seed}: ${forward}, ${backward}, ${logLik}, ${smoothed}`).toBe(true);
    }
  });
});

const NAMES = ['egg', 'L1', 'pupa'];
const CONFUSION = {
  absent: { absent: 1 },
  empty: { empty: 0.95, egg: 0.05 },
  egg: { egg: 0.9, empty: 0.06, L1: 0.04 },
  L1: { L1: 0.9, egg: 0.05, pupa: 0.05 },
  pupa: { pupa: 0.97, L1: 0.03 },
};

/** A small cell model; `stretch` makes every day that much longer, `shift` moves it in time. */
function smallModel(random: Random, { stretch, shift }: { stretch: number; shift: number }) {
  const shapes = NAMES.map((name) => ({
    name,
    phases: whole(random, 1, 5),
    meanDays: between(random, 2, 9),
    loss: between(random, 0, 0.05),
  }));
  const rates = {
    build: between(random, 0.02, 0.3),
    layFirst: between(random, 0.2, 2),
    layNext: between(random, 0.05, 0.5),
  };
  const pieces: SpeedPiece[] = [0, 6.5, 14].map((from) => ({ from, speeds: [between(random, 0.4, 1.6), 1, 1] }));
  return cellModel({
    stages: shapes.map(({ name, phases, meanDays, loss }) => ({
      name,
      ...erlangStage(phases, meanDays * stretch),
      lossPerDay: loss / stretch,
    })),
    generations: 2,
    rates: { build: rates.build / stretch, layFirst: rates.layFirst / stretch, layNext: rates.layNext / stretch },
    pieces: pieces.map(({ from, speeds }) => ({ from: from * stretch + shift, speeds })),
    confusion: CONFUSION,
    t0: shift,
    startKey: 'N',
  });
}

const CLASSES = ['empty', 'egg', 'L1', 'pupa'];

function randomRecord(random: Random): CellRecord {
  const times = Array.from({ length: whole(random, 1, 4) }, () => between(random, 1, 30)).sort((a, b) => a - b);
  return { times, observations: times.map(() => CLASSES[whole(random, 0, 3)] ?? null) };
}

/** Numbers of an answer that must not change. */
function gist(
  model: ReturnType<typeof smallModel>,
  record: CellRecord,
  options: { step: number; daysAfter: number[] },
) {
  const { logLik, smoothed, laying, outlook } = historyAnswer(model, record, options);
  const states = smoothed?.flatMap((kinds) => Object.values(kinds)) ?? [];
  return [logLik, ...states, ...(laying?.first ?? []), ...(laying?.current ?? []), ...(outlook?.emerged ?? [])];
}

const OPTIONS = { step: 0.5, daysAfter: [3, 9] };

describe('cell models under changes that must not matter (40 seeds)', () => {
  it('shift with all times', () => {
    for (const seed of SEEDS.slice(0, 40)) {
      const record = randomRecord(seededRandom(seed + 1_000));
      const shifted = { ...record, times: record.times.map((time) => time + 128) };
      const plain = gist(smallModel(seededRandom(seed), { stretch: 1, shift: 0 }), record, OPTIONS);
      const moved = gist(smallModel(seededRandom(seed), { stretch: 1, shift: 128 }), shifted, OPTIONS);
      expect(gap(moved, plain), `seed ${seed}`).toBeLessThan(1e-9);
    }
  });

  it('stay when durations, hazards and the clock are stretched together', () => {
    for (const seed of SEEDS.slice(0, 40)) {
      const record = randomRecord(seededRandom(seed + 1_000));
      const stretched = { ...record, times: record.times.map((time) => time * 2) };
      const plain = gist(smallModel(seededRandom(seed), { stretch: 1, shift: 0 }), record, OPTIONS);
      const slow = gist(smallModel(seededRandom(seed), { stretch: 2, shift: 0 }), stretched, {
        step: 1,
        daysAfter: [6, 18],
      });
      expect(gap(slow, plain), `seed ${seed}`).toBeLessThan(1e-10);
    }
  });

  it('stay when a visit did not look in (1e-10)', () => {
    for (const seed of SEEDS.slice(0, 40)) {
      const record = randomRecord(seededRandom(seed + 2_000));
      const blindTime = (record.times.at(-1) ?? 0) / 3;
      const visits = [
        ...record.times.map((time, i) => ({ time, seen: record.observations[i] ?? null })),
        { time: blindTime, seen: null },
      ];
      visits.sort((a, b) => a.time - b.time);
      const blind = { times: visits.map(({ time }) => time), observations: visits.map(({ seen }) => seen) };
      const model = smallModel(seededRandom(seed), { stretch: 1, shift: 0 });
      const [plain, withBlind] = [historyAnswer(model, record, OPTIONS), historyAnswer(model, blind, OPTIONS)];
      const numbers = ({ logLik, outlook }: typeof plain) => [logLik, ...(outlook?.emerged ?? [])];
      expect(gap(numbers(withBlind), numbers(plain)), `seed ${seed}`).toBeLessThan(1e-10);
    }
  });
});
