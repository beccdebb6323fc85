import type { CellState } from '@/lib/comb/states';
import type { BroodSettings } from './settings';
import type { TemperatureRecord } from './temperature/record';
import type { Place } from './temperature/sun-times';

/** What one reading says about one cell, as far as its dates can depend on it. */
export interface BroodMark {
  q: number;
  r: number;
  state: CellState;
  /** Larval instar 1–5 where a reviewer gave it. */
  instar?: number | null;
  /** Stored nectar; it changes no date. */
  nectar?: boolean;
  unsure?: boolean;
  /** New brood in a cell an adult has left. */
  reused?: boolean;
}

/** One reading of a nest: at most one mark a cell. */
export interface BroodReading {
  id: string;
  /** When the comb was looked at, epoch milliseconds. */
  at: number;
  marks: readonly BroodMark[];
}

/** Everything an estimate is made from; nothing else is read. */
export interface BroodInput {
  /** The nest's id, echoed in the answer. */
  nest: string;
  /** IANA zone of the nest; all dates in the answer are its local dates. */
  zone: string;
  /** Epoch milliseconds; later readings are not looked at. */
  asOf: number;
  readings: readonly BroodReading[];
  taxon: string | null;
  /** The team's settings; the product's defaults when left out. */
  settings?: BroodSettings;
  /** What was measured at the nest; development follows it. Without one, days are calendar days. */
  temperature?: TemperatureRecord | null;
  /** Where the nest hangs, for sunrise and sunset. */
  place?: Place | null;
  /** Shortens the canonical input text to `inputDigest`; without it the text itself is the digest. */
  digest?: (text: string) => string;
}
