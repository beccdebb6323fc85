import 'server-only';
import { Op, type WhereOptions } from 'sequelize';
import { groupBy } from '@/lib/kit/group-by';
import { settlementsOf } from '@/lib/server/queries/reading-cells';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { SealedReading } from './seal';
import { sealedFinal, sealedLock, sealedMark, sealedRetraction, sealedSettlement } from './sealed-rows';

/** Marks and retractions of the readings some final ones are based on. */
async function behind(scope: TeamScope, sources: readonly Buffer[]) {
  const find = { where: { team_id: scope.team, reading_id: [...sources] }, transaction: scope.transaction } as const;
  const marks = await scope.db.models.Mark.findAll({ ...find, raw: true });
  const retractions = await scope.db.models.Retraction.findAll({ ...find, raw: true });
  return {
    marks: groupBy(marks.map(sealedMark), ({ reading }) => reading),
    retractions: groupBy(retractions.map(sealedRetraction), ({ reading }) => reading),
  };
}

async function withParts(scope: TeamScope, finals: readonly ReadingRow[]): Promise<SealedReading[]> {
  const rows = await settlementsOf(
    scope,
    finals.map(({ id }) => id),
  );
  const settlements = groupBy(rows.map(sealedSettlement), ({ reading }) => reading);
  const locks = await scope.db.models.ReadingLock.findAll({
    where: { team_id: scope.team, reading_id: finals.map(({ id }) => id) },
    raw: true,
    transaction: scope.transaction,
  });
  const locked = groupBy(locks.map(sealedLock), ({ reading }) => reading);
  const parts = await behind(
    scope,
    finals.flatMap(({ based_on }) => based_on ?? []),
  );
  return finals.map(sealedFinal).map((final) => ({
    final,
    settlements: settlements.get(final.id) ?? [],
    locks: locked.get(final.id) ?? [],
    marks: parts.marks.get(final.basedOn ?? '') ?? [],
    retractions: parts.retractions.get(final.basedOn ?? '') ?? [],
  }));
}

/** One final reading with what it is made of, as it stands in the scope's transaction. */
export async function loadSealedReading(scope: TeamScope, id: Buffer): Promise<SealedReading> {
  const where = { team_id: scope.team, id, kind: 'final' };
  const row = await scope.db.models.Reading.findOne({ where, raw: true, transaction: scope.transaction });
  const [reading] = row ? await withParts(scope, [row]) : [];
  if (!reading) throw new Error('a decision left no final reading behind');
  return reading;
}

/** Final readings whose marks are held in memory at once while their hashes are made. */
const CHUNK = 200;

/** All final readings of a team, some at a time. */
export async function* sealedReadings(scope: TeamScope): AsyncGenerator<SealedReading[]> {
  let after: Buffer | null = null;
  for (;;) {
    const where: WhereOptions = { team_id: scope.team, kind: 'final', ...(after && { id: { [Op.gt]: after } }) };
    const page: ReadingRow[] = await scope.db.models.Reading.findAll({
      where,
      order: [['id', 'ASC']],
      limit: CHUNK,
      raw: true,
      transaction: scope.transaction,
    });
    if (page.length > 0) yield await withParts(scope, page);
    after = page.at(-1)?.id ?? null;
    if (page.length < CHUNK) return;
  }
}
