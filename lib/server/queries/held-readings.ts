import 'server-only';
import type { OpKind } from '@/lib/protocol/op';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { blindVisits } from './blind-visits';
import { idKey } from './id-key';
import { selectRows } from './select-rows';
import type { TeamScope } from './team-scope';

/** What a second reader may know of another reading: that it exists and was handed in, and its photos. */
const SHOWN_KINDS: ReadonlySet<string> = new Set<OpKind>([
  'reading.open',
  'reading.submit',
  'photo.attach',
  'photo.detach',
]);

/** What a log kept from a second reader says about itself. */
export interface HeldReadings {
  /** Readings (keys of `idKey`) whose operations are held back. */
  readings: ReadonlySet<string>;
  /** By visit, the place in the log after which something is held back. */
  visits: readonly { visit: string; seq: number }[];
}

const NOTHING: HeldReadings = { readings: new Set(), visits: [] };

interface HeldRow {
  visit: Buffer;
  reading: Buffer;
  seq: number | string;
}

/** The places of the log that the person who asks gets without their content for now. */
export async function heldReadings(scope: TeamScope): Promise<HeldReadings> {
  const blind = await blindVisits(scope);
  if (blind.size === 0) return NOTHING;
  const rows = await selectRows<HeldRow>(
    scope,
    `SELECT r.visit_id AS visit, r.id AS reading, MIN(o.seq) AS seq FROM readings r
     JOIN ops o ON o.team_id = :team AND o.reading_id = r.id
     WHERE r.team_id = :team AND r.visit_id IN (:visits) AND r.opened_by <> :user AND r.kind <> 'final'
     GROUP BY r.visit_id, r.id`,
    { user: scope.user, visits: [...blind].map((key) => Buffer.from(key, 'hex')) },
  );
  const firsts = new Map<string, number>();
  for (const { visit, seq } of rows) {
    const id = fromBinary(visit);
    firsts.set(id, Math.min(firsts.get(id) ?? Infinity, Number(seq) - 1));
  }
  const visits = [...firsts].map(([visit, seq]) => ({ visit, seq }));
  return { readings: new Set(rows.map(({ reading }) => idKey(reading))), visits };
}

/** Is an operation about this reading held back? */
export function isHeld({ readings }: HeldReadings, kind: string, reading: Buffer | null): boolean {
  return reading !== null && !SHOWN_KINDS.has(kind) && readings.has(idKey(reading));
}
