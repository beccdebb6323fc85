import 'server-only';
import type { Axial } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { WallTime } from '@/lib/server/demo/build/demo-time';
import type { Person } from './person';

/** What the reader ends up recording for one cell. */
export interface CellStory extends Axial {
  state: CellState;
  nectar?: boolean;
  unsure?: boolean;
  reused?: boolean;
  /** What the reader pressed first and then changed; both marks stay in the history. */
  pressedFirst?: CellState;
}

/** One person's reading of one comb. */
export interface ReadingStory {
  /** Names the reading within its visit. */
  key: string;
  kind: 'field' | 'second';
  source: 'phone' | 'paper' | 'photo';
  by: Person;
  openedAt: WallTime;
  /** No earlier than this do its operations reach the office: the phone had no signal or no power. */
  heldUntil?: WallTime;
  aid?: string;
  light?: string;
  /** In the order they were read. */
  cells: readonly CellStory[];
  /** A break after so many cells. */
  pause?: { afterCells: number; minutes: number };
  /** A cell pressed beyond the comb and taken back at once. */
  misTap?: Axial;
  /** Left out while the reader is still at it. */
  submitted: boolean;
  note?: string;
}
