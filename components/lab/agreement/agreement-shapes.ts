import type { SharePoint } from '@/components/charts/share-point';
import type { CellState } from '@/lib/comb/states';

/** One month of a trend over cells. */
export interface TrendPointView extends SharePoint {
  agreed: number;
  combs: number;
}

/** A reader's agreement over a season. */
export interface ReaderTrendView {
  key: string;
  reader: string;
  comparison: 'field-field' | 'field-lab' | 'other-reader' | 'same-reader';
  points: readonly TrendPointView[];
}

/** Field and lab about one state over a season. */
export interface StateTrendView {
  state: CellState;
  points: readonly TrendPointView[];
}

/** What a person's locked readings teach. */
export interface PersonNotesView {
  key: string;
  name: string;
  own: boolean;
  readings: number;
  cells: number;
  stood: number;
  notes: readonly { read: CellState; settled: CellState; words: string }[];
}

/** A locked reading drawn to be read again. */
export interface RereadingView {
  id: string;
  month: string;
  nest: { id: string; code: string };
  visitDate: string;
  purpose: string;
  reader: string;
  standing: 'waiting' | 'under way' | 'done';
  seed: number;
}

/** What a reading is compared with. */
export const COMPARISON_WORDS: Readonly<Record<ReaderTrendView['comparison'], string>> = {
  'field-field': 'two readings at the nest',
  'field-lab': 'at the nest, with the lab',
  'other-reader': 'in the lab, with another reader',
  'same-reader': 'in the lab, with the own earlier reading',
};

/** Every month in which any of the trends has a point, in order. */
export function monthsOf(trends: readonly { points: readonly { month: string }[] }[]): string[] {
  return [...new Set(trends.flatMap(({ points }) => points.map(({ month }) => month)))].sort();
}
