import { QueryTypes } from 'sequelize';
import { database } from '@/lib/server/db/database';

const TABLES = [
  'teams',
  'users',
  'memberships',
  'devices',
  'hosts',
  'taxa',
  'settings_versions',
  'duration_sets',
  'ops',
  'quarantined_ops',
  'nests',
  'visits',
  'readings',
  'marks',
  'retractions',
  'settlements',
  'outcomes',
  'audit_entries',
] as const;

/** The rows of every table the demo season writes to. */
export async function countRows(): Promise<Record<(typeof TABLES)[number], number>> {
  const sql = TABLES.map((table) => `(SELECT COUNT(*) FROM ${table}) AS ${table}`).join(', ');
  const [row] = await database().sequelize.query<Record<string, unknown>>(`SELECT ${sql}`, { type: QueryTypes.SELECT });
  const counts = TABLES.map((table) => [table, Number(row?.[table])] as const);
  return Object.fromEntries(counts) as Record<(typeof TABLES)[number], number>;
}
