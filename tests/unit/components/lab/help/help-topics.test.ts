import { expect, it } from 'vitest';
import { helpFor } from '@/components/lab/help/help-topics';

it('tells a nest from the list of nests and from a reading of one', () => {
  const pages = [
    '/nests',
    '/nests/x',
    '/nests/x/readings/y',
    '/hosts',
    '/downloads',
    '/members',
    '/phones',
    '/account',
  ];
  const words = pages.map((path) => helpFor(path)?.[0]);
  expect(words).not.toContain(undefined);
  expect(new Set(words).size).toBe(pages.length);
});

it('keeps quiet on a page that explains itself', () => {
  expect(helpFor('/start')).toBeNull();
});
