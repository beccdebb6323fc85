import { CELL_STATES, type CellState } from './states';

/** The stages in the order a wasp passes them: a near miss among these is less wrong than a far one. */
const ORDERED_STAGES = ['egg', 'small', 'medium', 'large', 'capped'] as const satisfies readonly CellState[];

/** What two readings of a comb are compared on. */
export const READING_SCALE = {
  /** Every word that counts as a judgement. */
  categories: CELL_STATES.filter((state) => state !== 'unread'),
  /** Those of them that have an order. */
  ordered: ORDERED_STAGES,
  /** The word for "not judged". */
  leftOut: 'unread',
} as const satisfies { categories: readonly CellState[]; ordered: readonly CellState[]; leftOut: CellState };
