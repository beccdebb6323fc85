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

/** A download whose reader has stalled loses its connection after so long; the others need it. */
const MOST_IDLE_SECONDS = 300;

/** Opens a snapshot: whatever is pushed or settled meanwhile, all its reads see the same rows. */
export async function openSnapshot(ctx: TeamContext): Promise<Snapshot> {
  const db = exportDatabase();
  const transaction = await db.sequelize.transaction();
  let isOpen = true;
  const close = async () => {
    if (!isOpen) return;
    isOpen = false;
    // A connection that was lost cannot be rolled back; it is not put back into the pool either.
    await transaction.rollback().catch(() => undefined);
  };
  try {
    await db.sequelize.query(`SET SESSION idle_transaction_timeout = ${MOST_IDLE_SECONDS}`, { transaction });
    // Starts anew: Sequelize's own BEGIN would only fix the snapshot at the first read.
    await db.sequelize.query('START TRANSACTION WITH CONSISTENT SNAPSHOT, READ ONLY', { transaction });
  } catch (error) {
    await close();
    throw error;
  }
  return { scope: { ...teamScope(ctx, db), transaction }, close };
}
