import 'server-only';
import type { Transaction } from 'sequelize';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { type Database, database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** Whose rows a query may touch, for whom, and on which connection. */
export interface TeamScope {
  /** Goes into every query. */
  team: Buffer;
  /** The person who asks. */
  user: Buffer;
  db: Database;
  /** The transaction to read in; each query on its own when left out. */
  transaction?: Transaction;
}

/** The scope of the person who asks, on the process-wide pool unless another database is given. */
export function teamScope(ctx: TeamContext, db: Database = database()): TeamScope {
  return { team: toBinary(ctx.teamId), user: toBinary(ctx.userId), db };
}
