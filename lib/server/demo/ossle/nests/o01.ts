import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { note, step, visitField } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { YSOLDE } from '@/lib/server/demo/ossle/people';

/** A first reading that waits for the lab. */
export const O01: NestStory = {
  code: 'O01',
  name: 'Sluice gate four, under the walkway',
  taxon: 'Polistes gallicus',
  place: { lat: 42.702, lon: 4.115, accuracyM: 6 },
  openedBy: YSOLDE,
  openedAt: '2026-05-11T17:20',
  acts: [note('2026-05-11T17:22', 'nest', 'Under the walkway of the gate keeper.')],
  visits: [
    {
      key: 'take-down',
      purpose: 'take-down',
      by: YSOLDE,
      startedAt: '2026-05-13T06:50',
      acts: [
        step('2026-05-13T06:58', 'caught', 'First attempt.'),
        step('2026-05-13T07:02', 'cut'),
        visitField('2026-05-13T07:12', 'temp_c', 13),
      ],
      readings: [
        {
          key: 'field',
          kind: 'field',
          source: 'phone',
          by: YSOLDE,
          openedAt: '2026-05-13T07:06',
          light: 'shade',
          cells: combOf({ counts: { egg: 7, small: 4, empty: 1 }, nectar: 2, lean: { x: 0.5, y: -0.2 } }),
          submitted: true,
        },
      ],
    },
  ],
  decisions: [],
  outcome: null,
};
