import { type BroodStates, BUILT, broodStates, isOccupied } from '@/lib/brood/hmm/brood-states';
import { broodMoves } from '@/lib/brood/hmm/brood-moves';
import type { Confusion } from '@/lib/brood/hmm/emission';
import type { Gate } from '@/lib/brood/hmm/power-pass';
import { erlangStage } from '@/lib/brood/hmm/stage-fit';
import { type Transitions, sliceMoves } from '@/lib/brood/hmm/transitions';
import type { DurationRow } from '@/lib/brood/durations';
import type { BroodSettings } from '@/lib/brood/settings';
import { STAGES, stageLaws } from '@/lib/brood/stages';

/** The hidden Markov chain of a *Polistes* cell once it is built, under given settings. */
export interface BroodModel {
  settings: BroodSettings;
  row: DurationRow;
  states: BroodStates;
  moves: Transitions;
  /** One brood alone: its phases, then its four ends. */
  broodMoves: Transitions;
  /** First phase of the egg of the first generation; the states of one brood begin here. */
  eggState: number;
  /** First phase of the pupa, counted from `eggState`. */
  pupaPhase: number;
  /** Number of states of one brood, its four ends included. */
  broodSize: number;
  /** 1 for the phases of one brood, 0 for its ends. */
  broodLiving: Float64Array;
  /** Last phase before the cap in each generation, with its rate at factor 1. */
  cappingStates: readonly { state: number; perDay: number }[];
  /** Flow from emptied cells into the next egg, per day. */
  relayGate: Gate;
  /** Laying into a new cell, per day. */
  layFirst: number;
  /** True class of each state, as the confusion matrix names it. */
  classes: readonly string[];
  /** Confusion of what is recorded; rows as readers make them, no floor. */
  confusion: Confusion;
}

const LAST_LARVA = STAGES.length - 2;

/** The stages with their losses. */
function phaseStages(row: DurationRow, settings: BroodSettings) {
  const { lossEgg, lossLarva, lossCapped } = settings.values;
  const losses = [lossEgg, lossLarva, lossLarva, lossLarva, lossLarva, lossLarva, lossCapped];
  return stageLaws(row, settings).map(({ phases, meanDays }, i) => ({
    name: STAGES[i] ?? '',
    ...erlangStage(phases, meanDays),
    lossPerDay: losses[i]?.value ?? 0,
  }));
}

/** Builds the chain of a cell from the durations and the settings in force. */
export function broodModel(row: DurationRow, settings: BroodSettings, confusion: Confusion): BroodModel {
  const { layFirst, layNext, generations } = settings.values;
  const stages = phaseStages(row, settings);
  const states = broodStates(stages, generations.value);
  const moves = broodMoves(states, { build: 0, layFirst: layFirst.value, layNext: layNext.value });
  const eggState = states.phase(0, 0);
  const broodEnd = states.ends(0).lostCapped + 1;
  const generationsList = Array.from({ length: generations.value }, (_, g) => g);
  const lastLarva = stages[LAST_LARVA] ?? { phases: 1, rate: 1 };
  return {
    settings,
    row,
    states,
    moves,
    broodMoves: sliceMoves(moves, eggState, broodEnd),
    eggState,
    pupaPhase: states.phase(0, STAGES.length - 1) - eggState,
    broodSize: broodEnd - eggState,
    broodLiving: Float64Array.from(states.keys.slice(eggState, broodEnd), (key) => (isOccupied(key) ? 1 : 0)),
    cappingStates: generationsList.map((g) => ({
      state: states.phase(g, LAST_LARVA) + lastLarva.phases - 1,
      perDay: lastLarva.rate,
    })),
    relayGate: generationsList
      .slice(0, -1)
      .flatMap((g) => Object.values(states.ends(g)).map((state: number) => [state, layNext.value] as const)),
    layFirst: layFirst.value,
    classes: states.keys.map((key, s) => (key.startsWith('EM#') ? 'emerged' : (states.classes[s] ?? ''))),
    confusion,
  };
}

/** The state of a new cell without an egg. */
export const NEW_CELL = BUILT;
