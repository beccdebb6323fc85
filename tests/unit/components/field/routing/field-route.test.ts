import { describe, expect, test } from 'vitest';
import { type FieldRoute, fieldHref, parseFieldPath } from '@/components/field/routing/field-route';

const ID = '0190a000-0000-7000-8000-000000000012';

const ROUTES: readonly [path: string, route: FieldRoute][] = [
  ['/field', { kind: 'nests' }],
  ['/field/nests/new', { kind: 'new-nest' }],
  [`/field/nests/${ID}`, { kind: 'nest', id: ID }],
  [`/field/nests/${ID}/visits/new`, { kind: 'new-visit', id: ID }],
  [`/field/visits/${ID}`, { kind: 'visit', id: ID }],
  [`/field/readings/${ID}`, { kind: 'reading', id: ID }],
  ['/field/unsent', { kind: 'unsent' }],
  ['/field/unsent/bring-in', { kind: 'bring-in' }],
  [`/field/nests/${ID}/sheet`, { kind: 'sheet', id: ID }],
  ['/field/sheet', { kind: 'blank-sheet' }],
  [`/field/visits/${ID}/typed`, { kind: 'typed', id: ID }],
  ['/field/settings', { kind: 'settings' }],
];

describe('a path of the field app', () => {
  test.each(ROUTES)('%s is read and written alike', (path, route) => {
    expect(parseFieldPath(path)).toEqual(route);
    expect(fieldHref(route)).toBe(path);
    expect(parseFieldPath(`${path}/`)).toEqual(route);
  });

  test.each([
    '/nests',
    '/fields',
    '/field/nothing',
    '/field/nests/12',
    `/field/nests/${ID.toUpperCase().replace('A', 'A')}`,
    `/field/nests/${ID}/visits`,
    `/field/readings/${ID}/edit`,
    `/field/other/${ID}`,
    '/field/__proto__',
    '/field/constructor',
  ])('%s is unknown', (path) => {
    expect(parseFieldPath(path)).toEqual({ kind: 'unknown' });
  });

  test('the unknown screen leads home', () => {
    expect(fieldHref({ kind: 'unknown' })).toBe('/field');
  });
});
