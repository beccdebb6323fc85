import 'server-only';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { note, step } from '@/lib/server/demo/story/acts';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { BRAM, YSOLDE } from '@/lib/server/demo/ossle/people';

const CELLS = combOf({ counts: { egg: 4, small: 2, medium: 1, large: 2 }, nectar: 1, lean: { x: 0, y: 0.4 } });

/**
 * The nest whose ids are N12's of the other team, from the nest itself down to its marks: equal ids of two teams must
 * never show one the other's records.
 */
export const O02: NestStory = {
  code: 'O02',
  idName: 'N12',
  name: 'Salt store, loft ladder',
  taxon: 'Polistes dominula',
  place: { lat: 42.688, lon: 4.142, accuracyM: 9 },
  openedBy: YSOLDE,
  openedAt: '2026-05-18T18:10',
  acts: [note('2026-05-18T18:12', 'nest', 'On the third rung; the loft is in use from July.')],
  visits: [
    {
      key: 'take-down',
      purpose: 'take-down',
      by: YSOLDE,
      startedAt: '2026-05-20T06:30',
      acts: [step('2026-05-20T06:41', 'caught', 'Second attempt.'), step('2026-05-20T06:46', 'cut')],
      readings: [
        {
          key: 'field',
          kind: 'field',
          source: 'phone',
          by: YSOLDE,
          openedAt: '2026-05-20T06:52',
          light: 'lamp',
          cells: CELLS,
          submitted: true,
        },
        {
          key: 'second',
          kind: 'second',
          source: 'photo',
          by: BRAM,
          openedAt: '2026-05-22T11:00',
          aid: 'screen',
          cells: CELLS,
          submitted: true,
        },
      ],
    },
  ],
  decisions: [
    {
      by: BRAM,
      at: '2026-05-22T11:30',
      visit: 'take-down',
      reading: 'field',
      leaves: { version: 1, lockedVersion: 1 },
      act: { kind: 'lock' },
    },
  ],
  outcome: null,
};
