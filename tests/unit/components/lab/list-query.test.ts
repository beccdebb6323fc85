import { describe, expect, it } from 'vitest';
import { addressWith, nextSort, readListQuery } from '@/components/lab/list-query';

describe('the address of the nests list', () => {
  it('is read as it was written', () => {
    const query = {
      q: 'roof',
      taxon: 'Polistes fuscatus',
      from: '2026-05-01',
      to: '2026-06-30',
      sort: '-cells',
      page: 2,
    };
    const params = Object.fromEntries(new URLSearchParams(addressWith('/nests', query).split('?')[1]));
    expect(readListQuery(params)).toEqual(query);
  });

  it('leaves out what is blank or makes no sense, so that an old bookmark still opens', () => {
    const query = readListQuery({ q: '  ', from: '2026-02-31x', to: 'soon', sort: 'password', page: '-3' });
    expect(addressWith('/nests', { ...query })).toBe('/nests');
  });

  it('leaves out a day that its month does not have', () => {
    expect(readListQuery({ from: '2026-02-30' }).from).toBeUndefined();
    expect(readListQuery({ from: '2026-13-01' }).from).toBeUndefined();
    expect(readListQuery({ from: '2028-02-29' }).from).toBe('2028-02-29');
  });

  it('takes the first of a repeated parameter and keeps a search within its length', () => {
    expect(readListQuery({ q: ['a', 'b'] }).q).toBe('a');
    expect(readListQuery({ q: 'x'.repeat(500) }).q).toHaveLength(200);
  });

  it('escapes what a person typed', () => {
    expect(addressWith('/nests', { q: 'a&b=c d' })).toBe('/nests?q=a%26b%3Dc+d');
  });

  it('sorts up first, then down', () => {
    expect(nextSort(undefined, 'code')).toBe('code');
    expect(nextSort('code', 'code')).toBe('-code');
    expect(nextSort('-code', 'code')).toBe('code');
  });
});
