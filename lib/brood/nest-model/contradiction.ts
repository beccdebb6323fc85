import type { BuildingPrior } from './building';
import { type CellLooks, likelihoods } from './cell-evidence';
import { forwardCells, sharedNewcomers } from './cell-forward';
import type { NestKernel } from './nest-kernel';
import type { Timeline } from './timeline';

/** Below this share of the likelihood the plain model counts as not explaining a record. */
const SHARE = 0.01;

/** A record with its likelihood under the floor that all records have. */
interface FlooredRecord {
  looks: CellLooks;
  prior: BuildingPrior;
  logLik: number;
}

/** One plain look that is not said to be a second brood contradicts nothing. */
function canContradict({ looks }: FlooredRecord): boolean {
  const all = looks.flat();
  return all.length >= 2 || all.some(({ reused }) => reused);
}

/** The records that only the floor under all records, a slip of the hand, makes possible. */
export function contradictoryRecords<R extends FlooredRecord>(
  kernel: NestKernel,
  timeline: Timeline,
  records: readonly R[],
): Set<R> {
  const open = records.filter(canContradict);
  const cells = open.map(({ looks, prior }) => ({ prior, seen: likelihoods(kernel.model, looks, 0) }));
  const newcomers = sharedNewcomers(kernel, timeline);
  const passes = forwardCells(kernel, timeline, { cells, newcomers, isFlowNeeded: false });
  return new Set(
    open.filter(({ logLik }, i) => {
      const plain = passes[i];
      return plain !== undefined && (plain.isImpossible || plain.logLik - logLik < Math.log(SHARE));
    }),
  );
}
