import 'server-only';
import { nestField, note, step } from '@/lib/server/demo/story/acts';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { N12_MEASURED } from '@/lib/server/demo/tarrow/moved-nests';
import { HALLORAN, SENNA } from '@/lib/server/demo/tarrow/people';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { takeDown } from '@/lib/server/demo/tarrow/take-down';
import { N12_CELLS } from './n12-cells';
import { N12_DECISIONS } from './n12-decisions';

const TAKE_DOWN: VisitStory = takeDown({
  by: SENNA,
  startedAt: '2026-06-16T05:35',
  heldUntil: '2026-06-16T09:00',
  heightM: 2.8,
  steps: [step('2026-06-16T05:36', 'caught', 'First attempt.'), step('2026-06-16T05:39', 'cut')],
  measuredAt: '2026-06-16T05:52',
  measured: N12_MEASURED,
  release: RELEASES.N12,
  text: 'Comb whole. No signal at the lock: everything waits on the phone until the road.',
  readings: [
    {
      key: 'field',
      kind: 'field',
      source: 'phone',
      by: SENNA,
      openedAt: '2026-06-16T05:41',
      aid: 'hand lens, torch',
      light: 'shade',
      cells: N12_CELLS.field,
      submitted: true,
    },
    {
      key: 'second',
      kind: 'second',
      source: 'photo',
      by: HALLORAN,
      openedAt: '2026-06-18T10:05',
      aid: 'screen',
      cells: N12_CELLS.blind,
      submitted: true,
    },
  ],
});

const CHECKS: readonly VisitStory[] = [
  check({ key: 'dawn', by: SENNA, at: '2026-06-18T05:35', adults: 1, text: 'On the comb at first light.' }),
  check({ key: 'day 3', by: SENNA, at: '2026-06-20T16:05', adults: 1, text: 'She stayed the third night.' }),
  check({
    key: 'day 7',
    by: SENNA,
    at: '2026-06-24T15:20',
    adults: 1,
    loads: ['prey return', 'pulp return'],
    text: 'Prey once, pulp once. The first female by her face.',
  }),
  check({
    key: 'day 9',
    by: SENNA,
    at: '2026-06-26T14:45',
    adults: 1,
    text: 'One female; photo of the face taken. She looks different; to be compared in the lab.',
  }),
  check({ key: 'first worker', by: SENNA, at: '2026-06-27T12:35', adults: 2, text: 'The first worker is out.' }),
];

/** Read by three people to the cell; a usurper takes the nest after the seventh day. */
export const N12: NestStory = {
  code: 'N12',
  name: 'Fennel Green bandstand roof',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.598, lon: -77.605, accuracyM: 4 },
  openedBy: SENNA,
  openedAt: '2026-06-14T13:25',
  acts: [
    note(
      '2026-06-14T13:28',
      'nest',
      'Over the steps of the bandstand; concerts begin on 20 June. H4 lies 7.07 km off, bearing 30°.',
    ),
    nestField('2026-06-15T18:00', 'host', 'H4'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: N12_DECISIONS,
  outcome: {
    outcome: 'raised, other queen',
    decidedOn: '2026-06-27',
    note: 'First emergence 2026-06-27. A usurper by day 9, known by the face photo of 26 June.',
  },
};
