import type { BuildingPrior } from './building';
import { type CellLooks, likelihoods } from './cell-evidence';
import { forwardCells, sharedNewcomers } from './cell-forward';
import type { NestKernel } from './nest-kernel';
import type { Timeline } from './timeline';

/** Below this share of the likelihood the plain model counts as not explaining a record. */
const SHARE = 0.01;

/** Is it only the floor under all records, a slip of the hand, that makes this record possible? */
export function isContradictory(
  kernel: NestKernel,
  timeline: Timeline,
  { looks, prior }: { looks: CellLooks; prior: BuildingPrior },
): boolean {
  const all = looks.flat();
  if (all.length < 2 && !all.some(({ reused }) => reused)) return false;
  const newcomers = sharedNewcomers(kernel, timeline);
  const floors = [0, kernel.model.settings.values.slipFloor.value];
  const cells = floors.map((floor) => ({ prior, seen: likelihoods(kernel.model, looks, floor) }));
  const [plain, floored] = forwardCells(kernel, timeline, { cells, newcomers, isFlowNeeded: false });
  if (!plain || !floored) return false;
  return plain.isImpossible || plain.logLik - floored.logLik < Math.log(SHARE);
}
