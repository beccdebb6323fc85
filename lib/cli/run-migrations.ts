import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { QueryInterface, Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';

/** What every file of `migrations` exports. */
interface MigrationFile {
  up(params: { context: QueryInterface }): Promise<void>;
  down(params: { context: QueryInterface }): Promise<void>;
}

async function load(path: string): Promise<MigrationFile> {
  return (await import(/* @vite-ignore */ pathToFileURL(path).href)) as MigrationFile;
}

/** The migrations of this project against one database; what has run is recorded in its table `schema_migrations`. */
export function createMigrator(sequelize: Sequelize): Umzug<QueryInterface> {
  return new Umzug({
    migrations: {
      glob: ['*.ts', { cwd: join(process.cwd(), 'migrations') }],
      resolve: ({ name, path = '', context }) => ({
        name,
        up: async () => (await load(path)).up({ context }),
        down: async () => (await load(path)).down({ context }),
      }),
    },
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize, tableName: 'schema_migrations' }),
    logger: undefined,
  });
}

/** Brings a database to the newest schema; returns the names of the migrations that ran. */
export async function migrateUp(sequelize: Sequelize): Promise<string[]> {
  return (await createMigrator(sequelize).up()).map(({ name }) => name);
}
