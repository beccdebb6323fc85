/** What a number of the lab's review is, in which unit, and the values it may take. */
interface ReviewSettingRule {
  group: 'review';
  label: string;
  unit: string;
  min: number;
  max: number;
  /** Only whole numbers make sense. */
  isWhole?: boolean;
}

/** Every number that the lab's review goes by, by name. */
export const REVIEW_SETTING_RULES = {
  reviewAgreement: {
    group: 'review',
    label: 'share of cells both readers must see alike for a reviewer to settle alone',
    unit: '',
    min: 0,
    max: 1,
  },
  reviewClashes: {
    group: 'review',
    label: 'clashes over capped, dead, parasitised or webbed that a reviewer may settle alone',
    unit: 'cells',
    min: 0,
    max: 100,
    isWhole: true,
  },
  reviewOverdue: {
    group: 'review',
    label: 'how long a handed-in reading may wait before it is overdue',
    unit: 'days',
    min: 1,
    max: 365,
    isWhole: true,
  },
} as const satisfies Record<string, ReviewSettingRule>;

/** The name of one number of the lab's review. */
export type ReviewSettingName = keyof typeof REVIEW_SETTING_RULES;

/** All numbers of the lab's review. */
export type ReviewSettings = Readonly<Record<ReviewSettingName, number>>;

/** The numbers a new team starts with: programme defaults, owned by the lead biologist. */
export const DEFAULT_REVIEW_SETTINGS: ReviewSettings = {
  reviewAgreement: 0.9,
  reviewClashes: 0,
  reviewOverdue: 7,
};

/** Is this a value the setting may take? */
export function fitsReviewRule(name: ReviewSettingName, value: unknown): value is number {
  const { min, max } = REVIEW_SETTING_RULES[name];
  return typeof value === 'number' && value >= min && value <= max;
}
