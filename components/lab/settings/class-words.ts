import type { TrueClass } from '@/lib/brood/team-settings/confusion-rows';

/** What each true class is, in words. */
export const CLASS_WORDS: Readonly<Record<TrueClass, string>> = {
  absent: 'not built',
  empty: 'empty, new or after a loss',
  egg: 'egg',
  L1: 'larva, instar 1',
  L2: 'larva, instar 2',
  L3: 'larva, instar 3',
  L4: 'larva, instar 4',
  L5: 'larva, instar 5',
  pupa: 'under the cap',
  emerged: 'empty, an adult came out',
};
