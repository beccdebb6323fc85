import { describe, expect, it } from 'vitest';
import type { CsvColumn, CsvFile, CsvType, CsvValue } from '@/lib/csv/column';
import { type CsvForm, writeHeader, writeRow } from '@/lib/csv/write-row';
import vectors from '@/tests/fixtures/csv/csv.json';
import { parseCsv } from '@/tests/support/csv/parse-csv';

/** A file of untitled columns of the given types; a row is its values. */
function fileOf(types: readonly CsvType[]): CsvFile<readonly CsvValue[]> {
  const columns = types.map((type, index): CsvColumn<readonly CsvValue[]> => ({
    name: `c${index}`,
    label: '',
    unit: '',
    type,
    allowed: '',
    required: false,
    blankMeans: '',
    since: '',
    value: (row) => row[index] ?? null,
  }));
  return { name: 'test.csv', columns };
}

function written(values: readonly CsvValue[], form: CsvForm = 'exact', type: CsvType = 'free text'): string {
  return writeRow(fileOf(values.map(() => type)), values, form);
}

describe('the test parser against RFC 4180 (tests/fixtures/csv/csv.json)', () => {
  it.each(vectors.parse)('$name', ({ text, records }) => {
    expect(parseCsv(text)).toEqual(records);
  });

  it('refuses what RFC 4180 does not allow', () => {
    expect(() => parseCsv('a"b,c\r\n')).toThrow('quote inside');
    expect(() => parseCsv('"a"b,c\r\n')).toThrow('expected CRLF');
    expect(() => parseCsv('"a')).toThrow('never ends');
    expect(() => parseCsv('a\nb')).toThrow('expected CRLF');
  });
});

describe('writeRow', () => {
  it.each(vectors.parse.flatMap(({ name, records }) => records.map((record) => ({ name, record }))))(
    'writes records that read back the same: $name $record',
    ({ record }) => {
      for (const form of ['exact', 'spreadsheet'] as const) expect(parseCsv(written(record, form))).toEqual([record]);
    },
  );

  it('quotes only where RFC 4180 section 2 rules 6 and 7 ask for it', () => {
    expect(written(['aaa', 'b\r\nbb', 'ccc'])).toBe('aaa,"b\r\nbb",ccc\r\n');
    expect(written(['aaa', 'b"bb', 'ccc'])).toBe('aaa,"b""bb",ccc\r\n');
    expect(written(['1', 'Perth, WA', '2'])).toBe('1,"Perth, WA",2\r\n');
    expect(written([' b ', "it's", 'a;b', ''])).toBe(" b ,it's,a;b,\r\n");
  });

  it('writes a blank for null, yes and no for booleans, a decimal point for numbers', () => {
    expect(written([null, true, false, 0, -77.6051, -0])).toBe(',yes,no,0,-77.6051,0\r\n');
  });

  it('ends every row, the header too, with CRLF', () => {
    expect(writeHeader(fileOf(['word', 'word']), 'exact')).toBe('c0,c1\r\n');
    expect(written(['x'])).toBe('x\r\n');
  });

  it('puts a byte order mark before the spreadsheet header and nowhere else', () => {
    expect(writeHeader(fileOf(['word']), 'spreadsheet')).toBe('\ufeffc0\r\n');
    expect(written(['x'], 'spreadsheet')).toBe('x\r\n');
  });

  it.each(vectors.injection)('guards $kind "$value" for spreadsheets', ({ value, kind, safe }) => {
    const row =
      kind === 'number'
        ? written([Number(value)], 'spreadsheet', 'decimal')
        : written([value], 'spreadsheet', 'free text');
    expect(parseCsv(row)).toEqual([[safe]]);
  });

  it.each(['=1', '+1', '-1', '@a', '\tx', '\rx', '\nx', '\uff1d1'])('guards free text that begins like %j', (text) => {
    expect(parseCsv(written([text], 'spreadsheet'))).toEqual([[`'${text}`]]);
  });

  it.each(['=1', '-1', '@a', '\uff1d1'])(
    'leaves %j as it is in the exact form, and in columns nobody types in',
    (text) => {
      expect(parseCsv(written([text], 'exact'))).toEqual([[text]]);
      for (const type of ['word', 'uuid', 'date', 'date-time'] as const) {
        expect(parseCsv(written([text], 'spreadsheet', type))).toEqual([[text]]);
      }
    },
  );

  it('keeps emoji, joiners, combining and right-to-left marks as they came', () => {
    const text = '👩‍🔬 e\u0301 \u202eabc \u05d0';
    expect(parseCsv(written([text]))).toEqual([[text]]);
  });

  it('quotes semicolons and tabs for spreadsheets, which may split there', () => {
    expect(written(['a;=1', 'b\tc'], 'spreadsheet')).toBe('"a;=1","b\tc"\r\n');
  });
});
