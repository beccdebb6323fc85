import 'server-only';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { newId } from '@/lib/server/db/new-id';
import { isLocked } from '@/lib/server/queries/census';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { LabDecision, LabWork } from './lab-work';

/** Answer of every command on a final reading. */
export interface FinalVersion {
  /** Id of the final reading, whichever reading was asked about. */
  reading: string;
  version: number;
}

/** The version a final reading is at. */
export function versionOf({ version }: Pick<ReadingRow, 'version'>): number {
  return version ?? 1;
}

/** The answer after a decision. */
export function finalVersion({ final, version }: LabDecision): FinalVersion {
  return { reading: fromBinary(final.id), version };
}

/** Is the final reading locked, so that only an amendment may change it? */
export function isClosed({ final }: LabWork): boolean {
  return final !== null && isLocked(final);
}

/**
 * The final reading of a source, made now if there is none: it stands on the marks the team's log holds at this
 * moment, and marks that come later do not move it.
 */
export async function ensureFinal({ scope, source, final, counter }: LabWork, nowMs: number): Promise<ReadingRow> {
  if (final) return final;
  const now = new Date(nowMs);
  const made = await scope.db.models.Reading.create(
    {
      team_id: scope.team,
      id: toBinary(newId()),
      nest_id: source.nest_id,
      visit_id: source.visit_id,
      kind: 'final',
      source: source.source,
      aid: source.aid,
      light: source.light,
      opened_by: scope.user,
      opened_at: now,
      opened_at_text: now.toISOString(),
      submitted_at: now,
      based_on: source.id,
      base_seq: counter.seq,
      version: 1,
      locked_version: null,
    },
    { transaction: scope.transaction },
  );
  return made.get();
}

/**
 * Changes a final reading; the person who settled or locked it last is the one it is shown under. Who did what before
 * stays in the settlements and the audit chain.
 */
export async function updateFinal(
  { scope }: LabWork,
  final: ReadingRow,
  change: Partial<Pick<ReadingRow, 'opened_by' | 'version' | 'locked_version'>>,
): Promise<void> {
  const where = { team_id: scope.team, id: final.id };
  await scope.db.models.Reading.update(change, { where, transaction: scope.transaction });
}
