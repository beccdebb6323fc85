import { type Page, expect } from '@playwright/test';
import { WireClient } from '@/tests/support/wire/wire-client';

/** Ids of the demo season that screens are about. */
export interface KnownIds {
  nest: string;
  visit: string;
  reading: string;
}

interface NestAnswer {
  visits: { id: string; readings: { id: string; kind: string }[] }[];
}

/** The nest of the demo season that is recorded to the cell. */
export async function knownIds(origin: string): Promise<KnownIds> {
  const reviewer = new WireClient(origin);
  await reviewer.signIn('reviewer@tarrow.example');
  const { nests } = await reviewer.get<{ nests: { id: string; code: string }[] }>('/api/nests?q=N12');
  const nest = nests.find(({ code }) => code === 'N12')?.id ?? '';
  const { visits } = await reviewer.get<NestAnswer>(`/api/nests/${nest}`);
  const visit = visits.find(({ readings }) => readings.some(({ kind }) => kind === 'final'));
  return { nest, visit: visit?.id ?? '', reading: visit?.readings.find(({ kind }) => kind === 'field')?.id ?? '' };
}

/** Every screen of the field app that has a path, with what is on it when it is ready. */
export const FIELD_SCREENS: readonly { name: string; path: (known: KnownIds) => string }[] = [
  { name: 'nests', path: () => '/field' },
  { name: 'new-nest', path: () => '/field/nests/new' },
  { name: 'nest', path: ({ nest }) => `/field/nests/${nest}` },
  { name: 'new-visit', path: ({ nest }) => `/field/nests/${nest}/visits/new` },
  { name: 'visit', path: ({ visit }) => `/field/visits/${visit}` },
  { name: 'reading', path: ({ reading }) => `/field/readings/${reading}` },
  { name: 'sheet', path: ({ nest }) => `/field/nests/${nest}/sheet` },
  { name: 'blank-sheet', path: () => '/field/sheet' },
  { name: 'typed', path: ({ visit }) => `/field/visits/${visit}/typed` },
  { name: 'unsent', path: () => '/field/unsent' },
  { name: 'bring-in', path: () => '/field/unsent/bring-in' },
  { name: 'settings', path: () => '/field/settings' },
  { name: 'unknown', path: () => '/field/nothing-here' },
];

/** Waits until what the page asks for has come and nothing on it is busy. */
export async function settled(page: Page): Promise<void> {
  await page.waitForLoadState('load');
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0, { timeout: 20_000 });
  await page.evaluate(() => document.fonts.ready);
}

/** How much wider than the screen the page is, in CSS pixels. */
export function overhang(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
}

/** Something to press that is smaller than it should be. */
export interface SmallTarget {
  what: string;
  width: number;
  height: number;
}

/**
 * Everything to press on the page that is smaller than `least` CSS pixels on a side. Links within a sentence and the
 * cells of a comb are left out: the first have their text around them, the second never have to be aimed at.
 */
export function smallTargets(page: Page, least: number): Promise<SmallTarget[]> {
  return page.evaluate((limit) => {
    const targets = [...document.querySelectorAll('a[href], button, input, select, textarea, summary')];
    const seen = targets.flatMap((element) => {
      const target = element.matches('input[type="radio"]') ? (element.closest('label') ?? element) : element;
      const { width, height } = target.getBoundingClientRect();
      const inSentence = element.matches('p > a, li > a, p a') && getComputedStyle(element).display === 'inline';
      const hidden = width <= 1 || height <= 1 || !element.checkVisibility();
      if (inSentence || hidden || (width >= limit - 0.5 && height >= limit - 0.5)) return [];
      const name = element.getAttribute('aria-label') ?? element.textContent;
      return [{ what: `${element.tagName} ${name.trim().slice(0, 60)}`, width, height }];
    });
    return seen;
  }, least);
}
