import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { nestField, note, step } from '@/lib/server/demo/story/acts';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { MOVED_NESTS } from '@/lib/server/demo/tarrow/moved-nests';
import { TOBIAH } from '@/lib/server/demo/tarrow/people';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { takeDown } from '@/lib/server/demo/tarrow/take-down';

const TAKE_DOWN: VisitStory = takeDown({
  by: TOBIAH,
  startedAt: '2026-05-21T07:10',
  heightM: 2.6,
  steps: [step('2026-05-21T07:19', 'caught', 'First attempt.'), step('2026-05-21T07:24', 'cut')],
  measuredAt: '2026-05-21T07:37',
  measured: MOVED_NESTS.N01,
  release: RELEASES.N01,
  text: 'Cut at the beam, comb whole. One foundress.',
  readings: [
    {
      key: 'field',
      kind: 'field',
      source: 'phone',
      by: TOBIAH,
      openedAt: '2026-05-21T07:29',
      aid: 'hand lens, torch',
      light: 'shade',
      cells: combOf(MOVED_NESTS.N01.comb),
      submitted: true,
    },
  ],
});

const CHECKS: readonly VisitStory[] = [
  check({ key: 'dawn', by: TOBIAH, at: '2026-05-23T05:40', adults: 1, text: 'On the comb at first light.' }),
  check({ key: 'day 3', by: TOBIAH, at: '2026-05-25T17:10', adults: 1, text: 'She stayed the third night.' }),
  check({
    key: 'day 7',
    by: TOBIAH,
    at: '2026-05-29T16:30',
    adults: 1,
    loads: ['pulp return', 'pulp return'],
    text: 'Two loads of pulp, two new cells.',
  }),
  check({ key: 'first worker', by: TOBIAH, at: '2026-06-23T11:20', adults: 2, text: 'The first worker is out.' }),
];

/** The textbook move: Brackwater to the Pellow orchard. */
export const N01: NestStory = {
  code: 'N01',
  name: 'Brackwater Rowing boat house, over the oar rack',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.612, lon: -77.651, accuracyM: 5 },
  openedBy: TOBIAH,
  openedAt: '2026-05-18T16:40',
  acts: [
    note(
      '2026-05-18T16:41',
      'nest',
      'The rack is in daily use; the nest cannot stay. H1 lies 5.63 km off, bearing 131°.',
    ),
    nestField('2026-05-20T18:00', 'host', 'H1'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: [],
  outcome: {
    outcome: 'raised',
    decidedOn: '2026-06-23',
    note: 'First emergence 2026-06-23. Original foundress at the last check.',
  },
};
