import 'server-only';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { CellStory } from '@/lib/server/demo/story/reading-story';

/** Another reader's view: the same cells with some states changed, and nothing else noted. */
export function withStates(
  cells: readonly CellStory[],
  changes: readonly (Axial & { state: CellState })[],
): CellStory[] {
  const changed = new Map(changes.map((change) => [cellKey(change), change.state]));
  return cells.map((cell) => ({
    q: cell.q,
    r: cell.r,
    state: changed.get(cellKey(cell)) ?? cell.state,
    nectar: cell.nectar,
  }));
}
