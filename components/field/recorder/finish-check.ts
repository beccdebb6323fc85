import { type Axial, cellKey } from '@/lib/comb/axial';
import { byWalkOrder, cellNumber } from '@/lib/comb/walk';
import type { RecorderView } from '@/lib/offline/recorder-view';

/** What a person should look at before handing a reading in. None of it holds the reading back. */
export interface FinishCheck {
  /** Cells marked *unread*. */
  unread: Axial[];
  /** Places that were walked past without a word: neither a mark nor "no cell here". */
  passed: Axial[];
  /** Counted cells that bear no mark; negative when more are marked than were counted; 0 when nobody counted. */
  missing: number;
}

type Checked = Pick<RecorderView, 'marks' | 'last' | 'rim' | 'skipped' | 'expectedTotal'>;

/** Looks over a reading that is about to be handed in. */
export function finishCheck({ marks, last, rim, skipped, expectedTotal }: Checked): FinishCheck {
  const marked = [...marks.values()];
  const furthest = Math.max(-1, ...marked.map(cellNumber));
  const isOpen = (place: Axial): boolean => !marks.has(cellKey(place)) && !skipped.has(cellKey(place));
  const open = new Map([...last.values(), ...rim].filter(isOpen).map(({ q, r }) => [cellKey({ q, r }), { q, r }]));
  const forgotten = (place: Axial): boolean => last.has(cellKey(place)) || cellNumber(place) < furthest;
  return {
    unread: marked.filter((mark) => mark.state === 'unread').sort(byWalkOrder),
    passed: [...open.values()].filter(forgotten).sort(byWalkOrder),
    missing: expectedTotal === null ? 0 : expectedTotal - marked.length,
  };
}
