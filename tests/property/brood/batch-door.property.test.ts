import { describe, expect, it } from 'vitest';
import { seededRandom } from '@/lib/kit/random';
import type { Result } from '@/lib/kit/result';
import { parseHistoriesFile } from '@/lib/brood/histories-file';
import { parseNestFile } from '@/lib/brood/nest-file';
import vectors from '@/tests/fixtures/brood/brood-hmm.json';
import { type Json, mutatedFile } from '@/tests/support/brood/mutate-json';

const MUTATIONS = 500;
/** One line that begins with where in the file: `readings[0].at: …`. */
const NAMES_A_FIELD = /^[A-Za-z][^\n\r]*?: \S[^\n\r]*$/;

const NEST_FILE: Json = {
  nest: 'N1',
  taxon: 'Polistes fuscatus',
  zone: 'America/New_York',
  asOf: '2026-06-20',
  place: { lat: 40, lon: -75 },
  readings: [
    { id: 'a', at: '2026-06-06', marks: [{ q: 0, r: 0, state: 'egg' }] },
    {
      at: '2026-06-16T05:35:00-04:00',
      marks: [
        { q: 0, r: 0, state: 'large', instar: 5, nectar: true, unsure: false, reused: false },
        { q: 1, r: 0, state: 'egg', instar: null },
      ],
    },
  ],
  temperature: { kind: 'daily', days: [{ date: '2026-06-07', min: 12, max: 26.5 }] },
  settings: {
    version: 'mine',
    lossEgg: 0.02,
    generations: 2,
    nestFactorCv: { value: 0.3, trust: 'low', source: 'own nests' },
    durations: [{ taxon: 'Polistes fuscatus', egg: 12, larva: 21, capped: 15, referenceC: 25 }],
    confusion: { rows: { egg: { egg: 0.9, empty: 0.1 } }, source: '40 double readings' },
    durationFactors: [{ taxon: 'Polistes fuscatus', logMean: 0.1, logSd: 0.05, source: 'nine nests' }],
  },
};

const HISTORIES_FILE: Json = {
  model: vectors.model as Json,
  histories: [
    { name: 'one', times: [20, 24.5], obs: ['egg', ['egg', 'L1']] },
    { times: [12, 30, 41], obs: ['empty', null, 'pupa'] },
  ],
  grid: [0, 5.25, 20],
  forecastDays: [0, 3, 7],
};

/** What becomes of mutated files: how many were taken, and every answer that is neither taken nor one line. */
function tried(file: Json, parse: (text: string) => Result<unknown, string>) {
  const wrong: string[] = [];
  let taken = 0;
  for (let seed = 1; seed <= MUTATIONS; seed++) {
    const text = mutatedFile(seededRandom(seed), file);
    try {
      const result = parse(text);
      if (result.ok) taken += 1;
      else if (!NAMES_A_FIELD.test(result.error)) wrong.push(`seed ${seed}: ${JSON.stringify(result.error)}`);
    } catch (error) {
      wrong.push(`seed ${seed}: threw ${String(error)}`);
    }
  }
  return { taken, wrong };
}

describe('files of the batch door, mutated 500 times each: taken, or refused with one line that names a field', () => {
  it.each([
    ['nest', NEST_FILE, parseNestFile],
    ['histories', HISTORIES_FILE, parseHistoriesFile],
  ] as const)('a %s file', (_, file, parse) => {
    expect(parse(JSON.stringify(file)).ok).toBe(true);
    const { taken, wrong } = tried(file, parse);
    expect(wrong).toEqual([]);
    // Most changes must be noticed; those of names and prose are none.
    expect(taken).toBeGreaterThan(0.05 * MUTATIONS);
    expect(taken).toBeLessThan(0.6 * MUTATIONS);
  });
});
