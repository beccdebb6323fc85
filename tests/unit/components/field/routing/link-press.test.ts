import { describe, expect, test } from 'vitest';
import { innerTarget, type LinkPress } from '@/components/field/routing/link-press';

const ORIGIN = 'http://127.0.0.1:3000';

const press = (part: Partial<LinkPress>) =>
  innerTarget({
    href: `${ORIGIN}/field/unsent`,
    origin: ORIGIN,
    button: 0,
    modified: false,
    elsewhere: false,
    ...part,
  });

describe('a pressed link', () => {
  test('within the field app is followed without loading a document', () => {
    expect(press({})).toBe('/field/unsent');
    expect(press({ href: `${ORIGIN}/field` })).toBe('/field');
  });

  test.each<[string, Partial<LinkPress>]>([
    ['to the sign-in page', { href: `${ORIGIN}/sign-in?callbackUrl=/field` }],
    ['to a path that only begins alike', { href: `${ORIGIN}/fieldwork` }],
    ['to another site', { href: 'http://example.org/field' }],
    ['to a telephone number', { href: 'tel:112' }],
    ['with another button', { button: 1 }],
    ['with a key held for a new tab', { modified: true }],
    ['that names a frame or a download', { elsewhere: true }],
  ])('%s is left to the browser', (_, part) => {
    expect(press(part)).toBeNull();
  });
});
