import 'server-only';

/** The years a DATETIME column holds. */
const EARLIEST_MS = Date.UTC(1000, 0, 1);
const LATEST_MS = Date.UTC(9999, 11, 31, 23, 59, 59, 999);

/** An instant as a date the database can hold; absurd years are brought to its ends, the text beside keeps them. */
export function storedDate(epochMs: number): Date {
  return new Date(Math.min(LATEST_MS, Math.max(EARLIEST_MS, epochMs)));
}
