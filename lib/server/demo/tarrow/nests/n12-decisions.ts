import 'server-only';
import type { DecisionStory } from '@/lib/server/demo/story/nest-story';
import { LOOS } from '@/lib/server/demo/tarrow/people';

/** Dr Loos decides, as third reader: the two agree on 29 of 33 cells and clash over a parasitised one. */
const OF_THE_FIELD_READING = { by: LOOS, visit: 'take-down', reading: 'field' } as const;

/** Settled, locked, and amended once the later face photo had been compared: version 2, with version 1 kept. */
export const N12_DECISIONS: readonly DecisionStory[] = [
  {
    ...OF_THE_FIELD_READING,
    at: '2026-06-22T09:15',
    leaves: { version: 1, lockedVersion: null },
    act: {
      kind: 'settle',
      cells: [
        {
          q: -1,
          r: 0,
          state: 'parasitised',
          reason: 'The field photo shows a pierced cap; from above, in the lab photo, it looks whole.',
        },
        { q: 0, r: 2, state: 'large', reason: 'The face fills the mouth of the cell in both photos.' },
        {
          q: -2,
          r: 0,
          state: 'small',
          reason: 'Still attached and under a third of the cell: the lens at the nest saw deeper than the photo.',
        },
        {
          q: -3,
          r: 2,
          state: 'egg',
          reason: 'An egg on the upper wall in the lab photo; missed against the light in the field.',
        },
      ],
    },
  },
  {
    ...OF_THE_FIELD_READING,
    at: '2026-06-22T09:40',
    leaves: { version: 1, lockedVersion: 1 },
    act: { kind: 'lock' },
  },
  {
    ...OF_THE_FIELD_READING,
    at: '2026-06-29T14:05',
    leaves: { version: 2, lockedVersion: 1 },
    act: {
      kind: 'amend',
      reason:
        'The face photo of 26 June shows a different female: a usurper. The cells stand; the brood after that day may be hers.',
    },
  },
  {
    ...OF_THE_FIELD_READING,
    at: '2026-06-29T14:10',
    leaves: { version: 2, lockedVersion: 2 },
    act: { kind: 'lock' },
  },
];
