import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { note, step, visitField } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import type { CellStory } from '@/lib/server/demo/story/reading-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { TOBIAH } from '@/lib/server/demo/tarrow/people';

const COMB = combOf({
  counts: { opened: 6, capped: 10, large: 8, medium: 6, small: 9, egg: 15, empty: 4 },
  nectar: 3,
  lean: { x: 0.4, y: -0.6 },
});

/** Six workers have come out of the six oldest cells; two of those already hold a new egg. */
const CELLS: readonly CellStory[] = COMB.map((cell, i) =>
  i === 0 || i === 3 ? { ...cell, state: 'egg', reused: true } : cell,
);

/** Found after the first workers: guarded in place to the first frost. */
export const N07: NestStory = {
  code: 'N07',
  name: 'Wickering tram depot, signal cabin',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.5872, lon: -77.6338, accuracyM: 6 },
  openedBy: TOBIAH,
  openedAt: '2026-06-24T14:05',
  acts: [note('2026-06-24T14:07', 'nest', 'Workers are out, so she is not moved (D4).')],
  visits: [
    {
      key: 'reading',
      purpose: 'other',
      by: TOBIAH,
      startedAt: '2026-06-24T15:30',
      acts: [
        visitField('2026-06-24T15:33', 'adult_females', 7),
        step('2026-06-24T16:10', 'night screen', 'Mesh between lamp and door, shut from dusk.'),
        note(
          '2026-06-24T16:14',
          'visit',
          '58 cells, six workers and the foundress. Read from photos taken through the hatch.',
        ),
      ],
      readings: [
        {
          key: 'field',
          kind: 'field',
          source: 'photo',
          by: TOBIAH,
          openedAt: '2026-06-24T15:40',
          aid: 'pole camera',
          light: 'lamp',
          cells: CELLS,
          submitted: true,
        },
      ],
    },
    check({
      key: 'frost',
      by: TOBIAH,
      at: '2026-10-14T09:30',
      adults: 0,
      text: 'First frost two nights ago. The comb is empty.',
    }),
  ],
  decisions: [],
  outcome: {
    outcome: 'guard it in place',
    decidedOn: '2026-10-14',
    note: 'Not moved (D4). Guarded to the first frost.',
  },
};
