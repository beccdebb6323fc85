import { type Chain, chainOf } from './chain';
import { type BroodStates, broodStates, isOccupied } from './brood-states';
import { type CellRates, broodMoves } from './brood-moves';
import { type Confusion, checkConfusion } from './emission';
import type { PhaseStage } from './stage-fit';
import type { Start } from './stations';
import { type SpeedPiece, keepMoves } from './transitions';

/** What a cell model is made from. */
interface CellModelParts {
  stages: readonly PhaseStage[];
  generations: number;
  rates: CellRates;
  /** Speeds of the development, calendar and building clocks. */
  pieces: readonly SpeedPiece[];
  confusion: Confusion;
  /** Day on which the cell is known to be in the start state. */
  t0: number;
  /** Key of the start state, `N` or `B` or a stage such as `egg#1`, which starts in its first phase. */
  startKey: string;
}

/** One cell as a hidden Markov chain. */
export interface CellModel {
  states: BroodStates;
  /** The cell with everything that can happen to it. */
  chain: Chain;
  /** The brood now in the cell and what becomes of it: nothing is laid any more. */
  broodChain: Chain;
  confusion: Confusion;
  start: Start;
}

/**
 * Builds the hidden Markov chain of one cell.
 *
 * @throws ConfusionError when the matrix lacks a row or a row does not sum to 1.
 * @throws RangeError when there is no such start state.
 */
export function cellModel({ stages, generations, rates, pieces, confusion, t0, startKey }: CellModelParts): CellModel {
  const states = broodStates(stages, generations);
  checkConfusion(confusion, [...new Set(states.classes)]);
  const moves = broodMoves(states, rates);
  const first = states.keys.indexOf(startKey);
  if (first < 0) throw new RangeError(`no state ${startKey}`);
  const mass = new Float64Array(states.count);
  mass[first] = 1;
  return {
    states,
    chain: chainOf(moves, pieces),
    broodChain: chainOf(
      keepMoves(moves, (source) => isOccupied(states.keys[source] ?? '')),
      pieces,
    ),
    confusion,
    start: { time: t0, mass },
  };
}
