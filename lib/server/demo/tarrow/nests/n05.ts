import 'server-only';
import { note } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { ORIEL } from '@/lib/server/demo/tarrow/people';

/** Settled by photo: introduced, so never moved. */
export const N05: NestStory = {
  code: 'N05',
  name: 'Dunnock allotment shed, plot 31',
  taxon: 'Polistes dominula',
  place: null,
  openedBy: ORIEL,
  openedAt: '2026-06-04T13:50',
  acts: [
    note(
      '2026-06-04T13:58',
      'nest',
      'Four photos: antennae bright orange from the third segment, black with sharp yellow. Introduced here, so not moved (X9).',
    ),
  ],
  visits: [],
  decisions: [],
  outcome: {
    outcome: 'hand on: licensed pest management',
    decidedOn: '2026-06-04',
    note: 'Introduced species, settled by photo. A letter explains how to tell her from the native ones.',
  },
};
