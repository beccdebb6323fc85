import { describe, expect, it } from 'vitest';
import type { BroodMark } from '@/lib/brood/input';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { estimate, reading, settingsWith } from './support';

const AT = '2026-06-10T14:00:00Z';
const MARKS: BroodMark[] = [
  { q: 0, r: 0, state: 'capped' },
  { q: 1, r: -1, state: 'egg' },
];
const digest = (marks: BroodMark[], rest = {}) => estimate([reading(AT, marks)], rest).inputDigest;

describe('the text behind an input digest', () => {
  it('does not depend on the order of marks, on nectar or on the hour of the day asked for', () => {
    const same = digest(MARKS);
    expect(digest([...MARKS].reverse())).toBe(same);
    expect(digest(MARKS.map((mark) => ({ ...mark, nectar: true })))).toBe(same);
    expect(digest(MARKS, { asOf: Date.parse(AT) + 3_600_000 })).toBe(same);
  });

  it.each([
    ['a state', digest([{ q: 0, r: 0, state: 'large' }, ...MARKS.slice(1)])],
    ['an instar', digest([{ q: 0, r: 0, state: 'capped', instar: 5 }, ...MARKS.slice(1)])],
    ['a reuse mark', digest([{ q: 0, r: 0, state: 'capped', reused: true }, ...MARKS.slice(1)])],
    ['the taxon row', digest(MARKS, { taxon: 'Polistes simillimus' })],
    ['a number of the settings', digest(MARKS, { settings: settingsWith({ lossEgg: 0.02 }) })],
    ['the settings version', digest(MARKS, { settings: { ...DEFAULT_SETTINGS, version: 'other' } })],
    ['the zone', digest(MARKS, { zone: 'UTC' })],
    ['the day asked for', digest(MARKS, { asOf: Date.parse(AT) + 86_400_000 })],
  ])('changes with %s', (_, changed) => {
    expect(changed).not.toBe(digest(MARKS));
  });
});
