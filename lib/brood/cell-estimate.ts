import type { CellEstimate } from './answer';
import type { CellView } from './cell-history';
import { type DateFrame, dateRange } from './date-range';
import { lossTotal } from './losses';
import type { DatedGroup } from './nest-model/dated-nest';
import type { PresentBrood } from './nest-model/mixed-group';
import { stageGroup } from './stages';

/** Brood is dated where it was seen alive, and is more likely there than not. */
const LIKELY = 0.5;

/** The brood of a group that can be dated, or null. */
export function datableBrood({ mixed, looks }: DatedGroup): PresentBrood | null {
  const isSeen = looks.at(-1)?.some(({ state }) => state !== 'absent' && stageGroup({ state }) !== null) ?? false;
  return isSeen && mixed.alive >= LIKELY ? mixed.present : null;
}

/** The members of an estimate that equal cells share. */
type SharedEstimate = Omit<CellEstimate, 'q' | 'r' | 'state'>;

const NOTHING_SEEN: SharedEstimate = {
  generation: 0,
  laid: null,
  capped: null,
  emerges: null,
  lost: { probability: 0 },
};

/** The estimate of a group of equal cells. */
export function groupEstimate(group: DatedGroup, frame: DateFrame): SharedEstimate {
  const { generation, emergedWhenEmpty } = group.mixed;
  const brood = datableBrood(group);
  if (!brood) {
    const probability = generation > 0 && emergedWhenEmpty !== null ? 1 - emergedWhenEmpty : 0;
    return { ...NOTHING_SEEN, generation, lost: { probability } };
  }
  return {
    generation,
    laid: dateRange(brood.laid, frame),
    capped: dateRange(brood.capped, frame),
    emerges: { ...dateRange(brood.out, frame), probability: brood.chance },
    lost: { probability: lossTotal(brood.losses) },
  };
}

/** One cell of the answer. */
export function cellEstimate({ q, r, state }: CellView, shared: SharedEstimate | undefined): CellEstimate {
  return { q, r, state, ...(shared ?? NOTHING_SEEN) };
}
