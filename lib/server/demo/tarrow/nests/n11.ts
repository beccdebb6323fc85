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
  startedAt: '2026-06-12T06:20',
  heightM: 3.4,
  steps: [
    step('2026-06-12T06:24', 'platform up'),
    step('2026-06-12T06:33', 'caught', 'First attempt.'),
    step('2026-06-12T06:39', 'cut'),
  ],
  measuredAt: '2026-06-12T06:57',
  measured: MOVED_NESTS.N11,
  release: RELEASES.N11,
  text: 'From the platform, not the ladder. Comb whole.',
  readings: [
    {
      key: 'field',
      kind: 'field',
      source: 'phone',
      by: TOBIAH,
      openedAt: '2026-06-12T06:44',
      aid: 'hand lens, torch',
      light: 'sun',
      cells: combOf(MOVED_NESTS.N11.comb),
      misTap: { q: 4, r: 0 },
      submitted: true,
    },
  ],
});

const CHECKS: readonly VisitStory[] = [
  check({ key: 'dawn', by: TOBIAH, at: '2026-06-14T05:30', adults: 1, text: 'On the comb at first light.' }),
  check({
    key: 'day 3',
    by: TOBIAH,
    at: '2026-06-16T15:40',
    adults: 1,
    loads: ['prey return', 'prey return'],
    text: 'She stayed the third night, and brought prey twice.',
  }),
  check({
    key: 'day 6',
    by: TOBIAH,
    at: '2026-06-19T10:50',
    adults: 0,
    text: 'Half the comb lies torn below the eave, in daylight, droppings on the sill: a bird.',
  }),
];

/** From the observatory dome to the allotments; a bird takes the comb on the sixth day. */
export const N11: NestStory = {
  code: 'N11',
  name: 'Orrin Observatory dome stair',
  taxon: 'Polistes fuscatus',
  place: { lat: 43.566, lon: -77.662, accuracyM: 5 },
  openedBy: TOBIAH,
  openedAt: '2026-06-10T10:00',
  acts: [
    note(
      '2026-06-10T10:20',
      'nest',
      'Reported twice on one day; the calls are joined here. H3 lies 12.27 km off, bearing 100°.',
    ),
    nestField('2026-06-11T18:20', 'host', 'H3'),
  ],
  visits: [TAKE_DOWN, ...CHECKS],
  decisions: [],
  outcome: { outcome: 'taken by birds', decidedOn: '2026-06-19', note: 'Comb torn on day 6. No emergence.' },
};
