import 'server-only';
import type { WallTime } from '@/lib/server/demo/build/demo-time';

/** How one nest and her foundress were brought together and let go. */
export interface Release {
  /** Null for a small shift: she stays on her own structure. */
  host: string | null;
  enclosedAt: WallTime;
  /** Minutes until she touched the comb; one figure a foundress. */
  firstContactMin: readonly number[];
  releasedAt: WallTime;
  sunsetAt: WallTime;
  tempC: number;
  windKmh: number;
  /** Why the release was not when it was planned. */
  delayedBy?: string;
}

/** The release log. N03 was a small shift on her own structure, so she went back the same evening. */
export const RELEASES = {
  N01: {
    host: 'H1',
    enclosedAt: '2026-05-21T09:20',
    firstContactMin: [6],
    releasedAt: '2026-05-22T20:20',
    sunsetAt: '2026-05-22T20:36',
    tempC: 15,
    windKmh: 6,
  },
  N02: {
    host: 'H4',
    enclosedAt: '2026-05-29T08:05',
    firstContactMin: [11],
    releasedAt: '2026-05-30T20:31',
    sunsetAt: '2026-05-30T20:43',
    tempC: 16,
    windKmh: 9,
  },
  N03: {
    host: null,
    enclosedAt: '2026-06-02T20:02',
    firstContactMin: [3],
    releasedAt: '2026-06-02T20:40',
    sunsetAt: '2026-06-02T20:45',
    tempC: 16,
    windKmh: 4,
  },
  N06: {
    host: 'H1',
    enclosedAt: '2026-06-05T07:30',
    firstContactMin: [4, 19],
    releasedAt: '2026-06-06T20:44',
    sunsetAt: '2026-06-06T20:49',
    tempC: 18,
    windKmh: 7,
  },
  N09: {
    host: 'H2',
    enclosedAt: '2026-06-09T08:10',
    firstContactMin: [41],
    releasedAt: '2026-06-10T20:58',
    sunsetAt: '2026-06-10T20:51',
    tempC: 17,
    windKmh: 12,
    delayedBy: 'A line of thunder passed at 19:50.',
  },
  N11: {
    host: 'H3',
    enclosedAt: '2026-06-12T09:00',
    firstContactMin: [8],
    releasedAt: '2026-06-13T20:40',
    sunsetAt: '2026-06-13T20:52',
    tempC: 19,
    windKmh: 5,
  },
  N12: {
    host: 'H4',
    enclosedAt: '2026-06-16T07:45',
    firstContactMin: [13],
    releasedAt: '2026-06-17T20:47',
    sunsetAt: '2026-06-17T20:54',
    tempC: 20,
    windKmh: 8,
  },
} as const satisfies Record<string, Release>;
