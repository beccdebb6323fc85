import { expect, it } from 'vitest';
import { CAUTIONS, TRUST_MEANINGS, UNKNOWNS, settingWords } from '@/components/lab/start/limits';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';

it('explains every word of trust that a default carries', () => {
  const explained = TRUST_MEANINGS.map(({ trust }) => trust);
  const used = [...Object.values(DEFAULT_SETTINGS.values), ...DEFAULT_SETTINGS.durations].map(({ trust }) => trust);
  for (const trust of used) expect(explained).toContain(trust);
});

it('tells a number with at most three decimals and its unit', () => {
  expect(settingWords(1 / 3, '')).toBe('0.333');
  expect(settingWords(7, 'days')).toBe('7 days');
  expect(settingWords(1, 'days')).toBe('1 day');
  expect(settingWords(0.002, 'per day')).toBe('0.002 per day');
});

it('promises nothing', () => {
  for (const { title, words } of [...CAUTIONS, ...UNKNOWNS]) {
    expect(`${title} ${words}`).not.toMatch(/harmless|\bsafe\b|guarante|saved/i);
  }
});
