import 'server-only';
import * as mariadb from 'mariadb';

/** The connector result rows carry a frozen `meta` member, which Sequelize 6 wants to delete. */
type Rows = unknown[] & { meta?: unknown };

function withRemovableMeta(result: unknown): unknown {
  if (!Array.isArray(result) || !('meta' in result)) return result;
  const rows: Rows = result;
  const copy: Rows = rows.slice();
  copy.meta = rows.meta;
  return copy;
}

/**
 * The MariaDB connector in the form Sequelize 6 can use.
 *
 * Connector 3.1 and later return result sets whose `meta` cannot be deleted, which Sequelize's MariaDB dialect does
 * after every SELECT; each result is handed on as a plain copy instead.
 */
export const mariadbForSequelize = {
  ...mariadb,
  createConnection: async (config: mariadb.ConnectionConfig) => {
    const connection = await mariadb.createConnection(config);
    const query = connection.query.bind(connection);
    const wrapped = async (...args: Parameters<typeof query>) => withRemovableMeta(await query(...args));
    Object.assign(connection, { query: wrapped });
    return connection;
  },
};
