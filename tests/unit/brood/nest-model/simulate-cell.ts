import type { Random } from '@/lib/kit/random';
import type { Confusion } from '@/lib/brood/hmm/emission';
import { CELL_CLASSES, RECORDED_CLASSES } from '@/lib/brood/nest-model/confusion';
import { STAGES, stageLaws } from '@/lib/brood/stages';
import type { DurationRow } from '@/lib/brood/durations';
import type { BroodSettings } from '@/lib/brood/settings';

/** A stretch of a cell's life in one true class. */
interface Stay {
  from: number;
  className: string;
  generation: number;
}

/** One brood of a simulated cell. */
export interface TrueBrood {
  laid: number;
  capped: number | null;
  out: number | null;
  /** When it left the cell, alive or lost. */
  end: number;
}

/** A simulated cell: what was true at any time. */
export interface TrueCell {
  stays: Stay[];
  broods: TrueBrood[];
}

const exponential = (random: Random, rate: number) => (rate > 0 ? -Math.log(1 - random()) / rate : Infinity);

/** Sum of k exponential phases. */
function erlang(random: Random, phases: number, rate: number): number {
  let sum = 0;
  for (let i = 0; i < phases; i++) sum += exponential(random, rate);
  return sum;
}

/** Event by event: a brood from its egg to its end, development at `rho`, losses by the calendar. */
function simulateBrood(
  random: Random,
  { row, settings, rho }: Life,
  { laid, generation, stays }: { laid: number; generation: number; stays: Stay[] },
): TrueBrood {
  const { lossEgg, lossLarva, lossCapped } = settings.values;
  let time = laid;
  let capped: number | null = null;
  for (const [i, { phases, meanDays }] of stageLaws(row, settings).entries()) {
    const name = STAGES[i] ?? '';
    stays.push({ from: time, className: name, generation });
    if (name === 'pupa') capped = time;
    const late = name === 'pupa' ? lossCapped : lossLarva;
    const loss = exponential(random, (i === 0 ? lossEgg : late).value);
    const stage = erlang(random, phases, (rho * phases) / meanDays);
    if (loss < stage) {
      stays.push({ from: time + loss, className: 'empty', generation });
      return { laid, capped, out: null, end: time + loss };
    }
    time += stage;
  }
  stays.push({ from: time, className: 'emerged', generation });
  return { laid, capped, out: time, end: time };
}

/** What a simulated cell lives by. */
export interface Life {
  row: DurationRow;
  settings: BroodSettings;
  rho: number;
}

/** Simulates a cell from the day it is built, with plain chance and no matrices. */
export function simulateCell(random: Random, life: Life, built: number): TrueCell {
  const { layFirst, layNext, generations } = life.settings.values;
  const stays: Stay[] = [
    { from: -Infinity, className: 'absent', generation: 0 },
    { from: built, className: 'empty', generation: 0 },
  ];
  const broods: TrueBrood[] = [];
  let laid = built + exponential(random, layFirst.value);
  for (let g = 1; g <= generations.value; g++) {
    const brood = simulateBrood(random, life, { laid, generation: g, stays });
    broods.push(brood);
    laid = brood.end + exponential(random, layNext.value);
  }
  return { stays, broods };
}

/** The true class at a time. */
export function classAt({ stays }: TrueCell, time: number): string {
  return stays.findLast(({ from }) => from <= time)?.className ?? 'absent';
}

/** The brood that is alive at a time. */
export function broodAt({ broods }: TrueCell, time: number): TrueBrood | null {
  return broods.find(({ laid, end }) => laid <= time && time < end) ?? null;
}

/** Draws what a reader records of a true class. */
export function recorded(
  random: Random,
  { confusion, floor }: { confusion: Confusion; floor: number },
  className: string,
): string {
  if (random() < floor) return RECORDED_CLASSES[Math.floor(random() * RECORDED_CLASSES.length)] ?? 'empty';
  let left = random();
  for (const [seen, p] of Object.entries(confusion[className] ?? {})) {
    left -= p;
    if (left < 0) return seen;
  }
  return CELL_CLASSES[className]?.recorded ?? className;
}
