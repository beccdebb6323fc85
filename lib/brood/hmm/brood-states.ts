import type { PhaseStage } from './stage-fit';

/** The states of one cell, numbered. */
export interface BroodStates {
  count: number;
  stages: readonly PhaseStage[];
  generations: number;
  /** First phase of a stage of a generation, both counted from 0. */
  phase(generation: number, stage: number): number;
  /** The four empty states that end a generation. */
  ends(generation: number): BroodEnds;
  /** 1 for the states in which brood of this generation (from 1) lives, else 0. */
  occupied(generation: number): Float64Array;
  /** Generation of each state from 1; 0 before the first egg. */
  generationOf: Int32Array;
  /** Name of what each state is: `N`, `B`, `egg#1`, …, `EM#1`, `RMe#1`, …; phases of a stage share one. */
  keys: readonly string[];
  /** True class of each state, as readers see it: `absent`, `empty` or a stage. */
  classes: readonly string[];
}

/** How a brood ends: adult emerged, or lost as egg, larva or capped brood. */
interface BroodEnds {
  emerged: number;
  lostEgg: number;
  lostLarva: number;
  lostCapped: number;
}

/** The cell is not built yet. */
export const NOT_BUILT = 0;
/** The cell is built and no egg was laid in it yet. */
export const BUILT = 1;

const END_KEYS = ['EM', 'RMe', 'RMl', 'RMp'] as const;

/** Positions of the first phases within a generation, then the number of phases. */
function phaseStarts(stages: readonly PhaseStage[]): number[] {
  return stages.reduce<number[]>((starts, { phases }) => [...starts, (starts.at(-1) ?? 0) + phases], [0]);
}

/** Keys and classes of one generation's states. */
function generationStates(stages: readonly PhaseStage[], generation: number): { key: string; name: string }[] {
  const phases = stages.flatMap(({ name, phases: count }) =>
    Array.from({ length: count }, () => ({ key: `${name}#${generation}`, name })),
  );
  return [...phases, ...END_KEYS.map((end) => ({ key: `${end}#${generation}`, name: 'empty' }))];
}

/** Numbers the states: N, B, then for each generation its phases and its four ends. */
export function broodStates(stages: readonly PhaseStage[], generations: number): BroodStates {
  const starts = phaseStarts(stages);
  const size = (starts.at(-1) ?? 0) + END_KEYS.length;
  const offset = (generation: number) => 2 + generation * size;
  const living = Array.from({ length: generations }, (_, g) => generationStates(stages, g + 1)).flat();
  const all = [{ key: 'N', name: 'absent' }, { key: 'B', name: 'empty' }, ...living];
  const generationOf = Int32Array.from(all, (_, s) => (s < 2 ? 0 : Math.floor((s - 2) / size) + 1));
  return {
    count: all.length,
    stages,
    generations,
    phase: (generation, stage) => offset(generation) + (starts[stage] ?? 0),
    ends: (generation) => {
      const emerged = offset(generation) + (starts.at(-1) ?? 0);
      return { emerged, lostEgg: emerged + 1, lostLarva: emerged + 2, lostCapped: emerged + 3 };
    },
    occupied: (generation) =>
      Float64Array.from(all, ({ key }, s) => (generationOf[s] === generation && isOccupied(key) ? 1 : 0)),
    generationOf,
    keys: all.map(({ key }) => key),
    classes: all.map(({ name }) => name),
  };
}

/** Is this a state with living brood in the cell? */
export function isOccupied(key: string): boolean {
  return key !== 'N' && key !== 'B' && !END_KEYS.some((end) => key.startsWith(`${end}#`));
}

/** The probability of each kind of state, by key, in the order of the states. */
export function byKey({ keys }: BroodStates, mass: Float64Array): Record<string, number> {
  const sums = new Map<string, number>();
  keys.forEach((key, s) => sums.set(key, (sums.get(key) ?? 0) + (mass[s] ?? 0)));
  return Object.fromEntries(sums);
}
