import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** A digest of every row of a team in every table that has a team, so that any change to any of them shows. */
export async function teamDigest(teamId: string): Promise<string> {
  const { sequelize } = database();
  const tables = await sequelize.query<{ name: string }>(
    `SELECT table_name AS name FROM information_schema.columns
     WHERE table_schema = DATABASE() AND column_name = 'team_id' ORDER BY table_name`,
    { type: QueryTypes.SELECT },
  );
  const digest = createHash('sha256');
  for (const { name } of tables) {
    const rows = await sequelize.query(`SELECT * FROM ${name} WHERE team_id = ?`, {
      type: QueryTypes.SELECT,
      replacements: [toBinary(teamId)],
    });
    digest.update(name).update(
      rows
        .map((row) => JSON.stringify(row))
        .sort()
        .join('\n'),
    );
  }
  return digest.digest('hex');
}
