import { connect } from '@/lib/server/db/connect';
import type { Progress } from './progress';
import { migrateUp } from './run-migrations';

/** Brings this folder's database to the newest schema, saying what ran. */
export async function migrateDatabase(progress: Progress): Promise<void> {
  const sequelize = connect({ role: 'migrate' });
  try {
    const ran = await progress.step('migrating the database', () => migrateUp(sequelize));
    if (ran.length > 0) progress.note(`new migrations: ${ran.join(', ')}`);
  } finally {
    await sequelize.close();
  }
}
