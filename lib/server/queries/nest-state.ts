import 'server-only';
import { isLocked } from './census';
import type { ReadingRow } from './reading-rows';

/** How far the work on a nest has come. */
export type NestState = 'new' | 'reading' | 'submitted' | 'settled' | 'locked' | 'archived';

/**
 * How far the work on a nest has come, by the readings of its latest visit that has any.
 *
 * @param archivedAt when the nest was archived; null for a nest at work.
 */
export function nestState(archivedAt: Date | null, readings: readonly ReadingRow[]): NestState {
  if (archivedAt) return 'archived';
  if (readings.length === 0) return 'new';
  const finals = readings.filter((reading) => reading.kind === 'final');
  if (finals.some(isLocked)) return 'locked';
  if (finals.length > 0) return 'settled';
  return readings.some((reading) => reading.submitted_at === null) ? 'reading' : 'submitted';
}
