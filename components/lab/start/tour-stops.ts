import type { RoleName } from '@/components/shell/role-words';

/** A place of the walk: what is there, what to look at, who may go. */
export interface TourStop {
  title: string;
  words: string;
  /** Things to look for, in the order of the page. */
  look: readonly string[];
  /** The code of a nest of the demo season, or an address of the product. */
  at: { nest: string; part?: string } | { path: string };
  /** Who may open it; everybody when left out. */
  roles?: readonly RoleName[];
}

/** The walk through the demo season, in the order of the work. Nests are named by their code. */
export const TOUR: readonly TourStop[] = [
  {
    title: 'Twelve calls, one list',
    words: 'Twelve nests were reported in the 2026 season. Some were moved, some left where they were, some handed on.',
    look: [
      'The word on the right of each line says how far the work on her has come.',
      'Search, species and dates narrow the list; the address keeps them, so it can be sent to a colleague.',
    ],
    at: { path: '/nests' },
  },
  {
    title: 'A comb, cell by cell',
    words: 'N12 hung in the roof of a bandstand. Her 33 cells are drawn from below, as one looks up at them.',
    look: [
      'Press a cell, or go to it with the arrow keys: its state, its number, when it was laid and when it opens.',
      'The signs have a key below the comb; they hold in black and white too.',
    ],
    at: { nest: 'N12' },
  },
  {
    title: 'When: always a range',
    words: 'From what is in each cell the product works back to the egg and forward to the adult.',
    look: [
      'Read the range, not its middle. How wide it is says how much is known.',
      'Assumptions, one press away, lists every number the range rests on and who published it.',
    ],
    at: { nest: 'N12', part: 'brood' },
  },
  {
    title: 'Two people, one comb',
    words:
      'The lab read N12 again without seeing the first reading. Of 33 cells they agreed on 29; the lead biologist settled the other four, each with a reason.',
    look: [
      'Visits and readings: the field reading and the second one stand unchanged beside the final one.',
      'She was locked, then amended when a photo showed another female. Version 1 is kept beside version 2.',
    ],
    at: { nest: 'N12', part: 'visits' },
  },
  {
    title: 'Failure, told like success',
    words: 'Birds took N11 on the sixth day; N09 left after a rough move and built again near by.',
    look: ['The outcome stands on the page of the nest, with its day and what was seen.'],
    at: { nest: 'N11', part: 'outcome' },
  },
  {
    title: 'Left where she was',
    words: 'N07 had 58 cells and workers when she was called in. Adults were out, so she was guarded, not moved.',
    look: ['Guarded nests are part of the record: without them nobody could say what moving does.'],
    at: { nest: 'N07' },
  },
  {
    title: 'Hosts',
    words: 'A nest needs a place before she is taken down.',
    look: ['A host may withdraw at any time, as one did in July.', 'Researchers do not see hosts.'],
    at: { path: '/hosts' },
    roles: ['technician', 'reviewer', 'biologist', 'coordinator'],
  },
  {
    title: 'The phone, without signal',
    words: 'The phone app opens and works with the office out of reach. Switch the network off and try.',
    look: [
      'Start a nest, a visit and a reading, and press a few cells.',
      'The corner says where your work is: saved here, waiting, sending, at the office.',
    ],
    at: { path: '/field' },
    roles: ['technician', 'reviewer', 'biologist'],
  },
  {
    title: 'The data',
    words:
      'Everything can be taken away as CSV, narrowed by nest, species and dates, with a dictionary of every column.',
    look: ['Exact for statistics, or guarded for a spreadsheet. Outside researchers get places rounded to about 1 km.'],
    at: { path: '/downloads' },
    roles: ['reviewer', 'biologist', 'coordinator', 'researcher'],
  },
  {
    title: 'People and phones',
    words:
      'A coordinator invites, changes roles and lets people go; a lost phone is withdrawn, and its next request refused.',
    look: ['Each phone says how much it still held when it was last seen.'],
    at: { path: '/members' },
    roles: ['coordinator'],
  },
  {
    title: 'What is not known',
    words: 'The product says what it cannot say: cautions, weak numbers, and where each one comes from.',
    look: ['Most numbers of the model are marked as assumptions, because nobody has published them.'],
    at: { path: '/limits' },
  },
];

/** The codes of the nests the walk goes to. */
export const TOUR_NESTS: readonly string[] = [...new Set(TOUR.flatMap(({ at }) => ('nest' in at ? [at.nest] : [])))];

/**
 * Where a stop leads; null when the team has no such nest or the reader may not go.
 *
 * @param nests the ids of nests by code.
 */
export function stopHref(
  { at, roles }: TourStop,
  role: RoleName,
  nests: Readonly<Record<string, string>>,
): string | null {
  if (roles && !roles.includes(role)) return null;
  if ('path' in at) return at.path;
  const id = nests[at.nest];
  if (id === undefined) return null;
  return at.part === undefined ? `/nests/${id}` : `/nests/${id}#${at.part}`;
}
