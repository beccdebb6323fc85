import { describe, expect, it } from 'vitest';
import vectors from '@/tests/fixtures/brood/brood-hmm.json';
import { answerHistories } from '@/lib/brood/answer-histories';
import { FORECAST_DAYS, parseHistoriesFile } from '@/lib/brood/histories-file';

const { model } = vectors;
const HISTORY = { name: 'one', times: [20], obs: ['egg'] };
const FILE = { model, histories: [HISTORY] };

/** The one line a file holding this value is refused with. */
function refusal(value: unknown): string {
  const result = parseHistoriesFile(JSON.stringify(value));
  return result.ok ? 'accepted' : result.error;
}

const withModel = (members: object) => ({ ...FILE, model: { ...model, ...members } });
const withHistory = (members: object) => ({ ...FILE, histories: [HISTORY, { ...HISTORY, ...members }] });
const withRow = (row: object) =>
  withModel({ confusion_true_to_observed: { ...model.confusion_true_to_observed, egg: row } });

describe('a histories file', () => {
  it('is read in the form of the vectors, prose and all, with their forecast days', () => {
    const result = parseHistoriesFile(JSON.stringify(FILE));
    expect(result).toMatchObject({ ok: true, value: { step: 0.25, gridTimes: null, forecastDays: FORECAST_DAYS } });
    expect(FORECAST_DAYS).toEqual(vectors.cases[0]?.forecast.days_after_last_census);
  });

  it('answers with exactly the members of the contract', () => {
    const result = parseHistoriesFile(JSON.stringify({ ...FILE, forecastDays: [3] }));
    const [row] = result.ok ? answerHistories(result.value).histories : [];
    expect(Object.keys(row ?? {}).sort()).toEqual(
      [
        ...['name', 'loglik', 'filtered', 'smoothed', 'laid_gen1_quantiles', 'laid_current_quantiles'],
        ...['p_occupied_at_last_census', 'generation_weights_given_occupied', 'forecast'],
      ].sort(),
    );
    expect(row?.forecast?.days_after_last_census).toEqual([3]);
    expect(Object.keys(row?.laid_gen1_quantiles ?? {}).sort()).toEqual(
      ['0.025', '0.1', '0.25', '0.5', '0.75', '0.9', '0.975'].sort(),
    );
  });

  it('takes losses by stage and coefficients of variation in place of phases', () => {
    const removal = model.stages.map(() => model.removal_hazard_per_day);
    expect(refusal(withModel({ removal_hazard_per_day: removal }))).toBe('accepted');
    const cv = model.stages.map(() => 0.3);
    expect(refusal({ ...FILE, model: { ...model, phases: undefined, cv } })).toBe('accepted');
  });

  it('starts where it is told to', () => {
    const result = parseHistoriesFile(JSON.stringify(withModel({ start_state: 'egg#1', t0: 19 })));
    const [row] = result.ok ? answerHistories(result.value).histories : [];
    expect(row?.laid_gen1_quantiles?.['0.5']).toBe(19);
  });
});

describe('a malformed histories file is refused with one line that names the field', () => {
  it.each([
    ['no model', { histories: [] }, 'model: must be an object, is missing'],
    ['no histories', { model }, 'histories: must be a list, is missing'],
    ['no stages', withModel({ stages: [] }), 'model.stages: must name at least one stage'],
    [
      'a stage named twice',
      withModel({ stages: [...model.stages.slice(0, 6), 'egg'] }),
      'model.stages[6]: "egg" is taken',
    ],
    ['too few phases', withModel({ phases: [3] }), 'model.phases: must have 7 members, one a stage, has 1'],
    ['half a phase', withModel({ phases: [0.5, 4, 4, 4, 5, 6, 16] }), 'model.phases[0]: must be'],
    [
      'a stage of no length',
      withModel({ mean_std_days: [0, 3, 3, 3.5, 4, 6, 18] }),
      'model.mean_std_days[0]: must be between',
    ],
    ['a negative loss', withModel({ removal_hazard_per_day: -1 }), 'model.removal_hazard_per_day: must be between'],
    [
      'a missing hazard',
      withModel({ hazard_empty_to_next_egg_per_day: undefined }),
      'model.hazard_empty_to_next_egg_per_day: must be a number',
    ],
    [
      'a stage gone through in no time',
      withModel({ mean_std_days: [12, 3, 3, 3.5, 4, 6, 0.001] }),
      'model.mean_std_days[6]: makes more than 2000',
    ],
    ['no generations', withModel({ generations: 0 }), 'model.generations: must be between 1 and 20'],
    [
      'a model too large',
      withModel({ phases: [2000, 2000, 4, 4, 5, 6, 16] }),
      'model.phases: make more than 5000 states',
    ],
    ['rates as prose', withModel({ rates: 'on day d' }), 'model.rates: must be a list'],
    ['a rate without its day', withModel({ rates: [[0]] }), 'model.rates[0]: must be [fromDay, rate]'],
    [
      'rates out of order',
      withModel({
        rates: [
          [0, 1],
          [0, 2],
        ],
      }),
      'model.rates[1]: must begin later',
    ],
    [
      'a row that does not sum to 1',
      withRow({ egg: 0.9 }),
      'model.confusion_true_to_observed.egg: row egg: sums to 0.9',
    ],
    ['a row that is a text', withRow({ egg: 'x' }), 'model.confusion_true_to_observed.egg.egg: must be a number'],
    ['a start state that is none', withModel({ start_state: 'Q' }), 'model.start_state: no state Q'],
    [
      'a class that is none',
      withHistory({ obs: ['opened'] }),
      'histories[1].obs[0]: "opened" is not among the classes',
    ],
    ['a set of no classes', withHistory({ obs: [[]] }), 'histories[1].obs[0]: must name at least one class'],
    ['a set with a number', withHistory({ obs: [['egg', 3]] }), 'histories[1].obs[0][1]: must be a text'],
    [
      'more visits than records',
      withHistory({ times: [1, 2] }),
      'histories[1].obs: must have one member a visit, 2, has 1',
    ],
    ['no visit', withHistory({ times: [], obs: [] }), 'histories[1].times: must hold at least one visit'],
    ['visits out of order', withHistory({ times: [5, 4], obs: ['egg', 'egg'] }), 'histories[1].times[1]: lies before'],
    ['a visit before the start', withHistory({ times: [-1] }), 'histories[1].times[0]: must be between 0 and'],
    ['a time that is a text', withHistory({ times: ['20'] }), 'histories[1].times[0]: must be a number, is a string'],
    ['a forecast into the past', { ...FILE, forecastDays: [-1] }, 'forecastDays[0]: must be between 0'],
    ['a grid of nothing', { ...FILE, grid: 0 }, 'grid: must be between 0.01'],
    [
      'a grid time after the last visit',
      { ...FILE, grid: [0, 21] },
      'grid[1]: must lie between 0 and the last visits, 20',
    ],
  ])('%s', (_, value, line) => {
    expect(refusal(value)).toContain(line);
    expect(refusal(value)).not.toContain('\n');
  });
});
