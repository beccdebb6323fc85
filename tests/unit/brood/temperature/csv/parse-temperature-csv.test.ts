import { describe, expect, it } from 'vitest';
import { parseTemperatureCsv } from '@/lib/brood/temperature/csv/parse-temperature-csv';
import type { FileAnswers } from '@/lib/brood/temperature/csv/layout';

const ZONE = 'America/New_York';
const parse = (lines: readonly string[], answers?: FileAnswers) => parseTemperatureCsv(lines.join('\n'), ZONE, answers);

/** What was read, or a failure that shows why nothing was. */
function read(lines: readonly string[], answers?: FileAnswers) {
  const parsed = parse(lines, answers);
  if (parsed.kind !== 'read') throw new Error(JSON.stringify(parsed));
  return parsed;
}

function readingsOf(lines: readonly string[], answers?: FileAnswers) {
  const { record } = read(lines, answers);
  if (record.kind !== 'logger') throw new Error('a daily record');
  return record.readings.map(({ at, celsius }) => [
    new Date(at).toISOString().slice(0, 16),
    Number(celsius.toFixed(4)),
  ]);
}

const codes = (lines: readonly string[]) => read(lines).notes.map(({ code, line }) => [code, line]);

/** 05:00 and 06:00 in the nest's summer time, as two of the layouts below write it. */
const FIVE_AND_SIX = [
  ['2026-06-16T09:00', 21.5],
  ['2026-06-16T10:00', 22],
];

describe('the layouts of loggers', () => {
  it.each<[string, string[]]>([
    [
      'ISO with the offset',
      ['timestamp,temperature_c', '2026-06-16T05:00:00-04:00,21.5', '2026-06-16T06:00:00-04:00,22'],
    ],
    ['ISO in UTC', ['time,°C', '2026-06-16T09:00:00Z,21.5', '2026-06-16T10:00:00Z,22']],
    ['no header', ['2026-06-16 05:00,21.5', '2026-06-16 06:00,22']],
    ['semicolons and decimal commas', ['Zeit;Temperatur [°C]', '16.06.2026 05:00;21,5', '16.06.2026 06:00;22,0']],
    ['tabs, date and time apart', ['Date\tTime\tTemp (C)', '16/06/2026\t05:00:00\t21.5', '16/06/2026\t06:00:00\t22.0']],
    [
      'quotes, half days and °F',
      ['"#","Date Time","Temp, °F"', '1,"06/16/26 05:00:00 AM","70.7"', '2,"06/16/26 06:00:00 AM","71.6"'],
    ],
    [
      'the unit in a column of its own',
      ['Date/Time,Unit,Value', '6/16/26 5:00:00 AM,C,21.5', '6/16/26 6:00:00 AM,C,22'],
    ],
    [
      'a title above and humidity beside',
      [
        'Plot: eaves',
        'No.,Time,Temperature(°C),Humidity(%RH),Dew Point(°C)',
        '1,2026/06/16 05:00:00,21.5,60,13',
        '2,2026/06/16 06:00:00,22.0,61,13',
      ],
    ],
    ['the offset in the heading', ['Date Time (GMT-04:00),Temp °C', '2026-06-16 05:00,21.5', '2026-06-16 06:00,22']],
    ['the month by name', ['when;°C', '16-Jun-2026 05:00;21.5', '16-Jun-2026 06:00;22']],
    ['units behind the numbers', ['when,value', '2026-06-16 05:00,21.5 °C', '2026-06-16 06:00,22.0 °C']],
  ])('reads %s', (_name, lines) => {
    expect(readingsOf(lines)).toEqual(FIVE_AND_SIX);
    expect(read(lines).notes).toEqual([]);
  });

  it('says how it read the file', () => {
    expect(read(['x', 'Zeit;Temperatur', '16.06.2026 05:00;21,5'])).toMatchObject({
      layout: {
        ...{ kind: 'logger', delimiter: ';', decimal: ',', order: 'dmy', headerLine: 2, unit: 'C', unitFrom: 'values' },
        columns: { time: 'Zeit', temperature: 'Temperatur' },
        clock: 'local',
      },
    });
  });

  it('reads lowest and highest of each day', () => {
    const { record, layout } = read(['date,tmin,tmax', '2026-06-16,12.5,27', '2026-06-17,13,28']);
    expect(layout).toMatchObject({ kind: 'daily', columns: { temperature: 'tmin, tmax' } });
    expect(record).toEqual({
      kind: 'daily',
      days: [
        { date: '2026-06-16', min: 12.5, max: 27 },
        { date: '2026-06-17', min: 13, max: 28 },
      ],
    });
  });
});

