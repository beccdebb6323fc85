import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { nestField, note, step } from '@/lib/server/demo/story/acts';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import type { CellStory, ReadingStory } from '@/lib/server/demo/story/reading-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { MOVED_NESTS } from '@/lib/server/demo/tarrow/moved-nests';
import { ORIEL, TOBIAH } from '@/lib/server/demo/tarrow/people';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { takeDown } from '@/lib/server/demo/tarrow/take-down';

const ON_PAPER: readonly CellStory[] = combOf(MOVED_NESTS.N06.comb);

/** Cells that Oriel had read when her phone went dark; the rest she wrote on the sheet. */
const READ_BEFORE_THE_PHONE_DIED = 12;

const ON_HER_PHONE: readonly CellStory[] = ON_PAPER.map((cell, i) =>
  i < READ_BEFORE_THE_PHONE_DIED ? cell : { q: cell.q, r: cell.r, state: 'unread' },
);

const READINGS: readonly ReadingStory[] = [
  {
    key: 'phone',
    kind: 'field',
    source: 'phone',
    by: ORIEL,
    openedAt: '2026-06-05T05:40',
    aid: 'hand lens, torch',
    light: 'dawn',
    cells: ON_HER_PHONE,
    pause: { afterCells: READ_BEFORE_THE_PHONE_DIED, minutes: 25 },
    submitted: true,
    note: 'The phone died after 12 cells. Charged in the van; the other cells set to unread, see the paper sheet.',
  },
  {
    key: 'field',
    kind: 'field',
    source: 'paper',
    by: TOBIAH,
    openedAt: '2026-06-05T06:30',
    aid: 'paper sheet',
    light: 'dawn',
    cells: ON_PAPER,
    submitted: true,
    note: 'From paper: read at the nest by Oriel Webb-Nakada, typed in by Tobiah Marsh.',
  },
];

const TAKE_DOWN: VisitStory = takeDown({
  by: TOBIAH,
  startedAt: '2026-06-05T05:10',
  heightM: 3,
  steps: [
    step('2026-06-05T05:10', 'caught', 'Both foundresses, on the comb before dawn flight.'),
    step('2026-06-05T05:22', 'cut'),
  ],
  measuredAt: '2026-06-05T06:55',
  measured: MOVED_NESTS.N06,
  release: RELEASES.N06,
  text: 'Two foundresses, both caught; the comb whole.',
  readings: READINGS,
});

const CHECKS: readonly VisitStory[] = [
  check({
    key: 'noon',
    by: TOBIAH,
    at: '2026-06-07T13:30',
    text: 'The host answers “not sure”. A look at dawn is asked for.',
  }),
  check({ key: 'dawn', by: TOBIAH, at: '2026-06-08T05:30', adults: 2, text: 'Both on the comb at first light.' }),
  check({ key: 'day 3', by: ORIEL, at: '2026-06-09T16:40', adults: 1, text: 'One has left; the larger one stays.' }),
  check({
    key: 'day 7',
    by: ORIEL,
    at: '2026-06-13T15:10',
    adults: 1,
    loads: ['prey return', 'prey return'],
    text: 'Prey twice, one new cell.',
  }),
  check({ key: 'first worker', by: TOBIAH, at: '2026-06-24T12:00', adults: 2, text: 'The first worker is out.' }),
];

/** Two foundresses, and a reading that began on a phone and ended on paper. */
export const N06: NestStory = {
  code: 'N06',
  name: 'Pellow ferry ticket kiosk',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.6415, lon: -77.689, accuracyM: 5 },
  openedBy: ORIEL,
  openedAt: '2026-06-02T10:30',
  acts: [
    note('2026-06-02T10:33', 'nest', 'Two females in the photo. Movable only if both are caught.'),
    nestField('2026-06-04T18:10', 'host', 'H1'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: [],
  outcome: {
    outcome: 'raised',
    decidedOn: '2026-06-24',
    note: 'First emergence 2026-06-24. One of the two original foundresses at the last check.',
  },
};
