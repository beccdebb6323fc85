import 'server-only';
import type { Axial } from '@/lib/comb/axial';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { withStates } from '@/lib/server/demo/build/with-states';
import { nestField, note, step } from '@/lib/server/demo/story/acts';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { MOVED_NESTS } from '@/lib/server/demo/tarrow/moved-nests';
import { JUNO, ORIEL } from '@/lib/server/demo/tarrow/people';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { takeDown } from '@/lib/server/demo/tarrow/take-down';

/** What Oriel read at the bike shed. */
const FIELD_CELLS = combOf(MOVED_NESTS.N02.comb);

/** The one cell the two readers see differently: the outermost of the small larvae. */
const DISPUTED: Axial = { q: -1, r: 0 };

const TAKE_DOWN: VisitStory = takeDown({
  by: ORIEL,
  startedAt: '2026-05-29T06:05',
  heightM: 2.1,
  steps: [
    step('2026-05-29T06:07', 'catch attempt', 'She left the comb and came back after 3 min.'),
    step('2026-05-29T06:12', 'caught', 'Second attempt.'),
    step('2026-05-29T06:14', 'cut'),
  ],
  measuredAt: '2026-05-29T06:24',
  measured: MOVED_NESTS.N02,
  release: RELEASES.N02,
  text: 'Done before 06:30, before the first pupils came. Letters went out in English and Spanish.',
  readings: [
    {
      key: 'field',
      kind: 'field',
      source: 'phone',
      by: ORIEL,
      openedAt: '2026-05-29T06:17',
      aid: 'hand lens, torch',
      light: 'shade',
      cells: FIELD_CELLS,
      submitted: true,
    },
    {
      key: 'second',
      kind: 'second',
      source: 'photo',
      by: JUNO,
      openedAt: '2026-06-01T10:15',
      aid: 'screen',
      cells: withStates(FIELD_CELLS, [{ ...DISPUTED, state: 'egg' }]),
      submitted: true,
    },
  ],
});

const CHECKS: readonly VisitStory[] = [
  check({ key: 'dawn', by: ORIEL, at: '2026-05-31T05:35', adults: 1, text: 'On the comb at first light.' }),
  check({ key: 'day 3', by: ORIEL, at: '2026-06-02T16:20', adults: 1, text: 'She stayed the third night.' }),
  check({
    key: 'day 7',
    by: ORIEL,
    at: '2026-06-06T15:50',
    adults: 1,
    loads: ['prey return'],
    text: 'One load of prey, one new egg.',
  }),
  check({ key: 'first worker', by: ORIEL, at: '2026-06-22T12:10', adults: 2, text: 'The first worker is out.' }),
];

/** Two catch attempts at a school; the readers agree on 18 of 19 cells. */
export const N02: NestStory = {
  code: 'N02',
  name: 'Ferrow Lane School bike shed',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.5945, lon: -77.623, accuracyM: 4 },
  openedBy: ORIEL,
  openedAt: '2026-05-26T15:05',
  acts: [
    note('2026-05-26T15:06', 'nest', 'Above the stands, within reach of pupils. Visit before school opens.'),
    nestField('2026-05-28T17:30', 'host', 'H4'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: [
    {
      by: JUNO,
      at: '2026-06-02T10:40',
      visit: 'take-down',
      reading: 'field',
      leaves: { version: 1, lockedVersion: null },
      act: {
        kind: 'settle',
        cells: [{ ...DISPUTED, state: 'small', reason: 'The field note is sure: a curled larva, seen with the lens.' }],
      },
    },
  ],
  outcome: {
    outcome: 'raised',
    decidedOn: '2026-06-22',
    note: 'First emergence 2026-06-22. Original foundress at the last check.',
  },
};
