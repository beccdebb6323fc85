import { describe, expect, it } from 'vitest';
import { parseExportQuery } from '@/lib/server/export/export-query';
import { HttpProblem } from '@/lib/server/http/problem';
import { instantText } from '@/lib/server/presenters/instant-text';
import { parseAsOf } from '@/lib/server/queries/as-of';
import { instantRange, parseLocalDate } from '@/lib/server/queries/local-date-range';
import { parseNestListQuery } from '@/lib/server/queries/nest-list-query';

const ZONE = 'America/New_York';
const iso = (ms: number) => new Date(ms).toISOString();

describe('parseLocalDate', () => {
  it.each(['2026-06-16', '2024-02-29', '1000-01-01', '9999-12-30'])('takes %s', (date) => {
    expect(parseLocalDate(date)).toBe(date);
  });

  it.each([
    '2026-02-29',
    '2026-06-31',
    '2026-00-10',
    '2026-13-01',
    '0999-12-31',
    '9999-12-31',
    '20260616',
    ' 2026-06-16',
    '+002026-06-16',
    '',
  ])('refuses %j', (text) => {
    expect(() => parseLocalDate(text)).toThrow(HttpProblem);
  });
});

describe('instantRange', () => {
  it('runs from local midnight to local midnight after the last day, over a change of clocks', () => {
    const { from, before } = instantRange({ from: '2026-03-07', to: '2026-03-08' }, ZONE);
    expect([from?.toISOString(), before?.toISOString()]).toEqual([
      '2026-03-07T05:00:00.000Z',
      '2026-03-09T04:00:00.000Z',
    ]);
    expect(instantRange({}, ZONE)).toEqual({ from: null, before: null });
  });
});

describe('parseAsOf', () => {
  it('takes an instant as it is, also where a query string ate the plus', () => {
    expect(iso(parseAsOf('2026-06-16T12:00:00Z', ZONE, 0))).toBe('2026-06-16T12:00:00.000Z');
    expect(iso(parseAsOf('2026-06-16T05:41:07.120-04:00', ZONE, 0))).toBe('2026-06-16T09:41:07.120Z');
    expect(iso(parseAsOf('2026-06-16T12:00+02:00', ZONE, 0))).toBe('2026-06-16T10:00:00.000Z');
    expect(iso(parseAsOf('2026-06-16T12:00 02:00', ZONE, 0))).toBe('2026-06-16T10:00:00.000Z');
  });

  it('takes a date, and today when nothing is said, to the end of that day at the nest', () => {
    expect(iso(parseAsOf('2026-06-16', ZONE, 0))).toBe('2026-06-17T03:59:59.999Z');
    const morning = Date.parse('2026-06-16T09:00:00Z');
    const evening = Date.parse('2026-06-17T03:00:00Z');
    expect(iso(parseAsOf(undefined, ZONE, morning))).toBe('2026-06-17T03:59:59.999Z');
    expect(parseAsOf(undefined, ZONE, evening)).toBe(parseAsOf(undefined, ZONE, morning));
  });

  it.each(['', 'now', '2026-06-16T12:00:00', '2026-06-16T24:00:01Z', '2026-06-16T12:00:00+99:00', '1781602867120'])(
    'refuses %j',
    (text) => {
      expect(() => parseAsOf(text, ZONE, 0)).toThrow(HttpProblem);
    },
  );
});

describe('parseNestListQuery and parseExportQuery', () => {
  it('take a field that a form left blank for one that is not there', () => {
    const blank = { q: '', taxon: '', from: '', to: '', sort: '', page: '' };
    expect(parseNestListQuery(blank)).toEqual(parseNestListQuery({}));
    expect(parseNestListQuery({})).toMatchObject({ sort: 'code', descending: false, page: 1 });
    expect(parseExportQuery({ nest: '', taxon: '', from: '', to: '', for: '' })).toEqual(parseExportQuery({}));
    expect(parseExportQuery({}).form).toBe('exact');
  });

  it('read a leading minus as descending', () => {
    expect(parseNestListQuery({ sort: '-lastVisitAt', page: '3' })).toMatchObject({
      sort: 'lastVisitAt',
      descending: true,
      page: 3,
    });
  });
});

describe('instantText', () => {
  it('keeps what was written while everybody reads the same instant from it', () => {
    const written = '2026-06-16T05:41:07.120-04:00';
    expect(instantText(written, new Date('2026-06-16T09:41:07.120Z'))).toBe(written);
  });

  it.each(['2026-06-16T05:41:07.120', '2026-06-16T05:41:60-04:00', 'half past five'])(
    'writes the stored instant for %j',
    (written) => {
      expect(instantText(written, new Date('2026-06-16T09:41:07.120Z'))).toBe('2026-06-16T09:41:07.120Z');
    },
  );
});
