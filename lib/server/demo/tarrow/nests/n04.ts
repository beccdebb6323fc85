import 'server-only';
import { note, step, visitField } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { check } from '@/lib/server/demo/tarrow/check';
import { SENNA } from '@/lib/server/demo/tarrow/people';

/** The stop rule at work: too near an overhead line, guarded where it hangs and checked like a moved nest. */
export const N04: NestStory = {
  code: 'N04',
  name: 'Coldspar Halt platform canopy',
  taxon: 'Polistes fuscatus group',
  place: { lat: 43.6205, lon: -77.6125, accuracyM: 8 },
  openedBy: SENNA,
  openedAt: '2026-06-01T09:10',
  acts: [note('2026-06-01T09:12', 'nest', 'Photo only: dark, no orange tips. Not split within the group.')],
  visits: [
    {
      key: 'risk check',
      purpose: 'other',
      by: SENNA,
      startedAt: '2026-06-03T08:30',
      acts: [
        visitField('2026-06-03T08:34', 'overhead_line_m', 2.1),
        step('2026-06-03T08:36', 'stop', 'X5: the nest hangs 2.1 m from an overhead feeder.'),
        step('2026-06-03T08:50', 'sign and tape', 'Tape at 3 m, sign on both sides.'),
        note(
          '2026-06-03T08:52',
          'visit',
          'Stopped before the ladder went up. The rail operator agrees to guard it in place.',
        ),
      ],
      readings: [],
    },
    check({
      key: 'june',
      by: SENNA,
      at: '2026-06-12T11:15',
      adults: 6,
      text: 'Six adults on the comb, seen from the platform.',
    }),
    check({ key: 'autumn', by: SENNA, at: '2026-10-02T10:20', adults: 0, text: 'Empty. Tape and sign taken down.' }),
  ],
  decisions: [],
  outcome: {
    outcome: 'guard it in place',
    decidedOn: '2026-10-02',
    note: 'Not moved (X5). Guarded to the end of the season.',
  },
};
