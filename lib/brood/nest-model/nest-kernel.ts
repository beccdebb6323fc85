import { type Gate, gateValue } from '@/lib/brood/hmm/power-pass';
import {
  BLOCK,
  type Blocks,
  type Uniformised,
  blocksOf,
  heldBlocks,
  reachFrom,
  tickMass,
  uniformise,
} from '@/lib/brood/hmm/uniformised';
import { type PoissonWeights, poissonMean, poissonWeights } from '@/lib/brood/poisson';
import type { BroodModel } from './brood-model';
import type { Segment } from './timeline';

/** Masses below this share of a whole cell are dropped, and so are Poisson tails. */
export const LEAST = 1e-14;
const TAIL = 1e-10;
/** The ways in which a brood ends. */
const ENDS = 4;

/** A brood just laid, followed tick by tick: what every egg has in common. */
export interface EggRows {
  chain: Uniformised;
  /** State masses after 0, 1, 2, … ticks, and the blocks in which they lie. */
  rows: Float64Array[];
  blocks: Blocks[];
  /** Flow into the next egg, and into capped brood, per day. */
  relaid: number[];
  capping: number[];
}

/** A brood just capped, followed tick by tick on the states of one brood. */
interface CapRows {
  chain: Uniformised;
  /** State masses under the cap after 0, 1, 2, … ticks, until next to nothing is left there. */
  rows: Float64Array[];
}

/** The chain at one value of the nest factor, with everything that its cells share. */
export interface NestKernel {
  model: BroodModel;
  rho: number;
  full(rate: number): Uniformised;
  brood(rate: number): Uniformised;
  cappingGate(rate: number): Gate;
  weightsOf(mean: number): PoissonWeights;
  eggRows(rate: number, ticks: number): EggRows;
  capRows(rate: number): CapRows;
  /** Flows of a brood laid 0, 1, 2, … steps ago: into the next egg, into capped brood. */
  eggFlows(segment: Segment): { relaid: Float64Array; capping: Float64Array };
}

function kept<V>(make: (key: number) => V): (key: number) => V {
  const known = new Map<number, V>();
  return (key) => {
    const value = known.get(key) ?? make(key);
    known.set(key, value);
    return value;
  };
}

/** Adds rows until there are `ticks`. */
function extend(
  { chain, rows, blocks, relaid, capping }: EggRows,
  gates: { laying: Gate; capping: Gate },
  ticks: number,
) {
  while (rows.length < ticks) {
    const last = rows.at(-1) ?? new Float64Array(chain.states);
    const next = new Float64Array(chain.states);
    const n = rows.length;
    let active = blocks.at(-1) ?? blocksOf(chain, 1);
    if (n % (BLOCK / 2) === 1) {
      const held = active.slice();
      heldBlocks(last, held, { least: LEAST });
      active = reachFrom(chain, held);
    }
    tickMass(chain, { current: last, next }, active);
    rows.push(next);
    blocks.push(active);
    relaid.push(gateValue(gates.laying, next));
    capping.push(gateValue(gates.capping, next));
  }
}

/** Follows brood from the first phase under the cap until it is out or lost. */
function capRowsOf({ pupaPhase, broodSize }: BroodModel, chain: Uniformised): CapRows {
  const first = new Float64Array(broodSize);
  first[pupaPhase] = 1;
  const rows = [first];
  const blocks = blocksOf(chain, 1);
  for (let left = 1; left > LEAST && chain.clock > 0;) {
    const next = new Float64Array(broodSize);
    tickMass(chain, { current: rows.at(-1) ?? first, next }, blocks);
    next.fill(0, broodSize - ENDS);
    left = next.reduce((sum, p) => sum + p, 0);
    rows.push(next);
  }
  return { chain, rows };
}

/** Builds the shared work of one value of the nest factor. */
export function nestKernel(model: BroodModel, rho: number): NestKernel {
  const full = kept((rate) => uniformise(model.moves, [rho * rate, 1, 0]));
  const brood = kept((rate) => uniformise(model.broodMoves, [rho * rate, 1, 0]));
  const cappingGate = kept((rate) =>
    model.cappingStates.map(({ state, perDay }) => [state, perDay * rho * rate] as const),
  );
  const weightsOf = kept((mean) => poissonWeights(mean, TAIL));
  const rowsAt = kept((rate): EggRows => {
    const chain = full(rate);
    const first = new Float64Array(chain.states);
    first[model.eggState] = 1;
    const blocks = blocksOf(chain, 1);
    return { chain, rows: [first], blocks: [blocks], relaid: [0], capping: [0] };
  });
  const eggRows = (rate: number, ticks: number): EggRows => {
    const rows = rowsAt(rate);
    extend(rows, { laying: model.relayGate, capping: cappingGate(rate) }, ticks);
    return rows;
  };
  const capRows = kept((rate) => capRowsOf(model, brood(rate)));
  const flows = new Map<string, { relaid: Float64Array; capping: Float64Array }>();
  const eggFlows = ({ days, steps, rate }: Segment) => {
    const key = `${days} ${steps} ${rate}`;
    const known = flows.get(key);
    if (known) return known;
    const { clock } = full(rate);
    const { first, weights } = weightsOf(clock * days);
    const { relaid, capping } = eggRows(rate, first + weights.length);
    const read = (sequence: readonly number[]) => {
      const values = Float64Array.from(sequence);
      return Float64Array.from({ length: steps }, (_, k) => poissonMean(values, weightsOf((clock * days * k) / steps)));
    };
    const made = { relaid: read(relaid), capping: read(capping) };
    flows.set(key, made);
    return made;
  };
  return { model, rho, full, brood, cappingGate, weightsOf, eggRows, capRows, eggFlows };
}
