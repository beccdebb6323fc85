import { BUILT, type BroodStates, NOT_BUILT } from './brood-states';
import type { PhaseStage } from './stage-fit';
import { type Move, type Transitions, transitions } from './transitions';

/** The clocks of the model: development runs with temperature, the calendar does not, building has its own hazard. */
export const CLOCKS = { development: 0, calendar: 1, building: 2 } as const;

/** Rates per calendar day of what is not development. */
export interface CellRates {
  /** Not built → built, multiplied by the speed of the building clock. */
  build: number;
  /** Built → first egg. */
  layFirst: number;
  /** Empty after a brood → egg of the next one. */
  layNext: number;
}

/** Moves into a stage: to its first phase, or to its second where the first is skipped. */
function entering(
  source: number,
  first: number,
  { stage, clock, rate }: { stage: PhaseStage; clock: number; rate: number },
): Move[] {
  const moves = [
    { source, target: first, clock, rate: rate * (1 - stage.skipFirst) },
    { source, target: first + 1, clock, rate: rate * stage.skipFirst },
  ];
  return moves.filter((move) => move.rate > 0);
}

/** Development of one stage: from phase to phase, then into the next stage or out of the cell. */
function developing(states: BroodStates, generation: number, index: number): Move[] {
  const stage = states.stages[index];
  if (!stage) return [];
  const { phases, rate } = stage;
  const first = states.phase(generation, index);
  const clock = CLOCKS.development;
  const within = Array.from({ length: phases - 1 }, (_, i) => ({
    source: first + i,
    target: first + i + 1,
    clock,
    rate,
  }));
  const last = first + phases - 1;
  const next = states.stages[index + 1];
  const out = next
    ? entering(last, states.phase(generation, index + 1), { stage: next, clock, rate })
    : [{ source: last, target: states.ends(generation).emerged, clock, rate }];
  return [...within, ...out];
}

/** Losses of one stage: the first counts as egg, the last as capped brood, what lies between as larva. */
function losing(states: BroodStates, generation: number, index: number): Move[] {
  const stage = states.stages[index];
  if (!stage || stage.lossPerDay === 0) return [];
  const { lostEgg, lostLarva, lostCapped } = states.ends(generation);
  const isLast = index === states.stages.length - 1;
  const lateTarget = isLast ? lostCapped : lostLarva;
  const target = index === 0 ? lostEgg : lateTarget;
  const first = states.phase(generation, index);
  return Array.from({ length: stage.phases }, (_, i) => ({
    source: first + i,
    target,
    clock: CLOCKS.calendar,
    rate: stage.lossPerDay,
  }));
}

/** Laying into the egg of a generation: from the empty new cell, or from the ends of the generation before. */
function laying(states: BroodStates, generation: number, rates: CellRates): Move[] {
  const [egg] = states.stages;
  if (!egg) return [];
  const first = states.phase(generation, 0);
  const sources = generation === 0 ? [BUILT] : Object.values(states.ends(generation - 1));
  const rate = generation === 0 ? rates.layFirst : rates.layNext;
  return sources.flatMap((source: number) => entering(source, first, { stage: egg, clock: CLOCKS.calendar, rate }));
}

/** All moves of a cell: built, laid in, developing, lost, emerged, laid in again. */
export function broodMoves(states: BroodStates, rates: CellRates): Transitions {
  const building = { source: NOT_BUILT, target: BUILT, clock: CLOCKS.building, rate: rates.build };
  const generations = Array.from({ length: states.generations }, (_, g) => [
    ...laying(states, g, rates),
    ...states.stages.flatMap((_stage, index) => [...developing(states, g, index), ...losing(states, g, index)]),
  ]);
  return transitions(states.count, Object.keys(CLOCKS).length, [building, ...generations.flat()]);
}
