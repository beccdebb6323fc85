import { type CellState, STATE_WORDS } from './states';

/** One cell of a locked reading: what was read at the nest, and what the lab settled on. */
export interface SettledCell {
  read: CellState;
  settled: CellState;
}

/** One thing worth a second look next time. */
export interface LearningNote extends SettledCell {
  /** Cells read so, of those settled so. */
  count: number;
  of: number;
  /** Two plain sentences: what happened, and what to look for. */
  words: string;
}

/** What a person's locked readings teach. */
export interface LearningSummary {
  /** Cells that both judged. */
  cells: number;
  /** Those whose state stood as read at the nest. */
  stood: number;
  /** The commonest first. */
  notes: LearningNote[];
}

/** More than this is a lecture. */
const MOST_NOTES = 5;

/** What tells two states apart that are often taken for each other, whichever way round. */
const BETWEEN: readonly (readonly [CellState, CellState, string])[] = [
  [
    'large',
    'capped',
    'As long as a pale face with dark jaws shows, she is a large larva; a capped cell is closed all round.',
  ],
  ['medium', 'large', 'A large larva fills the cell to its walls; beside a medium one a dark gap is left.'],
  [
    'small',
    'medium',
    'A small larva lies curled, narrower than a third of the cell; of a medium one the head can be seen.',
  ],
  ['egg', 'small', 'An egg is straight and white with no head; a small larva is curved and a drop often lies by her.'],
  ['empty', 'egg', 'Tilt the light and look along the upper walls near the floor: an egg is glued there by one end.'],
  [
    'capped',
    'parasitised',
    'Look at the cap from the side: a hole, or several small cocoons below it, means parasitised.',
  ],
  ['capped', 'opened', 'An opened cell has a ragged rim of silk and a dark pellet on its floor; a cap has no rim.'],
  ['dead', 'parasitised', 'Maggots or small cocoons mean parasitised; brown, flat or mouldy without them means dead.'],
  ['webbed', 'damaged', 'Silk in sheets or tunnels means webbed; a torn or wet wall without silk means damaged.'],
  ['empty', 'opened', 'A dark pellet on the floor tells that an adult has left; a clean floor means empty.'],
];

/** What to look for when the pair has no rule of its own. */
const LOOK_FOR: Readonly<Record<CellState, string>> = {
  unread: 'If the view is blocked, leave the cell unread.',
  empty: 'Look for a clean floor and bare walls, with the light from two sides.',
  egg: 'Look for a white grain on an upper wall near the floor.',
  small: 'Look for a curled larva narrower than a third of the cell.',
  medium: 'Look for a larva that fills about half of the cell, with her head in view.',
  large: 'Look for a pale face with dark jaws at the mouth of the cell.',
  capped: 'Look for a dome of silk that closes the cell all round.',
  opened: 'Look for a ragged rim of silk and a dark pellet on the floor.',
  dead: 'Look for brown or black colour, a flat shape or mould.',
  parasitised: 'Look for holes in the cap, small cocoons or maggots.',
  webbed: 'Look for flat sheets or tunnels of silk across cells.',
  damaged: 'Look for a wall that is torn, crushed or wet.',
};

/** What to look for in order to tell two states apart. */
function advice({ read, settled }: SettledCell): string {
  const rule = BETWEEN.find(([a, b]) => (a === read && b === settled) || (b === read && a === settled));
  return rule?.[2] ?? LOOK_FOR[settled];
}

/** Words for cells in a state: `large larvae`, `eggs`, `capped cells`. */
function cellsWords(state: CellState, count: number): string {
  const words = STATE_WORDS[state];
  if (words.endsWith('larva')) return count === 1 ? words : words.replace('larva', 'larvae');
  if (state === 'egg') return count === 1 ? 'egg' : 'eggs';
  return `${words} ${count === 1 ? 'cell' : 'cells'}`;
}

function noteOf(pair: SettledCell, count: number, of: number): LearningNote {
  const share =
    of === 1 ? `the one ${cellsWords(pair.settled, 1)}` : `${count} of ${of} ${cellsWords(pair.settled, of)}`;
  return { ...pair, count, of, words: `You read ${share} as ${STATE_WORDS[pair.read]}. ${advice(pair)}` };
}

/**
 * What a technician can learn from readings that were locked, from the table of what she read against what was
 * settled. Plain and kind: what stood comes first, and no more than five notes.
 *
 * @param cells every cell of those readings; cells unread by either side are left out.
 */
export function learningNotes(cells: readonly SettledCell[]): LearningSummary {
  const judged = cells.filter(({ read, settled }) => read !== 'unread' && settled !== 'unread');
  const settledAs = new Map<CellState, number>();
  const mixed = new Map<string, { pair: SettledCell; count: number }>();
  for (const { read, settled } of judged) {
    settledAs.set(settled, (settledAs.get(settled) ?? 0) + 1);
    if (read === settled) continue;
    const key = `${read} ${settled}`;
    mixed.set(key, { pair: { read, settled }, count: (mixed.get(key)?.count ?? 0) + 1 });
  }
  const all = [...mixed.values()];
  const notes = [...all]
    .sort((a, b) => b.count - a.count)
    .slice(0, MOST_NOTES)
    .map(({ pair, count }) => noteOf(pair, count, settledAs.get(pair.settled) ?? count));
  const differing = all.reduce((sum, { count }) => sum + count, 0);
  return { cells: judged.length, stood: judged.length - differing, notes };
}
