import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { note, step, sting } from '@/lib/server/demo/story/acts';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import type { CellStory } from '@/lib/server/demo/story/reading-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { MOVED_NESTS } from '@/lib/server/demo/tarrow/moved-nests';
import { ORIEL, TOBIAH } from '@/lib/server/demo/tarrow/people';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { takeDown } from '@/lib/server/demo/tarrow/take-down';

/** The first medium larva was taken for a large one, then put right: both marks stay. */
const CELLS: readonly CellStory[] = combOf(MOVED_NESTS.N03.comb).map((cell, i) =>
  i === 3 ? { ...cell, pressedFirst: 'large' } : cell,
);

const TAKE_DOWN: VisitStory = takeDown({
  by: TOBIAH,
  startedAt: '2026-06-02T19:40',
  heightM: 1.4,
  steps: [
    step('2026-06-02T19:43', 'caught', 'First attempt.'),
    sting('2026-06-02T19:44', {
      bodySite: 'wrist',
      symptoms: ['pain', 'swelling at the sting site'],
      note: 'The second person, once. Mild; watched for 30 min, nothing beyond the wrist.',
    }),
    step('2026-06-02T19:46', 'cut'),
  ],
  measuredAt: '2026-06-02T19:57',
  measured: MOVED_NESTS.N03,
  release: RELEASES.N03,
  text: 'Small shift: 1.6 m up to a fixed beam of the same rack.',
  readings: [
    {
      key: 'field',
      kind: 'field',
      source: 'phone',
      by: TOBIAH,
      openedAt: '2026-06-02T19:48',
      aid: 'hand lens, torch',
      light: 'dusk',
      cells: CELLS,
      submitted: true,
    },
  ],
});

const CHECKS: readonly VisitStory[] = [
  check({ key: 'dawn', by: TOBIAH, at: '2026-06-03T05:30', adults: 1, text: 'On the comb at first light.' }),
  check({
    key: 'day 2',
    by: TOBIAH,
    at: '2026-06-04T10:45',
    adults: 1,
    text: 'A file of ants on the post, two cells emptied. Sticky guard fitted to the hanger.',
  }),
  check({ key: 'day 3', by: ORIEL, at: '2026-06-05T17:00', adults: 1, text: 'She stayed the third night. No ants.' }),
  check({
    key: 'day 7',
    by: TOBIAH,
    at: '2026-06-09T14:20',
    adults: 1,
    loads: ['prey return', 'prey return', 'prey return'],
    text: 'Three loads of prey.',
  }),
  check({ key: 'first worker', by: TOBIAH, at: '2026-06-20T13:30', adults: 2, text: 'The first worker is out.' }),
];

/** The small shift, with ants on the second day and the season's one sting. */
export const N03: NestStory = {
  code: 'N03',
  name: 'Hest Farm orchard ladder rack',
  taxon: 'Polistes metricus',
  place: { lat: 43.552, lon: -77.541, accuracyM: 6 },
  openedBy: TOBIAH,
  openedAt: '2026-05-30T12:25',
  acts: [
    note('2026-05-30T12:26', 'nest', 'On a ladder that is carried out each morning; a fixed beam is 1.6 m above.'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: [],
  outcome: {
    outcome: 'raised',
    decidedOn: '2026-06-20',
    note: 'First emergence 2026-06-20. Original foundress at the last check.',
  },
};
