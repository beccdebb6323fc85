import { describe, expect, it } from 'vitest';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { parseNestFile } from '@/lib/brood/nest-file';

const MARK = { q: 0, r: 0, state: 'egg' };
const READING = { at: '2026-06-16T05:35:00-04:00', marks: [MARK] };

/** What a file holding this value is read as. */
const parse = (value: unknown) => parseNestFile(JSON.stringify(value));

/** The one line a file holding this value is refused with. */
function refusal(value: unknown): string {
  const result = parse(value);
  return result.ok ? 'accepted' : result.error;
}

describe('a nest file', () => {
  it('is read with UTC, no taxon and the last reading as the day asked for, unless it says otherwise', () => {
    const result = parse({ readings: [READING, { at: '2026-06-01', marks: [] }] });
    expect(result).toMatchObject({
      ok: true,
      value: { nest: 'nest', zone: 'UTC', taxon: null, asOf: Date.parse(READING.at), temperature: null },
    });
  });

  it('takes a bare date as noon of the nest', () => {
    const result = parse({ zone: 'America/New_York', readings: [{ at: '2026-06-06', marks: [MARK] }] });
    expect(result.ok && result.value.asOf).toBe(Date.parse('2026-06-06T12:00:00-04:00'));
  });

  it('can be estimated as it stands, with its own settings', () => {
    const settings = { version: 'mine', lossEgg: 0.02, nestFactorCv: { value: 0.3, source: 'own nests' } };
    const result = parse({ readings: [READING], taxon: 'Polistes fuscatus', settings, name: 'ignored' });
    const answer = result.ok ? estimateNest(result.value) : null;
    expect(answer?.settings.version).toBe('mine');
    expect(answer?.cells[0]?.laid).not.toBeNull();
    expect(result.ok && result.value.settings?.values.nestFactorCv).toEqual({
      value: 0.3,
      trust: 'assumption',
      source: 'own nests',
    });
  });

  it('puts its own duration rows before the built-in ones', () => {
    const row = { taxon: 'Polistes fuscatus', egg: 12, larva: 21, capped: 15 };
    const result = parse({ readings: [READING], taxon: 'Polistes fuscatus', settings: { durations: [row] } });
    expect(result.ok && estimateNest(result.value).durations).toMatchObject({ ...row, trust: 'assumption' });
  });

  it('reads daily extremes and logger readings in any order, and where the nest hangs', () => {
    const days = ['2026-06-02', '2026-06-01'].map((date) => ({ date, min: 12, max: 26 }));
    const daily = parse({ readings: [READING], temperature: { kind: 'daily', days }, place: { lat: 40, lon: -75 } });
    expect(daily).toMatchObject({
      value: {
        temperature: { kind: 'daily', days: [{ date: '2026-06-01' }, { date: '2026-06-02' }] },
        place: { lat: 40 },
      },
    });
    const readings = ['2026-06-02T01:00:00Z', '2026-06-02T00:00:00Z'].map((at) => ({ at, celsius: 21.5 }));
    const logger = parse({ readings: [READING], temperature: { readings } });
    expect(logger).toMatchObject({
      value: {
        temperature: { kind: 'logger', readings: [{ at: Date.parse('2026-06-02T00:00:00Z') }, { celsius: 21.5 }] },
      },
    });
  });

  it('takes what a team has learnt: how its readers err and how fast its nests are', () => {
    const confusion = { rows: { egg: { egg: 0.9, empty: 0.1 } }, source: '40 double readings' };
    const durationFactors = [{ taxon: 'Polistes fuscatus', logMean: 0.1, logSd: 0.05, source: 'nine nests' }];
    const result = parse({ readings: [READING], settings: { confusion, durationFactors } });
    expect(result).toMatchObject({
      value: {
        settings: {
          confusion: { rows: { egg: { empty: 0.1 }, L2: { small: 1 } }, trust: 'assumption' },
          durationFactors,
        },
      },
    });
  });
});

