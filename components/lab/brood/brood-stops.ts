import { estimateDay } from '@/components/lab/estimate-day';
import type { NestView } from '@/components/lab/lab-shapes';
import { purposeWords } from '@/components/lab/lab-words';
import { dateWords, momentWords } from '@/components/ui/date-words';
import { localDate } from '@/lib/kit/local-date';

/** A point in time one can look back to: a visit with a reading, or now. */
export interface BroodStop {
  /** The id of the visit, or `now`. */
  key: string;
  /** `Check, 18 June, 05:35`, or `Today, 20 June`. */
  label: string;
  /** Epoch milliseconds: what was seen later is not looked at; null for the end of today. */
  asOf: number | null;
  /** The local day. */
  day: string;
}

interface StopsInput {
  nest: NestView;
  /** The readings that speak for the visits. */
  readings: readonly { id: string; at: number }[];
  nowMs: number;
  zone: string;
}

/**
 * The stops of a nest, oldest first: one a visit that has a reading one may see, then today while the last reading is
 * fresh enough to look ahead from.
 */
export function broodStops({ nest, readings, nowMs, zone }: StopsInput): BroodStop[] {
  const today = localDate(nowMs, zone);
  const stops = [...readings]
    .sort((a, b) => a.at - b.at)
    .flatMap(({ id, at }): BroodStop[] => {
      const visit = nest.visits.find((candidate) => candidate.readings.some((reading) => reading.id === id));
      if (!visit) return [];
      const label = `${purposeWords(visit.purpose)}, ${momentWords(at, zone, today)}`;
      return [{ key: visit.id, label, asOf: at, day: localDate(at, zone) }];
    });
  const last = stops.at(-1);
  if (!last || last.day >= today) return stops;
  const isFresh = estimateDay({ visitAt: last.asOf, chosen: false, nowMs, zone }) === today;
  return isFresh ? [...stops, { key: 'now', label: `Today, ${dateWords(today)}`, asOf: null, day: today }] : stops;
}

/** The address of a nest's brood as known at a stop. */
export function stopHref(nest: string, key: string): string {
  return `/nests/${nest}/brood?visit=${key}`;
}
