import type { ReactElement } from 'react';
import { CombCell } from '@/components/comb/comb-cell';
import { boxAround, type CombCellView } from '@/components/comb/comb-view';
import { cellKey } from '@/lib/comb/axial';

/** A comb as a small picture without marks or labels: the age map at a glance. The words beside it say the same. */
export function CombThumb({ marks }: { marks: readonly CombCellView[] }): ReactElement | null {
  if (marks.length === 0) return null;
  const box = boxAround(marks);
  return (
    <svg
      aria-hidden="true"
      className="h-24 w-24 shrink-0 self-center"
      viewBox={`${box.x} ${box.y} ${box.width} ${box.height}`}
    >
      {marks.map((mark) => (
        <CombCell
          key={cellKey(mark)}
          cell={{ q: mark.q, r: mark.r, state: mark.state }}
          marks={false}
          mirrored={false}
        />
      ))}
    </svg>
  );
}
