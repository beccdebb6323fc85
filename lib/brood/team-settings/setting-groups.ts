import { DEFAULT_LEARNING, LEARNING_RULES } from '@/lib/brood/learning/learning-settings';
import { DEFAULT_SETTINGS, SETTING_RULES, type Setting } from '@/lib/brood/settings';
import { DEFAULT_REVIEW_SETTINGS, REVIEW_SETTING_RULES } from '@/lib/comb/review-settings';
import { TEMPERATURE_RULES } from '@/lib/brood/temperature/temperature-settings';
import { SETTING_WORDS } from './setting-words';

/** What a number is, in which unit, and the values it may take. */
export interface NumberRule {
  label: string;
  unit: string;
  min: number;
  max: number;
  /** Only whole numbers make sense. */
  isWhole?: boolean;
}

/** One number with everything a person needs to judge it. */
export interface SettingItem extends NumberRule {
  name: string;
  /** What it does to the dates or to the work. */
  does: string;
  default: Setting;
}

/** Numbers that belong together. */
export interface SettingGroup {
  id: string;
  title: string;
  items: readonly SettingItem[];
}

/** Puts a group together from rules and defaults. */
export function settingGroup(
  { id, title }: { id: string; title: string },
  rules: Readonly<Record<string, NumberRule>>,
  defaults: Readonly<Record<string, Setting>>,
): SettingGroup {
  const items = Object.entries(rules).flatMap(([name, rule]) => {
    const held = defaults[name];
    return held ? [{ name, ...rule, does: SETTING_WORDS[name] ?? '', default: held }] : [];
  });
  return { id, title, items };
}

const PARTS: readonly { id: string; title: string; names: readonly string[] }[] = [
  { id: 'stages', title: 'Stages', names: ['instar5Share', 'foundingLead'] },
  {
    id: 'laying',
    title: 'Laying and growth of the comb',
    names: [
      'layFirst',
      'layNext',
      'generations',
      'cellsPerDay',
      'growthSpread',
      'orderSpread',
      'orderSpreadPerCell',
      'orderSlip',
    ],
  },
  {
    id: 'variation',
    title: 'How much broods and nests differ',
    names: ['cvEgg', 'cvInstar', 'cvCapped', 'nestFactorCv'],
  },
  { id: 'losses', title: 'Losses', names: ['lossEgg', 'lossLarva', 'lossCapped'] },
  { id: 'temperature', title: 'Temperature', names: Object.keys(TEMPERATURE_RULES) },
  { id: 'season', title: 'Season gate', names: ['amberWindow', 'redWindow', 'guardWindow'] },
];

const REVIEW_SOURCE = 'programme default; owned by the lead biologist';

/** The lab's thresholds, each with how far it is to be trusted. */
const REVIEW_DEFAULTS: Readonly<Record<string, Setting>> = Object.fromEntries(
  Object.entries(DEFAULT_REVIEW_SETTINGS).map(([name, value]) => [
    name,
    { value, trust: 'assumption', source: REVIEW_SOURCE },
  ]),
);

/** Rules of the model by name, those of some names only. */
function rulesOf(isIn: (name: string) => boolean): Record<string, NumberRule> {
  return Object.fromEntries(Object.entries(SETTING_RULES).filter(([name]) => isIn(name)));
}

const PLACED = new Set(PARTS.flatMap(({ names }) => names));

/**
 * Every number that a settings version holds, in groups. A group of another part of the product is one more line
 * here; a number of the brood model without a place of its own shows up in the last group by itself.
 */
export const SETTING_GROUPS: readonly SettingGroup[] = [
  ...PARTS.map(({ id, title, names }) =>
    settingGroup(
      { id, title },
      rulesOf((name) => names.includes(name)),
      DEFAULT_SETTINGS.values,
    ),
  ),
  settingGroup(
    { id: 'model', title: 'The model' },
    rulesOf((name) => !PLACED.has(name)),
    DEFAULT_SETTINGS.values,
  ),
  settingGroup({ id: 'review', title: 'Review in the lab' }, REVIEW_SETTING_RULES, REVIEW_DEFAULTS),
  settingGroup({ id: 'learning', title: 'Learning from the team’s own readings' }, LEARNING_RULES, DEFAULT_LEARNING),
].filter(({ items }) => items.length > 0);

/** Every number by name. */
export const SETTING_ITEMS: ReadonlyMap<string, SettingItem> = new Map(
  SETTING_GROUPS.flatMap(({ items }) => items.map((item) => [item.name, item] as const)),
);
