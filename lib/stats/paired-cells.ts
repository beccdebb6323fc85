/** One cell as one reading has it; `state` is any word of the scale in use. */
export interface JudgedCell<S extends string> {
  q: number;
  r: number;
  state: S;
}

/** A cell that both readings have, with both words. */
export interface CellPair<S extends string> {
  q: number;
  r: number;
  first: S;
  second: S;
}

/** Cells that take no part in a comparison. */
export interface LeftOutCells {
  /** In both readings, but at least one of them could not judge it. */
  unread: number;
  /** Only the first reading has a cell there. */
  onlyFirst: number;
  /** Only the second has. */
  onlySecond: number;
}

/** Which cells can be compared, and how many can't. */
export interface PairedCells<S extends string> {
  pairs: CellPair<S>[];
  leftOut: LeftOutCells;
}

function keyOf({ q, r }: { q: number; r: number }): string {
  return `${String(q)},${String(r)}`;
}

/**
 * Lays two readings of one comb over each other by their addresses.
 *
 * @param first one cell an address, any order; the pairs keep this order.
 * @param second the other reading.
 * @param unread the word for a cell that was not judged.
 */
export function pairedCells<S extends string>(
  first: readonly JudgedCell<S>[],
  second: readonly JudgedCell<S>[],
  unread: S,
): PairedCells<S> {
  const others = new Map(second.map((cell) => [keyOf(cell), cell.state]));
  const shared = first.flatMap(({ q, r, state }) => {
    const other = others.get(keyOf({ q, r }));
    return other === undefined ? [] : [{ q, r, first: state, second: other }];
  });
  const pairs = shared.filter((pair) => pair.first !== unread && pair.second !== unread);
  return {
    pairs,
    leftOut: {
      unread: shared.length - pairs.length,
      onlyFirst: first.length - shared.length,
      onlySecond: second.length - shared.length,
    },
  };
}
