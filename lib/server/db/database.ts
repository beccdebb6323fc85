import 'server-only';
import type { Sequelize } from 'sequelize';
import { type Models, defineModels } from '@/models';
import { connect } from './connect';

/** A connection pool with the models defined on it. */
export interface Database {
  sequelize: Sequelize;
  models: Models;
}

declare global {
  /** Only the pool is shared: Next evaluates this module once for pages and once for route handlers. */
  var undereaveSequelize: Sequelize | undefined;
}

let local: Database | undefined;

/**
 * The process-wide database. The pool is kept on `globalThis`, the models are defined anew for each evaluation of
 * this module, because pages and route handlers get separate copies of it within one process.
 */
export function database(): Database {
  if (!local) {
    const sequelize = (globalThis.undereaveSequelize ??= connect({ role: 'app' }));
    local = { sequelize, models: defineModels(sequelize) };
  }
  return local;
}
