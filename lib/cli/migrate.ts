import { connect } from '@/lib/server/db/connect';
import { CommandError } from './command-error';
import { startDatabaseServer } from './database-server';
import { migrateDatabase } from './migrate-database';
import { runCommand } from './run-command';
import { createMigrator } from './run-migrations';

/** `npm run migrate` applies what is new; `npm run migrate -- down` takes back the last one, `status` lists. */
await runCommand(async (context) => {
  const [direction = 'up'] = process.argv.slice(2);
  if (!['up', 'down', 'status'].includes(direction)) throw new CommandError('usage: npm run migrate -- up|down|status');
  await startDatabaseServer(context);
  if (direction === 'up') await migrateDatabase(context.progress);
  else await withMigrator(direction, context.progress.note);
  return { code: 0 };
});

async function withMigrator(direction: string, say: (line: string) => void): Promise<void> {
  const sequelize = connect({ role: 'migrate' });
  const migrator = createMigrator(sequelize);
  try {
    if (direction === 'down') for (const { name } of await migrator.down()) say(`taken back: ${name}`);
    for (const { name } of await migrator.executed()) say(`in place: ${name}`);
    for (const { name } of await migrator.pending()) say(`to come:  ${name}`);
  } finally {
    await sequelize.close();
  }
}
