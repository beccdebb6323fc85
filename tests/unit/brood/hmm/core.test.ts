import { describe, expect, it } from 'vitest';
import { chainOf } from '@/lib/brood/hmm/chain';
import { filterForward, posterior, valueBackward } from '@/lib/brood/hmm/stations';
import { transitions } from '@/lib/brood/hmm/transitions';

const ones = (n: number) => new Float64Array(n).fill(1);
const move = (source: number, target: number, rate: number) => ({ source, target, rate, clock: 0 });
const still = [{ from: 0, speeds: [1] }];

describe('two states, moving both ways (closed form: p(t) = b/(a+b) + (a/(a+b)) e^−(a+b)t)', () => {
  const [a, b] = [0.3, 0.7];
  const chain = chainOf(transitions(2, 1, [move(0, 1, a), move(1, 0, b)]), still);
  const stay = (t: number) => b / (a + b) + (a / (a + b)) * Math.exp(-(a + b) * t);

  it.each([0, 0.01, 1, 7.3, 400])('carries masses and values over %d days to 1e-12', (t) => {
    const mass = chain.forward(Float64Array.of(1, 0), { from: 0, to: t });
    const value = chain.backward(Float64Array.of(1, 0), { from: 0, to: t });
    expect(Math.abs((mass[0] ?? NaN) - stay(t))).toBeLessThan(1e-12);
    expect(Math.abs((value[0] ?? NaN) - stay(t))).toBeLessThan(1e-12);
    expect(Math.abs((value[1] ?? NaN) - (b / (a + b)) * (1 - Math.exp(-(a + b) * t)))).toBeLessThan(1e-12);
  });

  it('gives the likelihood and the smoothed state of two noisy looks, summed over paths by hand', () => {
    const seen = [Float64Array.of(0.9, 0.2), Float64Array.of(0.4, 0.6)];
    const start = { time: 0, mass: Float64Array.of(1, 0) };
    const stations = [1, 3].map((time, i) => ({ time, likelihood: seen[i] ?? null }));
    const { filtered, logLik } = filterForward(chain, start, stations);
    const back = (t: number) => (b / (a + b)) * (1 - Math.exp(-(a + b) * t));
    const path = (s1: number, s2: number) => {
      const first = s1 === 0 ? stay(1) : 1 - stay(1);
      const toZero = s1 === 0 ? stay(2) : back(2);
      return first * (seen[0]?.[s1] ?? 0) * (s2 === 0 ? toZero : 1 - toZero) * (seen[1]?.[s2] ?? 0);
    };
    const total = path(0, 0) + path(0, 1) + path(1, 0) + path(1, 1);
    const smoothed = posterior(filtered, valueBackward(chain, ones(2), stations));
    expect(Math.abs(logLik - Math.log(total))).toBeLessThan(1e-12);
    expect(Math.abs((smoothed[0]?.[0] ?? NaN) - (path(0, 0) + path(0, 1)) / total)).toBeLessThan(1e-12);
  });
});

describe('three states in a row (closed forms)', () => {
  it('is hypoexponential with rates 2 and 5', () => {
    const chain = chainOf(transitions(3, 1, [move(0, 1, 2), move(1, 2, 5)]), still);
    for (const t of [0.1, 1, 4]) {
      const mass = chain.forward(Float64Array.of(1, 0, 0), { from: 0, to: t });
      const end = 1 - (5 * Math.exp(-2 * t) - 2 * Math.exp(-5 * t)) / 3;
      expect(Math.abs((mass[2] ?? NaN) - end)).toBeLessThan(1e-12);
    }
  });

  it('is Erlang with equal rates, also where the clock changes speed on the way', () => {
    const moves = transitions(3, 1, [move(0, 1, 1), move(1, 2, 1)]);
    const pieces = [
      { from: 0, speeds: [2] },
      { from: 1.5, speeds: [0] },
      { from: 4, speeds: [0.5] },
    ];
    const mass = chainOf(moves, pieces).forward(Float64Array.of(1, 0, 0), { from: 0.5, to: 6 });
    const clock = 2 * 1 + 0.5 * 2;
    expect(Math.abs((mass[2] ?? NaN) - (1 - Math.exp(-clock) * (1 + clock)))).toBeLessThan(1e-12);
  });

  it('lets two clocks race: loss at 0.1 a day against development at twice its speed', () => {
    const moves = transitions(3, 2, [move(0, 1, 0.4), { ...move(0, 2, 0.1), clock: 1 }]);
    const mass = chainOf(moves, [{ from: 0, speeds: [2, 1] }]).forward(Float64Array.of(1, 0, 0), { from: 0, to: 50 });
    expect(Math.abs((mass[2] ?? NaN) - 0.1 / 0.9)).toBeLessThan(1e-12);
  });
});

describe('a chain in time', () => {
  const moves = transitions(2, 1, [move(0, 1, 0.2)]);

  it('uses the first speeds before the first piece as well', () => {
    const chain = chainOf(moves, [{ from: 10, speeds: [1] }]);
    expect(chain.forward(Float64Array.of(1, 0), { from: 0, to: 5 })[0]).toBeCloseTo(Math.exp(-1), 14);
  });

  it('stands still when nothing can move', () => {
    const chain = chainOf(moves, [{ from: 0, speeds: [0] }]);
    expect(chain.forward(Float64Array.of(0.25, 0.75), { from: 0, to: 100 })).toEqual(Float64Array.of(0.25, 0.75));
  });

  it('gives a record that cannot happen a log-likelihood of −∞ and no NaN', () => {
    const stations = [1, 2].map((time) => ({ time, likelihood: Float64Array.of(0, 0) }));
    const { filtered, logLik } = filterForward(
      chainOf(moves, still),
      { time: 0, mass: Float64Array.of(1, 0) },
      stations,
    );
    expect(logLik).toBe(-Infinity);
    expect(filtered.flatMap((mass) => Array.from(mass))).toEqual([0, 0, 0, 0]);
  });

  it('does not underflow over hundreds of unlikely looks', () => {
    const chain = chainOf(transitions(2, 1, [move(0, 1, 0.2), move(1, 0, 0.2)]), still);
    const stations = Array.from({ length: 600 }, (_, i) => ({ time: i + 1, likelihood: Float64Array.of(1e-9, 2e-9) }));
    const { logLik, filtered } = filterForward(chain, { time: 0, mass: Float64Array.of(1, 0) }, stations);
    const smoothed = posterior(filtered, valueBackward(chain, ones(2), stations));
    expect(logLik).toBeGreaterThan(600 * Math.log(1e-9));
    expect(logLik).toBeLessThan(600 * Math.log(2e-9));
    expect(smoothed.every((mass) => Math.abs((mass[0] ?? 0) + (mass[1] ?? 0) - 1) < 1e-12)).toBe(true);
  });
});
