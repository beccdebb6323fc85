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
  hasTemperature: boolean;
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

function settingsText({ version, values }: BroodSettings): unknown[] {
  const numbers = Object.entries(values).map(([name, { value }]) => [name, value] as const);
  return [version, numbers.sort(([a], [b]) => (a < b ? -1 : 1))];
}

/**
 * The canonical text of an estimate's input: equal inputs give equal texts, whatever order marks came in, and any
 * change that can move a date changes it. Stored nectar is left out, because it moves none.
 */
export function inputText(parts: InputTextParts): string {
  const { model, settings, row, zone, asOfDate, hasTemperature, taxon, readings } = parts;
  const { egg, larva, capped, referenceC } = row;
  return JSON.stringify([
    [model.name, model.version],
    settingsText(settings),
    [row.taxon, egg, larva, capped, referenceC, row.trust, row.source],
    [taxon, zone, asOfDate, hasTemperature],
    readings.map(readingText),
  ]);
}
