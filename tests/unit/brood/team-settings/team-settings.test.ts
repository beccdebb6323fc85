import { describe, expect, it } from 'vitest';
import { SETTING_RULES } from '@/lib/brood/settings';
import { checkContent } from '@/lib/brood/team-settings/check-content';
import { compareContent } from '@/lib/brood/team-settings/compare-content';
import type { TrueClass } from '@/lib/brood/team-settings/confusion-rows';
import { DEFAULT_CONTENT, type SettingsContent, contentText, storedContent } from '@/lib/brood/team-settings/content';
import { SETTING_GROUPS, SETTING_ITEMS, settingGroup } from '@/lib/brood/team-settings/setting-groups';

const own = { trust: 'low' as const, source: 'own trial' };
const textsOf = (content: SettingsContent) => checkContent(content).map(({ text }) => text);

function withValue(name: string, value: number): SettingsContent {
  return { ...DEFAULT_CONTENT, values: { ...DEFAULT_CONTENT.values, [name]: { value, ...own } } };
}

function withRow(name: TrueClass, row: Record<string, number>): SettingsContent {
  return { ...DEFAULT_CONTENT, confusion: { ...DEFAULT_CONTENT.confusion, [name]: { row, ...own } } };
}

describe('the registry of settings', () => {
  it('holds every number of the model once, and says what each does', () => {
    const names = SETTING_GROUPS.flatMap(({ items }) => items.map(({ name }) => name));
    expect(new Set(names).size).toBe(names.length);
    for (const name of Object.keys(SETTING_RULES)) expect(names).toContain(name);
    for (const { name, does } of SETTING_ITEMS.values())
      expect([name, does]).toEqual([name, expect.stringMatching(/\.$/)]);
  });

  it('takes a group of another part of the product from its rules and defaults', () => {
    const rules = {
      waiting: { label: 'how long', unit: 'days', min: 1, max: 9 },
      other: { label: 'x', unit: '', min: 0, max: 1 },
    };
    const group = settingGroup({ id: 'post', title: 'Post' }, rules, { waiting: { value: 3, ...own } });
    expect(group.items).toEqual([{ name: 'waiting', ...rules.waiting, does: '', default: { value: 3, ...own } }]);
  });
});

describe('settings are checked', () => {
  it('and the defaults can stand', () => {
    expect(checkContent(DEFAULT_CONTENT)).toEqual([]);
  });

  it('and a confusion row that does not add up to 1 is named', () => {
    expect(checkContent(withRow('L4', { medium: 0.88, small: 0.06 }))).toEqual([
      { field: 'confusion.L4', text: 'Confusion, row L4: the shares add up to 0.94, not to 1.' },
    ]);
    expect(textsOf(withRow('egg', { egg: 1.2, empty: -0.2 }))).toEqual([
      'Confusion, row egg: every share must be between 0 and 1.',
    ]);
    expect(textsOf(withRow('egg', { egg: 0.5, moth: 0.5 }))).toEqual([
      'Confusion, row egg: moth is not a class that can be recorded.',
    ]);
  });

  it.each([
    ['lossEgg', 1.5, 'Loss of eggs: must be between 0 and 1 per day.'],
    ['lossEgg', Number.NaN, 'Loss of eggs: must be between 0 and 1 per day.'],
    ['heatLimit', 34, null],
    ['wingspan', 2, 'wingspan is not a setting.'],
  ])('and %s = %d gives %s', (name, value, text) => {
    expect(textsOf(withValue(name, value))).toEqual(text === null ? [] : [text]);
  });

  it('and temperatures that leave durations nothing to be relative to are refused', () => {
    const [text] = textsOf(withValue('heatBase', 26)).filter((line) => line.startsWith('Durations of Polistes:'));
    // Above the bound of the base itself, so that both are said.
    expect(text).toBe('Durations of Polistes: 25 °C must lie above 26 °C and not above 33 °C.');
    const crossed = {
      ...withValue('heatPlateau', 40),
      values: { ...withValue('heatPlateau', 40).values, heatLimit: { value: 35, ...own } },
    };
    expect(textsOf(crossed)).toEqual([
      'No development above 35 °C: must not lie below the 40 °C above which it is no faster.',
    ]);
  });

  it('and durations need a row for Polistes, each taxon once, with days that can be', () => {
    const [first] = DEFAULT_CONTENT.durations;
    if (!first) throw new Error('no default durations');
    const durations = [{ ...first, egg: 0.1 }, first];
    expect(textsOf({ ...DEFAULT_CONTENT, durations })).toEqual([
      'Durations of Polistes exclamans: egg must last between 0.5 and 200 days.',
      'Durations of Polistes exclamans: the taxon stands there twice.',
      'Durations: a row for Polistes is needed; it serves every other taxon.',
    ]);
  });

  it('and a factor beyond twice as fast is not believed', () => {
    const durationFactors = [{ taxon: 'Polistes', logMean: 0.8, logSd: 0.2, ...own }];
    expect(textsOf({ ...DEFAULT_CONTENT, durationFactors })).toEqual([
      'Factor for Polistes: must lie between half and twice as fast.',
    ]);
  });

  it('and nothing is taken without a source', () => {
    const values = { ...DEFAULT_CONTENT.values, lossEgg: { value: 0.02, trust: 'low' as const, source: ' ' } };
    expect(textsOf({ ...DEFAULT_CONTENT, values })).toEqual(['Loss of eggs: say where it comes from.']);
  });
});

describe('settings are stored', () => {
  it('and read back as they were', () => {
    const content = withRow('egg', { egg: 0.9, empty: 0.1 });
    const durationFactors = [{ taxon: 'Polistes', logMean: -0.1, logSd: 0.2, ...own }];
    const whole = { ...content, durationFactors };
    expect(storedContent(contentText(whole), whole.durations)).toEqual(whole);
  });

  it('and what an older version lacks, or holds in another form, keeps the default', () => {
    const json = JSON.stringify({
      lossEgg: 'high',
      confusion: { egg: { row: { egg: 0.5 }, ...own } },
      durationFactors: 3,
    });
    expect(storedContent(json, [])).toEqual(DEFAULT_CONTENT);
  });
});

describe('two versions are compared', () => {
  it('and only what differs is listed, with trust and source', () => {
    const after = { ...withValue('lossEgg', 0.02), durations: DEFAULT_CONTENT.durations.slice(1) };
    expect(compareContent(DEFAULT_CONTENT, after)).toEqual([
      {
        field: 'values.lossEgg',
        label: 'loss of eggs',
        before: expect.stringMatching(/^0\.01 per day \(assumption; /),
        after: '0.02 per day (low; own trial)',
      },
      {
        field: 'durations.Polistes exclamans',
        label: 'durations of Polistes exclamans',
        before: expect.stringMatching(/^11 \/ 20 \/ 14 d at 25 °C \(medium; /),
        after: 'none',
      },
    ]);
    expect(compareContent(after, after)).toEqual([]);
  });
});
