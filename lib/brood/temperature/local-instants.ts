import { localParts } from '@/lib/kit/local-date';

const MINUTE_MS = 60_000;
const DAY_MS = 86_400_000;
/** Zones change their offset on quarters of an hour only. */
const QUARTER_MS = 15 * MINUTE_MS;

/** Turns wall times of one zone into instants. */
export interface LocalInstants {
  /**
   * The instants at which the clocks of the zone showed a time: one, none where they skipped it, two where they
   * showed it twice.
   *
   * @param wallMs the wall time, read as if it were UTC, epoch milliseconds.
   */
  (wallMs: number): number[];
}

/** The zone's clocks; each quarter of an hour is looked up once, since files hold tens of thousands of lines. */
export function localInstants(zone: string): LocalInstants {
  const offsets = new Map<number, number>();
  const offsetAt = (epochMs: number): number => {
    const quarter = Math.floor(epochMs / QUARTER_MS);
    const known = offsets.get(quarter);
    if (known !== undefined) return known;
    const { date, time } = localParts(quarter * QUARTER_MS, zone);
    const offset = Date.parse(`${date}T${time}:00Z`) - quarter * QUARTER_MS;
    offsets.set(quarter, offset);
    return offset;
  };
  return (wallMs) => {
    const candidates = new Set([wallMs - DAY_MS, wallMs + DAY_MS].map((near) => wallMs - offsetAt(near)));
    return [...candidates].filter((at) => at + offsetAt(at) === wallMs).sort((a, b) => a - b);
  };
}
