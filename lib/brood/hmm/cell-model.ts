import { type Chain, chainOf } from './chain';
import { BUILT, type BroodStates, broodStates, isOccupied } from './brood-states';
import { CLOCKS, type CellRates, broodMoves } from './brood-moves';
import { type Confusion, checkConfusion } from './emission';
import type { PhaseStage } from './stage-fit';
import type { Start } from './stations';
import type { Gate } from './power-pass';
import { type SpeedPiece, sliceMoves } from './transitions';

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
  /** One brood and what becomes of it: the phases of a generation, then its four ends. */
  brood: Chain;
  /** Number of the first phase of the first generation: where the states of `brood` lie among all. */
  broodOffset: number;
  /** 1 for the states of `brood` in which it lives. */
  broodLiving: Float64Array;
  /** 1 for all states with living brood. */
  living: Float64Array;
  /** The states before the first egg. */
  unlaid: readonly number[];
  /** The value of a brood just laid, among the states of `brood`. */
  entryGate: Gate;
  /** The flow into eggs per day, at given speeds of the clocks. */
  layingGate(speeds: readonly number[]): Gate;
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
  const broodOffset = states.phase(0, 0);
  const broodEnd = states.ends(0).lostCapped + 1;
  const living = Float64Array.from(states.keys, (key) => (isOccupied(key) ? 1 : 0));
  return {
    states,
    chain: chainOf(moves, pieces),
    brood: chainOf(sliceMoves(moves, broodOffset, broodEnd), pieces),
    broodOffset,
    broodLiving: living.slice(broodOffset, broodEnd),
    living,
    unlaid: [...states.generationOf.keys()].filter((s) => states.generationOf[s] === 0),
    entryGate: entryOf(stages[0]?.skipFirst ?? 0),
    layingGate: (speeds) => layingGate(states, rates, speeds[CLOCKS.calendar] ?? 1),
    confusion,
    start: { time: t0, mass },
  };
}

/** A brood just laid is in its first phase, or in its second where the first is skipped. */
function entryOf(skipFirst: number): Gate {
  return skipFirst > 0
    ? [
        [0, 1 - skipFirst],
        [1, skipFirst],
      ]
    : [[0, 1]];
}

/** Flow into eggs: from the new cell, and from the ends of every generation but the last. */
function layingGate(states: BroodStates, { layFirst, layNext }: CellRates, speed: number): Gate {
  const ends = Array.from({ length: states.generations - 1 }, (_, g) => Object.values(states.ends(g))).flat();
  return [[BUILT, layFirst * speed], ...ends.map((state: number) => [state, layNext * speed] as const)];
}
