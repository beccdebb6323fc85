import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { exportDatabase } from './export-database';

/** The team's data at one moment, on a connection of its own until it is closed. */
export interface Snapshot {
  scope: TeamScope;
  /** Gives the connection back; further calls do nothing. */
  close(): Promise<void>;
}

/** Opens a snapshot: whatever is pushed or settled meanwhile, all its reads see the same rows. */
export async function openSnapshot(ctx: TeamContext): Promise<Snapshot> {
  const db = exportDatabase();
  const transaction = await db.sequelize.transaction();
  let isOpen = true;
  const close = async () => {
    if (!isOpen) return;
    isOpen = false;
    await transaction.rollback();
  };
  try {
    // Starts anew: Sequelize's own BEGIN would only fix the snapshot at the first read.
    await db.sequelize.query('START TRANSACTION WITH CONSISTENT SNAPSHOT, READ ONLY', { transaction });
  } catch (error) {
    await close();
    throw error;
  }
  return { scope: { ...teamScope(ctx, db), transaction }, close };
}
