import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { note } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { YSOLDE } from '@/lib/server/demo/ossle/people';

/** A reading broken off half-way and still open. */
export const O03: NestStory = {
  code: 'O03',
  name: 'Heron hide, north shutter',
  taxon: 'Polistes gallicus',
  place: { lat: 42.715, lon: 4.088, accuracyM: 7 },
  openedBy: YSOLDE,
  openedAt: '2026-05-24T09:30',
  acts: [],
  visits: [
    {
      key: 'first look',
      purpose: 'other',
      by: YSOLDE,
      startedAt: '2026-05-24T09:40',
      acts: [note('2026-05-24T09:55', 'visit', 'Visitors came into the hide; broken off after five cells.')],
      readings: [
        {
          key: 'field',
          kind: 'field',
          source: 'phone',
          by: YSOLDE,
          openedAt: '2026-05-24T09:44',
          light: 'sun',
          cells: combOf({ counts: { egg: 3, small: 2 }, nectar: 0, lean: { x: 0.3, y: 0.3 } }),
          submitted: false,
        },
      ],
    },
  ],
  decisions: [],
  outcome: null,
};
