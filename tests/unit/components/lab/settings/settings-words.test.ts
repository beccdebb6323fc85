import { describe, expect, it } from 'vitest';
import { draftForm, readDraftForm, rowIn, typedSum } from '@/components/lab/settings/draft-form';
import { shiftWords } from '@/components/lab/settings/impact-section';
import { signedWords } from '@/components/lab/settings/signed-words';
import { DEFAULT_CONTENT } from '@/lib/brood/team-settings/content';

describe('how far a date would move, in words', () => {
  it.each([
    [{ before: '2026-05-06', after: '2026-05-03', days: -3 }, '3 days earlier'],
    [{ before: '2026-05-06', after: '2026-05-07', days: 1 }, '1 day later'],
    [{ before: '2026-05-06', after: '2026-05-06', days: 0 }, 'stays'],
    [{ before: '2026-05-06', after: null, days: null }, 'loses its date'],
    [{ before: null, after: '2026-05-06', days: null }, 'gets a date'],
    [{ before: null, after: null, days: null }, 'no date'],
  ])('%o is "%s"', (shift, words) => {
    expect(shiftWords(shift)).toBe(words);
  });
});

describe('a draft as it is typed', () => {
  it('says the same as the settings it was made from', () => {
    const read = readDraftForm(draftForm(DEFAULT_CONTENT));
    expect(read.ok && read.value.values).toEqual(DEFAULT_CONTENT.values);
    expect(read.ok && read.value.confusion).toEqual(DEFAULT_CONTENT.confusion);
  });

  it('takes a decimal comma, and names what is no number', () => {
    const form = draftForm(DEFAULT_CONTENT);
    const typed = (text: string) => {
      const values = { ...form.values, lossEgg: { text, trust: 'low' as const, source: 'own trial' } };
      return readDraftForm({ ...form, values });
    };
    const comma = typed('0,02');
    expect(comma.ok && comma.value.values.lossEgg?.value).toBe(0.02);
    const word = typed('few');
    expect(word.ok ? [] : word.error.map(({ field }) => field)).toEqual(['values.lossEgg']);
    expect(typed('').ok).toBe(false);
  });

  it('shows the sum of a row while it is typed', () => {
    const row = rowIn(draftForm(DEFAULT_CONTENT), 'egg');
    expect(typedSum(row)).toBeCloseTo(1, 12);
    expect(typedSum({ ...row, shares: { ...row.shares, empty: '0,5' } })).toBeCloseTo(1.45, 12);
    expect(typedSum({ ...row, shares: { egg: 'x' } })).toBeNaN();
  });
});

describe('a signed version in one line', () => {
  it('names who signed and when, in the team’s time', () => {
    const signed = { version: 2, signedBy: 'Ada Quill', signedAt: '2026-06-01T03:00:00.000Z', reason: 'x' };
    expect(signedWords(signed, 'America/New_York')).toBe('Version 2, signed by Ada Quill, 31 May 2026, 23:00');
    expect(signedWords({ version: 0, signedBy: null, signedAt: null, reason: null }, 'UTC')).toContain('defaults');
  });
});
