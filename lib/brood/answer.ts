import type { CellState } from '@/lib/comb/states';
import type { DurationRow } from './durations';
import type { HeatWarning } from './temperature/clock-parts';

/** A median and three central ranges, earliest first. */
export interface Spread {
  median: string;
  p50: [string, string];
  p80: [string, string];
  p95: [string, string];
}

/** A dated event: local dates of the nest (`YYYY-MM-DD`), and the same as UTC instants. */
export interface DateRange extends Spread {
  utc: Spread;
}

/** When an adult comes out if the brood lives, and the probability that it does. */
export interface EmergenceRange extends DateRange {
  probability: number;
}

/** One cell of the answer. */
export interface CellEstimate {
  q: number;
  r: number;
  /** The state last recorded, `unread` only when nothing else ever was. */
  state: CellState;
  /** Which brood of this cell is meant, the most likely one; 0 when most likely none was laid yet. */
  generation: number;
  /** Null when the cell holds no living brood that can be dated. */
  laid: DateRange | null;
  capped: DateRange | null;
  emerges: EmergenceRange | null;
  /** Probability that the brood of this generation is lost before an adult comes out. */
  lost: { probability: number };
}

/** Adults to expect on one local day. */
export interface EmergenceDay {
  date: string;
  expected: number;
  lo80: number;
  hi80: number;
}

/** Green: move; amber: the last days before workers; red: workers are out or due; grey: nothing can be dated. */
export type Season = 'green' | 'amber' | 'red' | 'grey';

/** The nest as a whole. */
export interface NestEstimate {
  id: string;
  founded: DateRange | null;
  /** Null when nothing can be dated, or when adults have come out already (flag `past`). */
  firstEmergence: DateRange | null;
  emergencePerDay: EmergenceDay[];
  /** Development relative to the durations: above 1 is faster. */
  rateMultiplier: { median: number; p95: [number, number] };
  season: Season;
  /** Brood now in the comb that is expected to be lost before an adult comes out, by the stage it is lost in. */
  expectedLosses: { egg: number; larva: number; capped: number };
}

/** What a flag is about. */
export type FlagCode =
  | 'past'
  | 'nothing-dated'
  | 'guard'
  | 'capped-to-egg'
  | 'capped-gone'
  | 'relaid'
  | 'step-back'
  | 'too-fast'
  | 'too-slow'
  | 'not-looked-at'
  | 'instar-mismatch'
  | 'other-genus'
  | 'contradictory'
  | HeatWarning['code'];

/** Something surprising about one cell, or about the nest when there is no `cell`. Nothing is refused for it. */
export interface BroodFlag {
  cell?: { q: number; r: number };
  code: FlagCode;
  text: string;
}

/** The answer of `GET /api/nests/<id>/brood`. */
export interface BroodEstimate {
  /** UTC instant. */
  asOf: string;
  zone: string;
  model: { name: string; version: string };
  settings: { version: string };
  durations: Omit<DurationRow, 'publishedTotal'>;
  temperature: { kind: 'logger' | 'daily' | 'none'; from: string | null; to: string | null; note: string };
  /** Ids of the readings looked at, oldest first. */
  readings: string[];
  inputDigest: string;
  cells: CellEstimate[];
  nest: NestEstimate;
  flags: BroodFlag[];
  assumptions: string[];
  /** Standard deviation, in days, of the laying date of the brood that comes out first: from its place on the comb alone, and with the readings. */
  information: { priorSd: number; posteriorSd: number };
}
