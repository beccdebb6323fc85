import 'server-only';
import { Sequelize } from 'sequelize';
import { databasePort, readDataFile } from '../env';
import { mariadbForSequelize } from './mariadb-for-sequelize';

/** Who connects: the application (reads and writes rows) or the migration runner (changes tables). */
export type DatabaseRole = 'app' | 'migrate';

/** What `connect` needs to know beyond the environment. */
export interface ConnectOptions {
  role: DatabaseRole;
  /** Defaults to `DB_NAME`, else `undereave`. */
  database?: string;
  /** Most connections held at once. */
  poolSize?: number;
}

const ACCOUNTS: Record<DatabaseRole, { user: string; passwordFile: string }> = {
  app: { user: 'undereave', passwordFile: 'db-password' },
  migrate: { user: 'undereave_migrate', passwordFile: 'db-migrate-password' },
};

/** The name of the database this process works on. */
function databaseName(): string {
  return process.env.DB_NAME ?? 'undereave';
}

/**
 * Opens a connection pool to MariaDB on loopback. Nothing is sent until the first query.
 *
 * @throws when the password file is missing, that is, when `./docker-free-db.sh start` never ran for this data folder.
 */
export function connect({ role, database = databaseName(), poolSize = 8 }: ConnectOptions): Sequelize {
  const { user, passwordFile } = ACCOUNTS[role];
  const password = readDataFile(passwordFile);
  if (password === null) throw new Error('The database was never set up here. Run ./docker-free-db.sh start first.');
  return new Sequelize(database, user, password, {
    dialect: 'mariadb',
    dialectModule: mariadbForSequelize,
    host: '127.0.0.1',
    port: databasePort(),
    timezone: '+00:00',
    logging: false,
    define: { timestamps: false, underscored: true, freezeTableName: true },
    pool: { max: poolSize, min: 0, acquire: 10_000, idle: 30_000 },
    dialectOptions: { connectTimeout: 5_000, bigIntAsNumber: true, insertIdAsNumber: true, checkNumberRange: true },
  });
}
