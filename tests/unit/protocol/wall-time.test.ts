import { describe, expect, it } from 'vitest';
import { parseWall } from '@/lib/protocol/wall-time';

function ms(text: string): number {
  const parsed = parseWall(text);
  if (!parsed.ok) throw new Error(parsed.error);
  return parsed.value.epochMs;
}

describe('a wall time', () => {
  it.each([
    '2026-06-16T05:41:07.120-04:00',
    '2026-06-16T05:41:07Z',
    '2024-02-29T23:59:59.999+14:00',
    '2026-06-16T05:41+05:30',
    '1999-12-31T00:00:00.5-12:00',
  ])('with an offset is the instant the platform reads: %s', (text) => {
    expect(parseWall(text)).toEqual({ ok: true, value: { epochMs: Date.parse(text), odd: false } });
  });

  it('may name its zone in brackets (RFC 9557)', () => {
    expect(ms('2026-06-16T05:41:07-04:00[America/New_York]')).toBe(Date.parse('2026-06-16T05:41:07-04:00'));
  });

  it.each([
    ['24:00 is the next midnight', '2026-06-16T24:00:00-04:00', '2026-06-17T00:00:00-04:00'],
    ['a leap second is the first of the next minute', '2016-12-31T23:59:60Z', '2017-01-01T00:00:00Z'],
    ['without an offset it is read as UTC', '2026-06-16T05:41:07', '2026-06-16T05:41:07Z'],
    ['a date alone is its midnight', '2026-06-16', '2026-06-16T00:00:00Z'],
    ['the year 1 is the year 1', '0001-01-01T00:00:00Z', '0001-01-01T00:00:00Z'],
    ['the year 9999 is the year 9999', '9999-12-31T23:59:59Z', '9999-12-31T23:59:59Z'],
  ])('may be odd, and then says so: %s', (_what, text, same) => {
    expect(parseWall(text)).toEqual({ ok: true, value: { epochMs: Date.parse(same), odd: true } });
  });

  it.each([
    '2026-13-40',
    '2026-02-29T00:00:00Z',
    '2026-06-16T24:00:01Z',
    '2026-06-16T25:00:00Z',
    '2026-06-16T05:60:00Z',
    '1781602867120',
    '16.6.2026',
    'now',
    '',
    `2026-06-16T05:41:07Z${' '.repeat(100)}`,
  ])('that does not exist is refused as time: %j', (text) => {
    expect(parseWall(text)).toEqual({ ok: false, error: 'time' });
  });

  it.each([
    '2026-06-16T05:41:07+26:00',
    '2026-06-16T05:41:07-04:75',
    '2026-06-16T05:41:07+14:01',
    '2026-06-16T05:41:07[Europe/Nowhere]',
    '2026-06-16T05:41:07-04:00[Europe/Nowhere]',
    '2026-06-16T05:41:07 Europe/Nowhere',
    '2026-06-16T05:41:07EST',
  ])('with a zone nobody uses is refused as tz: %s', (text) => {
    expect(parseWall(text)).toEqual({ ok: false, error: 'tz' });
  });
});
