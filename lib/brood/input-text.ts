import { byWalkOrder } from '@/lib/comb/walk';
import type { DurationRow } from './durations';
import type { BroodMark, BroodReading } from './input';
import type { BroodSettings } from './settings';

/** Everything an answer depends on. */
interface InputTextParts {
  model: { name: string; version: string };
  settings: BroodSettings;
  row: DurationRow;
  zone: string;
  /** Local date of `asOf`: within a day the answer stays the same. */
  asOfDate: string;
  /** The development clock, `[from (epoch ms), rate]`; empty where days are calendar days. */
  rates: readonly (readonly [number, number])[];
  taxon: string | null;
  /** The readings looked at, oldest first. */
  readings: readonly BroodReading[];
}

function markText({ q, r, state, instar, unsure, reused }: BroodMark): unknown[] {
  return [q, r, state, instar ?? null, unsure ?? false, reused ?? false];
}

function readingText({ id, at, marks }: BroodReading): unknown[] {
  return [id, at, [...marks].sort(byWalkOrder).map(markText)];
}

function byName([a]: readonly [string, unknown], [b]: readonly [string, unknown]): number {
  return a < b ? -1 : 1;
}

function settingsText({ version, values, confusion, durationFactors = [] }: BroodSettings): unknown[] {
  const numbers = Object.entries(values).map(([name, { value }]) => [name, value] as const);
  const rows = Object.entries(confusion?.rows ?? {}).map(
    ([name, row]) => [name, Object.entries(row).sort(byName)] as const,
  );
  const factors = durationFactors.map(({ taxon, logMean, logSd }) => [taxon, logMean, logSd]);
  return [version, numbers.sort(byName), rows.sort(byName), factors];
}

/**
 * The canonical text of an estimate's input: equal inputs give equal texts, whatever order marks came in, and any
 * change that can move a date changes it. Stored nectar is left out, because it moves none.
 */
export function inputText(parts: InputTextParts): string {
  const { model, settings, row, zone, asOfDate, rates, taxon, readings } = parts;
  const { egg, larva, capped, referenceC } = row;
  return JSON.stringify([
    [model.name, model.version],
    settingsText(settings),
    [row.taxon, egg, larva, capped, referenceC, row.trust, row.source],
    [taxon, zone, asOfDate, rates],
    readings.map(readingText),
  ]);
}
