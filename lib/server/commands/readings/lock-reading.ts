import 'server-only';
import { z } from 'zod';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { idKey } from '@/lib/server/queries/id-key';
import { memberNames } from '@/lib/server/queries/member-names';
import { readingCells, settlementsOf } from '@/lib/server/queries/reading-cells';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import { type FinalVersion, ensureFinal, finalVersion, isClosed, updateFinal, versionOf } from './final-reading';
import { type Judgement, judge } from './judged-pair';
import { type LabWork, labWork } from './lab-work';
import { cellsHash } from './seal-cells';

/** Body of `POST /api/readings/<id>/lock`: nothing. */
export const LOCK_INPUT = z.strictObject({});

/** Who stands behind a locked version, by name. */
export interface LockNames {
  field: string;
  /** Null where nobody read the comb a second time. */
  second: string | null;
  settled: string[];
  locked: string;
}

async function namesBehind({ scope, source }: LabWork, final: ReadingRow, second: ReadingRow | null) {
  const nameOf = await memberNames(scope);
  const settlers = (await settlementsOf(scope, [final.id])).map(({ actor_id }) => nameOf(actor_id));
  const names: LockNames = {
    field: nameOf(source.opened_by),
    second: second && nameOf(second.opened_by),
    settled: [...new Set(settlers)].sort(),
    locked: nameOf(scope.user),
  };
  return names;
}

/** Seals the version: what is in it, under which settings, and who stands behind it. */
async function sealVersion(work: LabWork, final: ReadingRow, seal: { judged: Judgement; at: Date }): Promise<string> {
  const { scope } = work;
  const { settings, second } = seal.judged;
  const cells = (await readingCells(scope, [final])).get(idKey(final.id)) ?? [];
  const hash = cellsHash(cells);
  await scope.db.models.ReadingLock.create(
    {
      team_id: scope.team,
      reading_id: final.id,
      version: versionOf(final),
      cells_hash: hash,
      settings_version: settings.version,
      names: JSON.stringify(await namesBehind(work, final, second)),
      actor_id: scope.user,
      locked_at: seal.at,
    },
    { transaction: scope.transaction },
  );
  return hash.toString('hex');
}

/**
 * Locks the final reading at the version it is at; from then on only an amendment may change it. A reading that needed
 * no correction gets its final reading here. The seal of its cells also goes into the audit chain.
 *
 * @param input `id` of the reading or of its final one.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `blind`, `locked` when this version is locked already, `not-primary`,
 * `lead-settles`, or `unsettled` while a difference between two readings is not decided.
 */
export async function lockReading(ctx: TeamContext, { id }: { id: string }, nowMs: number): Promise<FinalVersion> {
  const decision = await labWork(ctx, { id, nowMs }, async (work) => {
    if (isClosed(work)) throw new HttpProblem('locked');
    const judged = await judge(ctx, work);
    if ((judged.comparison?.open.length ?? 0) > 0) throw new HttpProblem('unsettled');
    const final = await ensureFinal(work, nowMs);
    const version = versionOf(final);
    const hash = await sealVersion(work, final, { judged, at: new Date(nowMs) });
    await updateFinal(work, final, { opened_by: work.scope.user, locked_version: version });
    const detail = { cellsHash: hash, settingsVersion: judged.settings.version };
    return { action: 'reading.lock', final, version, detail };
  });
  return finalVersion(decision);
}