describe('what a file leaves open is asked', () => {
  const ambiguous = ['date,temp °C', '03/06/2026 05:00,20', '04/06/2026 05:00,21'];

  it('asks for the order of dates that can be read both ways, and follows the answer', () => {
    expect(parse(ambiguous)).toMatchObject({ kind: 'questions', questions: [{ code: 'date-order' }] });
    expect(readingsOf(ambiguous, { order: 'dmy' })[0]).toEqual(['2026-06-03T09:00', 20]);
    expect(readingsOf(ambiguous, { order: 'mdy' })[0]).toEqual(['2026-03-06T10:00', 20]);
  });

  it('does not ask when one date settles it, even against an answer', () => {
    expect(readingsOf([...ambiguous, '13/06/2026 05:00,22'], { order: 'mdy' })[0]).toEqual(['2026-06-03T09:00', 20]);
  });

  it('refuses dates that contradict each other', () => {
    expect(parse(['d,temp °C', '13/06/2026 05:00,20', '06/14/2026 05:00,20'])).toMatchObject({ kind: 'unreadable' });
  });

  it('asks for the unit when none is named and values go above 45', () => {
    const lines = ['time,temperature', '2026-06-16 05:00,70.7', '2026-06-16 06:00,71.6'];
    expect(parse(lines)).toMatchObject({ kind: 'questions', questions: [{ code: 'unit' }] });
    expect(readingsOf(lines, { unit: 'F' })).toEqual(FIVE_AND_SIX);
  });

  it('asks which of two temperatures hangs at the nest', () => {
    const lines = ['time,temp nest °C,temp shade °C', '2026-06-16 05:00,21.5,19', '2026-06-16 06:00,22,19'];
    expect(parse(lines)).toMatchObject({
      kind: 'questions',
      questions: [{ code: 'column', choices: [{ value: '1' }, { value: '2' }] }],
    });
    expect(readingsOf(lines, { column: 1 })).toEqual(FIVE_AND_SIX);
  });
});

describe('what is strange is reported with its line', () => {
  const file = (...rows: string[]) => ['time,temp °C', ...rows.map((row) => `2026-06-16 ${row}`)];

  it('reports equal and differing duplicates and keeps the first', () => {
    const lines = file('05:00,20', '05:00,20', '06:00,21', '06:00,23');
    expect(codes(lines)).toEqual([
      ['duplicate', 3],
      ['duplicate-differs', 5],
    ]);
    expect(readingsOf(lines).map(([, celsius]) => celsius)).toEqual([20, 21]);
  });

  it('puts a line out of order where it belongs', () => {
    const lines = file('05:00,20', '07:00,22', '06:00,21');
    expect(codes(lines)).toEqual([['out-of-order', 4]]);
    expect(readingsOf(lines).map(([, celsius]) => celsius)).toEqual([20, 21, 22]);
  });

  it('leaves out impossible values, words, empty cells and days that do not exist', () => {
    const lines = [...file('05:00,20', '06:00,-127.9', '07:00,ERR', '08:00,'), '2026-02-30 05:00,20'];
    expect(codes(lines)).toEqual([
      ['impossible', 3],
      ['unreadable-value', 4],
      ['unreadable-value', 5],
      ['unreadable-time', 6],
    ]);
  });

  it('leaves out an hour that the clocks skipped and reads the doubled hour twice', () => {
    const spring = ['t,°C', '2026-03-08 01:30,10', '2026-03-08 02:30,10', '2026-03-08 03:30,10'];
    expect(codes(spring)).toEqual([['skipped-hour', 3]]);
    const autumn = ['t,°C', '2026-11-01 00:30,9', '2026-11-01 01:30,8', '2026-11-01 01:30,7', '2026-11-01 02:30,6'];
    expect(readingsOf(autumn)).toEqual([
      ['2026-11-01T04:30', 9],
      ['2026-11-01T05:30', 8],
      ['2026-11-01T06:30', 7],
      ['2026-11-01T07:30', 6],
    ]);
  });

  it('leaves out a day whose lowest is above its highest, and a date given twice', () => {
    const lines = ['date,min °C,max °C', '2026-06-16,12,25', '2026-06-17,25,12', '2026-06-16,12,26'];
    expect(codes(lines)).toEqual([
      ['impossible', 3],
      ['duplicate-differs', 4],
    ]);
  });
});

describe('what cannot be read', () => {
  it.each([
    ['an empty text', ''],
    ['prose', 'It was warm.\nThen it was not.'],
    ['dates without temperatures', 'time,note\n2026-06-16 05:00,warm'],
    ['numbers without dates', 'a,b\n1,2\n3,4'],
  ])('says so for %s', (_name, text) => {
    expect(parseTemperatureCsv(text, ZONE)).toMatchObject({ kind: 'unreadable', reason: expect.stringMatching(/\.$/) });
  });

  it('gives a reason when every value is impossible', () => {
    expect(parse(['t,°C', '2026-06-16 05:00,300'])).toMatchObject({
      kind: 'unreadable',
      reason: expect.stringContaining('Line 2'),
    });
  });
});
