import { joinBlocks } from '@/lib/brood/hmm/uniformised';
import { type BackwardPart, type BackwardRecord, backwardCells } from './cell-backward';
import { type ForwardPass, forwardCells, sharedNewcomers } from './cell-forward';
import { type Future, type Outlook, outlookOf } from './cell-outlook';
import type { BuildingPrior } from './building';
import type { NestKernel } from './nest-kernel';
import type { Timeline } from './timeline';

/** Cells with equal records and equal building prior, worked out together. */
export interface CellGroup {
  /** Equal for equal records, whatever the prior. */
  record: string;
  prior: BuildingPrior;
  seen: readonly (Float64Array | null)[];
  /** How many cells. */
  cells: number;
}

/** A group at one value of the nest factor. */
export interface GroupAnswer {
  forward: Pick<ForwardPass, 'logLik' | 'last' | 'atLooks'>;
  /** P(first egg of the cell laid in each step), given everything seen. */
  first: Float64Array;
  /** P(present brood laid in each step), given that it is alive at the last look. */
  laid: Float64Array;
  /** P(present brood capped in each step), given the same; adds up to `cappedAlready` of the outlook. */
  capped: Float64Array;
  outlook: Outlook | null;
}

/** What all values of the nest factor have in common. */
export interface NestFrame {
  timeline: Timeline;
  groups: readonly CellGroup[];
  /** The time after each visit. */
  futures: readonly Future[];
}

/** Log-likelihood of everything seen at one value of the nest factor. */
export function nodeLogLik(kernel: NestKernel, { timeline, groups }: NestFrame): number {
  const newcomers = sharedNewcomers(kernel, timeline);
  const passes = forwardCells(kernel, timeline, { cells: groups, newcomers, isFlowNeeded: false });
  return groups.reduce((sum, { cells }, i) => sum + cells * (passes[i]?.logLik ?? 0), 0);
}

function sumOf(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0);
}

/** Scales to a sum; a law without mass stays empty. */
function scaledTo(values: Float64Array, sum: number): Float64Array {
  const now = sumOf(values);
  return now > 0 ? values.map((value) => (value * sum) / now) : values;
}

/** Puts the flows of the forward pass and the values of the backward pass together, step by step. */
function combine({ parts, logLik }: ForwardPass, backward: readonly BackwardPart[], steps: number) {
  const [first, laid, capped] = [new Float64Array(steps), new Float64Array(steps), new Float64Array(steps)];
  let edge = 0;
  parts.forEach((part, i) => {
    const back = backward[i];
    if (!back) return;
    const firstScale = Math.exp(part.log + back.firstLog - logLik);
    const presentScale = Math.exp(part.log + back.presentLog - logLik);
    part.first.forEach((flow, k) => {
      first[edge + k] = flow * (back.firstEgg[k] ?? 0) * firstScale;
      laid[edge + k] = (flow + (part.later[k] ?? 0)) * (back.presentEgg[k] ?? 0) * presentScale;
      capped[edge + k] = (part.capping[k] ?? 0) * (back.presentCapped[k] ?? 0) * presentScale;
    });
    edge += part.first.length;
  });
  return { first, laid, capped };
}

/** Backward passes by record; the blocks of states are those of all groups with the record. */
function backwardByRecord(kernel: NestKernel, { timeline, groups }: NestFrame, forwards: readonly ForwardPass[]) {
  const byRecord = new Map<string, BackwardRecord>();
  groups.forEach(({ record, seen }, i) => {
    const used = (forwards[i]?.parts ?? []).map((part) => part.used.slice());
    const known = byRecord.get(record);
    if (known) known.used.forEach((blocks, k) => joinBlocks(blocks, used[k] ?? blocks));
    else byRecord.set(record, { seen, used });
  });
  const passes = backwardCells(kernel, timeline.segments, [...byRecord.values()]);
  return new Map([...byRecord.keys()].map((record, i) => [record, passes[i] ?? []]));
}

/** Everything about the groups at one value of the nest factor. */
export function nodeAnswer(kernel: NestKernel, frame: NestFrame): { logLik: number; groups: GroupAnswer[] } {
  const { timeline, groups, futures } = frame;
  const newcomers = sharedNewcomers(kernel, timeline);
  const forwards = forwardCells(kernel, timeline, { cells: groups, newcomers, isFlowNeeded: true });
  const backwards = backwardByRecord(kernel, frame, forwards);
  const answers = forwards.map((forward, i): GroupAnswer => {
    const { record = '', seen = [] } = groups[i] ?? {};
    const { first, laid, capped } = combine(forward, backwards.get(record) ?? [], timeline.edges.length - 1);
    const future = futures[seen.length - 1];
    const outlook = future ? outlookOf(kernel, forward.last, future) : null;
    const { logLik, last, atLooks } = forward;
    const everLaid = 1 - neverLaid(kernel, atLooks.at(-1) ?? last);
    return {
      forward: { logLik, last, atLooks },
      first: scaledTo(first, everLaid),
      laid: scaledTo(laid, 1),
      capped: scaledTo(capped, outlook?.cappedAlready ?? 0),
      outlook,
    };
  });
  return {
    logLik: answers.reduce((sum, { forward }, i) => sum + forward.logLik * (groups[i]?.cells ?? 0), 0),
    groups: answers,
  };
}

/** P(no egg yet) at the last look. */
function neverLaid({ model }: NestKernel, whole: Float64Array): number {
  return whole.reduce((sum, p, s) => sum + ((model.states.generationOf[s] ?? 0) === 0 ? p : 0), 0);
}
