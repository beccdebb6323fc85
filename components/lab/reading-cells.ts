import type { CombCellView } from '@/components/comb/comb-view';
import { cellKey } from '@/lib/comb/axial';
import { isCellState } from '@/lib/comb/states';
import type { MarkView, SettlementView } from './lab-shapes';

/** The cells of a reading as the comb draws them; cells a reviewer settled bear the mark for that. */
export function readingCells(marks: readonly MarkView[], settlements: readonly SettlementView[] = []): CombCellView[] {
  const settled = new Set(settlements.map(cellKey));
  return marks.map((mark) => ({
    q: mark.q,
    r: mark.r,
    state: isCellState(mark.state) ? mark.state : 'unread',
    nectar: mark.nectar,
    unsure: mark.unsure,
    reused: mark.reused,
    scrap: mark.scrap,
    noted: mark.note !== null,
    changed: settled.has(cellKey(mark)),
  }));
}
