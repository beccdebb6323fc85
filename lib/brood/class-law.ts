import { type DayLaw, dayLaws } from './day-law';
import { type LossByStage, lossesByNode } from './losses';
import { type FactorNode, factorNodes } from './nest-factor';
import { passageSince, passageTo } from './passage';
import { type PhaseChain, equilibriumWeights, phaseChain, phasesOf } from './phase-chain';
import type { BroodSettings } from './settings';
import { STAGES, type StageGroup, stageLaws } from './stages';
import type { DurationRow } from './durations';

/** What one sighting of a class says, in days before or after the sighting. */
export interface ClassLaw {
  /** Days since the egg was laid. */
  sinceLaid: DayLaw;
  /** Days to or since capping, whichever applies. */
  capping: { law: DayLaw; isPast: boolean };
  /** Days until the adult comes out. */
  untilOut: DayLaw;
  /** How the brood ends, for each value of the nest factor. */
  losses: readonly LossByStage[];
}

/** The developmental model of a taxon under given settings: its stages as phases, and the factor shared by a nest. */
export interface NestModel {
  settings: BroodSettings;
  row: DurationRow;
  chain: PhaseChain;
  nodes: readonly FactorNode[];
}

/** Builds the model from the durations and the settings in force. */
export function nestModel(row: DurationRow, settings: BroodSettings): NestModel {
  return {
    settings,
    row,
    chain: phaseChain(stageLaws(row, settings)),
    nodes: factorNodes(settings.values.nestFactorCv.value),
  };
}

const PUPA = STAGES.length - 1;

/** The three passages of a class: since laid, to or since capping, until out. */
function passages(chain: PhaseChain, group: StageGroup): Float64Array[] {
  const weights = equilibriumWeights(chain, phasesOf(chain, group));
  const firstPupal = chain.starts[PUPA] ?? 0;
  const capping =
    group.first === PUPA ? passageSince(chain, firstPupal, weights) : passageTo(chain, weights, firstPupal);
  return [passageSince(chain, 0, weights), capping, passageTo(chain, weights, chain.rates.length)];
}

/**
 * The exact law of one sighting of each class, when the egg may have been laid at any time (flat prior): the present
 * phase is spread by the time spent in each, the past and the rest of development follow phase by phase.
 */
export function classLaws(model: NestModel, groups: readonly StageGroup[]): Map<string, ClassLaw> {
  const { chain, nodes, settings } = model;
  const laws = dayLaws(
    chain.clock,
    nodes,
    groups.flatMap((group) => passages(chain, group)),
  );
  const byKey = new Map<string, ClassLaw>();
  groups.forEach((group, i) => {
    const [sinceLaid, capping, untilOut] = laws.slice(3 * i, 3 * i + 3);
    if (!sinceLaid || !capping || !untilOut) return;
    const losses = lossesByNode(chain, settings, { group, nodes });
    byKey.set(group.key, { sinceLaid, capping: { law: capping, isPast: group.first === PUPA }, untilOut, losses });
  });
  return byKey;
}

/** The law of the whole development, for a cell whose adult has just come out. */
export function wholeLaw({ chain, nodes }: NestModel): DayLaw {
  const start = new Float64Array(chain.rates.length);
  start[0] = 1;
  const [law] = dayLaws(chain.clock, nodes, [passageTo(chain, start, chain.rates.length)]);
  return law ?? { byNode: [], mixed: Float64Array.of(1) };
}
