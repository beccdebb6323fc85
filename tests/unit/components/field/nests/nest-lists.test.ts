import { describe, expect, test } from 'vitest';
import { findNests, nestTitle, splitByDay } from '@/components/field/nests/nest-lists';
import type { NestSummary } from '@/lib/offline/nest-view';

const TODAY = '2026-06-16';

function nest(code: string, part: Partial<NestSummary> = {}): NestSummary {
  return {
    id: code,
    code,
    name: null,
    taxon: null,
    place: null,
    openedAt: '2026-05-01T08:00:00.000-04:00',
    visits: 0,
    lastVisitAt: null,
    lastReadingId: null,
    archived: false,
    standing: 'at-office',
    waiting: 0,
    ...part,
  };
}

const codes = (nests: readonly NestSummary[]) => nests.map(({ code }) => code);

describe('the nests of the day', () => {
  test('are those visited or opened today and those with unsent work, in the order they came', () => {
    const lists = splitByDay(
      [
        nest('visited', { lastVisitAt: '2026-06-16T05:35:00.000-04:00' }),
        nest('old', { lastVisitAt: '2026-06-15T05:35:00.000-04:00' }),
        nest('opened', { openedAt: '2026-06-16T05:30:00.000-04:00' }),
        nest('unsent', { waiting: 3 }),
      ],
      TODAY,
    );
    expect(codes(lists.today)).toEqual(['visited', 'opened', 'unsent']);
    expect(codes(lists.others)).toEqual(['old']);
  });

  test('leave out what was archived', () => {
    expect(splitByDay([nest('gone', { archived: true, waiting: 1 })], TODAY)).toEqual({ today: [], others: [] });
  });
});

test('a nest is found by the whole code of its paper sheet, however it is typed', () => {
  const id = '01890000-0000-7000-8000-00000000001f';
  const nests = [nest('N12', { id }), nest('N13', { id: '01890000-0000-7000-8000-00000000002f' })];
  expect(codes(findNests(nests, '2222-2222-222Z'))).toEqual(['N12']);
  expect(codes(findNests(nests, '22222222222z'))).toEqual(['N12']);
  expect(codes(findNests(nests, '2222-2222-222'))).toEqual([]);
});

test('a nest is found by code or name in any letter case', () => {
  const nests = [nest('N12', { name: 'Bandstand roof' }), nest('N07', { name: 'Tram depot' })];
  expect(codes(findNests(nests, ' BAND '))).toEqual(['N12']);
  expect(codes(findNests(nests, 'n07'))).toEqual(['N07']);
  expect(codes(findNests(nests, ''))).toEqual(['N12', 'N07']);
});

test('a nest is called by its name and code, or by its code alone', () => {
  expect(nestTitle({ code: 'N12', name: 'Bandstand roof' })).toBe('Bandstand roof ·\u00a0N12');
  expect(nestTitle({ code: 'N12', name: null })).toBe('N12');
});
