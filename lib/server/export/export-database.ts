import 'server-only';
import type { Sequelize } from 'sequelize';
import { connect } from '@/lib/server/db/connect';
import type { Database } from '@/lib/server/db/database';
import { defineModels } from '@/models';

declare global {
  /** Shared between the copies of this module that one process may hold, as the main pool is. */
  var undereaveExportSequelize: Sequelize | undefined;
}

/** Downloads running at once in one process; the next one waits, then is told to come back. */
const MOST_DOWNLOADS = 4;

let local: Database | undefined;

/** The pool that downloads read from: a slow download holds its connection for long, and phones must not wait for it. */
export function exportDatabase(): Database {
  if (!local) {
    const sequelize = (globalThis.undereaveExportSequelize ??= connect({ role: 'app', poolSize: MOST_DOWNLOADS }));
    local = { sequelize, models: defineModels(sequelize) };
  }
  return local;
}
