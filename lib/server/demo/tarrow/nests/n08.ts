import 'server-only';
import { note } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { SENNA } from '@/lib/server/demo/tarrow/people';

/** Settled by photo: not a paper wasp at all. */
export const N08: NestStory = {
  code: 'N08',
  name: 'Gannow Street Library, book-drop canopy',
  taxon: 'Dolichovespula',
  place: null,
  openedBy: SENNA,
  openedAt: '2026-05-20T11:20',
  acts: [
    note(
      '2026-05-20T11:31',
      'nest',
      'Reported as a paper wasp. The photo shows a paper envelope of 45 mm: the nest of a Dolichovespula queen (X10).',
    ),
  ],
  visits: [],
  decisions: [],
  outcome: {
    outcome: 'hand on: licensed pest management',
    decidedOn: '2026-05-20',
    note: 'Not a paper wasp, settled by photo. The look-alike card went out with the letter.',
  },
};
