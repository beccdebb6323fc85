import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { nestField, note, step } from '@/lib/server/demo/story/acts';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { MOVED_NESTS } from '@/lib/server/demo/tarrow/moved-nests';
import { ORIEL } from '@/lib/server/demo/tarrow/people';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { takeDown } from '@/lib/server/demo/tarrow/take-down';

const TAKE_DOWN: VisitStory = takeDown({
  by: ORIEL,
  startedAt: '2026-06-09T05:50',
  heightM: 1.9,
  steps: [
    step('2026-06-09T05:56', 'caught', 'Second attempt.'),
    step('2026-06-09T06:03', 'cut', 'The blade slipped: three cells torn at the rim.'),
  ],
  measuredAt: '2026-06-09T06:20',
  measured: MOVED_NESTS.N09,
  release: RELEASES.N09,
  text: 'Three cells torn at the cut. Accepted slowly: 41 min to first contact.',
  readings: [
    {
      key: 'field',
      kind: 'field',
      source: 'phone',
      by: ORIEL,
      openedAt: '2026-06-09T06:08',
      aid: 'hand lens, torch',
      light: 'shade',
      cells: combOf(MOVED_NESTS.N09.comb),
      submitted: true,
    },
  ],
});

const CHECKS: readonly VisitStory[] = [
  check({
    key: 'dawn',
    by: ORIEL,
    at: '2026-06-11T05:25',
    adults: 0,
    text: 'Nobody on the comb at first light. Brood whole.',
  }),
  check({
    key: 'night',
    by: ORIEL,
    at: '2026-06-11T21:40',
    adults: 0,
    text: 'Nobody after dark either: gone by the two-check rule.',
  }),
  check({
    key: 'day 6',
    by: ORIEL,
    at: '2026-06-16T13:15',
    adults: 1,
    text: 'A new comb of 5 cells 2.2 m from the first, with a foundress of the same face pattern.',
  }),
  check({
    key: 'host withdraws',
    by: ORIEL,
    at: '2026-07-03T16:30',
    text: 'The host withdraws. Here hang the empty comb and the rebuilt nest; the lead biologist is asked.',
  }),
];

/** The move that did not hold: torn cells, a late release, and a nest rebuilt near by. */
export const N09: NestStory = {
  code: 'N09',
  name: 'Hollin weir hut door',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.601, lon: -77.558, accuracyM: 4 },
  openedBy: ORIEL,
  openedAt: '2026-06-07T08:45',
  acts: [
    note('2026-06-07T08:47', 'nest', 'On the hinge side of a door in daily use. H2 lies 3.39 km off, bearing 343°.'),
    nestField('2026-06-08T17:45', 'host', 'H2'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: [],
  outcome: {
    outcome: 'left, rebuilt near',
    decidedOn: '2026-06-16',
    note: 'Gone at the next dawn; new comb of 5 cells 2.2 m away on day 6. No emergence from the moved comb.',
  },
};
