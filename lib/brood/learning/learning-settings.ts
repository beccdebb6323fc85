import type { Setting } from '@/lib/brood/settings';

/** What each number of the learning is, in which unit, and the values it may take. */
export const LEARNING_RULES = {
  learnPseudoCount: { label: 'cells that a confusion row from before counts for', unit: 'cells', min: 1, max: 10_000 },
  learnDurationSd: { label: 'how unsure the durations of a taxon are', unit: 'log scale', min: 0.01, max: 1 },
} as const;

/** The name of one number of the learning. */
export type LearningSettingName = keyof typeof LEARNING_RULES;

const PROGRAMME = 'programme default; owned by the lead biologist';

/** What a new team starts with. */
export const DEFAULT_LEARNING: Readonly<Record<LearningSettingName, Setting>> = {
  learnPseudoCount: { value: 50, trust: 'assumption', source: PROGRAMME },
  learnDurationSd: {
    value: 0.25,
    trust: 'assumption',
    source: 'published development times of temperate Polistes differ by about a quarter',
  },
};
