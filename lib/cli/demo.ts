import { database } from '@/lib/server/db/database';
import { startDatabaseServer } from './database-server';
import { demoSignInLines, loadDemoWhenEmpty } from './demo-season';
import { migrateDatabase } from './migrate-database';
import { runCommand } from './run-command';

/** `npm run demo` loads the demo season into an empty database and lists who can sign in. */
await runCommand(async (context) => {
  await startDatabaseServer(context);
  await migrateDatabase(context.progress);
  context.atEnd(() => database().sequelize.close());
  await loadDemoWhenEmpty(context.progress);
  for (const line of await demoSignInLines()) console.log(line);
  return { code: 0 };
});
