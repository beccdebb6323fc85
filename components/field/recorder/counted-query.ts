import { readCount } from '@/components/field/parts/read-count';

/** Carries the number of cells counted before the reading was opened over to the recorder. */
export function countedQuery(counted: number | null): string {
  return counted === null ? '' : `?counted=${counted}`;
}

/** Reads that number back from an address's query; null when there is none. */
export function countedOf(query: string): number | null {
  return readCount(new URLSearchParams(query).get('counted') ?? '');
}