describe('a malformed nest file is refused with one line that names the field', () => {
  const withMark = (mark: object) => ({
    readings: [{ ...READING, marks: [MARK, { q: 1, r: 0, state: 'egg', ...mark }] }],
  });

  it.each([
    ['a list instead of an object', [], 'file: must be an object, is a list'],
    ['no readings', {}, 'readings: must be a list, is missing'],
    ['a reading without a time', { readings: [{ marks: [] }] }, 'readings[0].at: must be a text, is missing'],
    [
      'a time without an offset',
      { readings: [{ ...READING, at: '2026-06-16T05:35' }] },
      'readings[0].at: "2026-06-16T05:35"',
    ],
    [
      'a day that is not in the calendar',
      { readings: [{ ...READING, at: '2026-02-30' }] },
      'readings[0].at: "2026-02-30"',
    ],
    ['an offset that is none', { readings: [{ ...READING, at: '2026-06-16T05:35:00+99:00' }] }, 'readings[0].at:'],
    ['no marks', { readings: [{ at: '2026-06-16' }] }, 'readings[0].marks: must be a list, is missing'],
    ['an unknown state', withMark({ state: 'pupa' }), 'readings[0].marks[1].state: must be one of unread, empty,'],
    ['a broken address', withMark({ q: 0.5 }), 'readings[0].marks[1].q: must be a whole number, is 0.5'],
    ['an address off the comb', withMark({ q: 41 }), 'readings[0].marks[1]: cell 41,0 lies further than 40'],
    ['a cell marked twice', withMark({ q: 0 }), 'readings[0].marks[1]: cell 0,0 is marked a second time'],
    [
      'an instar of 6',
      withMark({ state: 'large', instar: 6 }),
      'readings[0].marks[1].instar: must be between 1 and 5, is 6',
    ],
    [
      'a flag that is a text',
      withMark({ nectar: 'yes' }),
      'readings[0].marks[1].nectar: must be true or false, is a string',
    ],
    ['an unknown zone', { readings: [READING], zone: 'Mars/Base' }, 'zone: "Mars/Base" is not a time zone'],
    ['a number for a taxon', { readings: [READING], taxon: 3 }, 'taxon: must be a text, is a number'],
    ['a text for a temperature', { readings: [READING], temperature: 'warm' }, 'temperature: must be an object'],
    [
      'a setting that is none',
      { readings: [READING], settings: { lossEggs: 1 } },
      'settings.lossEggs: is not a setting',
    ],
    [
      'a setting out of bounds',
      { readings: [READING], settings: { cvEgg: 0 } },
      'settings.cvEgg: must be between 0.05 and 1, is 0',
    ],
    [
      'a trust word that is none',
      { readings: [READING], settings: { cvEgg: { value: 0.2, trust: 'high' } } },
      'settings.cvEgg.trust:',
    ],
    [
      'a duration of nothing',
      { readings: [READING], settings: { durations: [{ taxon: 'x', egg: 0 }] } },
      'settings.durations[0].egg:',
    ],
    ['a temperature of no kind', { readings: [READING], temperature: { kind: 'air' } }, 'temperature.kind: must be'],
    [
      'a day whose maximum lies below its minimum',
      { readings: [READING], temperature: { days: [{ date: '2026-06-01', min: 20, max: 12 }] } },
      'temperature.days[0].max: must be between 20 and 70',
    ],
    [
      'a day that comes twice',
      { readings: [READING], temperature: { days: [1, 2].map(() => ({ date: '2026-06-01', min: 2, max: 12 })) } },
      'temperature.days[1]: is of the same time',
    ],
    [
      'a temperature no nest ever had',
      { readings: [READING], temperature: { readings: [{ at: '2026-06-01T00:00:00Z', celsius: 212 }] } },
      'temperature.readings[0].celsius: must be between -40 and 70, is 212',
    ],
    [
      'a confusion row that does not sum to 1',
      { readings: [READING], settings: { confusion: { rows: { egg: { egg: 0.9 } } } } },
      'settings.confusion.rows.egg: row egg: sums to 0.9',
    ],
    [
      'a number of generations that is not whole',
      { readings: [READING], settings: { generations: 2.5 } },
      'settings.generations: must be a whole number',
    ],
    ['no reading and no day asked for', { readings: [] }, 'asOf: is needed when there is no reading'],
  ])('%s', (_, value, line) => {
    expect(refusal(value)).toContain(line);
    expect(refusal(value)).not.toContain('\n');
  });

  it('text that is not JSON', () => {
    const result = parseNestFile('{"readings": [}');
    expect(result).toMatchObject({ ok: false });
    expect(!result.ok && result.error).toMatch(/^file: not JSON/);
  });
});
