import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { note, step } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { MOVED_NESTS } from '@/lib/server/demo/tarrow/moved-nests';
import { JUNO, TOBIAH } from '@/lib/server/demo/tarrow/people';
import { measures } from '@/lib/server/demo/tarrow/take-down';

/** Sprayed the night before the visit: the comb is read in the lab. */
export const N10: NestStory = {
  code: 'N10',
  name: 'Marlpit quarry weighbridge hut',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.535, lon: -77.64, accuracyM: 5 },
  openedBy: TOBIAH,
  openedAt: '2026-06-17T15:35',
  acts: [
    note(
      '2026-06-17T15:36',
      'nest',
      'Over the weighbridge door. The caller was asked not to spray, knock, seal or hose.',
    ),
  ],
  visits: [
    {
      key: 'take-down',
      purpose: 'take-down',
      by: TOBIAH,
      startedAt: '2026-06-18T06:00',
      acts: [
        step('2026-06-18T06:06', 'stop', 'X11: sprayed the night before, residue smelt.'),
        step('2026-06-18T06:20', 'comb taken for the lab'),
        note(
          '2026-06-18T06:24',
          'visit',
          'The foundress lies dead below the nest. The comb goes to the lab in a sealed box.',
        ),
      ],
      readings: [],
    },
    {
      key: 'lab',
      purpose: 'lab',
      by: JUNO,
      startedAt: '2026-06-18T10:30',
      acts: [
        ...measures('2026-06-18T11:05', MOVED_NESTS.N10),
        note(
          '2026-06-18T11:06',
          'visit',
          'Larvae of every size dead. The eggs keep their shape; whether they live is not known.',
        ),
      ],
      readings: [
        {
          key: 'field',
          kind: 'field',
          source: 'phone',
          by: JUNO,
          openedAt: '2026-06-18T10:42',
          aid: 'stereo lens',
          light: 'lamp',
          cells: combOf(MOVED_NESTS.N10.comb),
          submitted: true,
        },
      ],
    },
  ],
  decisions: [],
  outcome: {
    outcome: 'failed at visit',
    decidedOn: '2026-06-18',
    note: 'Sprayed the night before the visit (X11). Foundress dead.',
  },
};
