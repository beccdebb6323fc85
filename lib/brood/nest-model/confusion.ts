import type { Confusion } from '@/lib/brood/hmm/emission';

/** The true classes of a cell, and what each is recorded as when nobody errs. */
export const CELL_CLASSES: Readonly<Record<string, { recorded: string; label: string }>> = {
  absent: { recorded: 'absent', label: 'not built' },
  empty: { recorded: 'empty', label: 'empty, new or after a loss' },
  emerged: { recorded: 'opened', label: 'empty, an adult came out' },
  egg: { recorded: 'egg', label: 'egg' },
  L1: { recorded: 'small', label: 'larva, instar 1' },
  L2: { recorded: 'small', label: 'larva, instar 2' },
  L3: { recorded: 'small', label: 'larva, instar 3' },
  L4: { recorded: 'medium', label: 'larva, instar 4' },
  L5: { recorded: 'large', label: 'larva, instar 5' },
  pupa: { recorded: 'capped', label: 'under the cap' },
};

/** What a reader can record of a cell that was looked into. */
export const RECORDED_CLASSES = ['absent', 'empty', 'egg', 'small', 'medium', 'large', 'capped', 'opened'] as const;

/** How often each true class is recorded as what. Nobody has published such figures for *Polistes*. */
export const DEFAULT_CONFUSION: Confusion = {
  absent: { absent: 1 },
  empty: { empty: 0.97, egg: 0.03 },
  emerged: { opened: 0.9, empty: 0.1 },
  egg: { egg: 0.94, empty: 0.05, small: 0.01 },
  L1: { small: 0.97, egg: 0.03 },
  L2: { small: 1 },
  L3: { small: 0.95, medium: 0.05 },
  L4: { medium: 0.88, small: 0.06, large: 0.06 },
  L5: { large: 0.93, medium: 0.05, capped: 0.02 },
  pupa: { capped: 0.985, large: 0.015 },
};
