import { checkTeams } from '@/lib/server/audit/check-teams';
import { database } from '@/lib/server/db/database';
import { auditLines, auditOptions } from './audit-report';
import { CommandError } from './command-error';
import { startDatabaseServer } from './database-server';
import { runCommand } from './run-command';

/** Ends with 0 when every chain holds, with 2 when one is broken, with 1 when the check could not be made. */
const BROKEN = 2;

/** `npm run audit` checks the audit chains and what they vouch for; `-- --head HASH` also looks for a noted head. */
await runCommand(async (context) => {
  const options = auditOptions(process.argv.slice(2));
  if (!options) throw new CommandError('usage: npm run audit -- [--head HASH] ...');
  await startDatabaseServer(context);
  context.atEnd(() => database().sequelize.close());
  const { lines, holds } = auditLines(await checkTeams(options.heads), options.heads);
  for (const line of lines) console.log(line);
  return { code: holds ? 0 : BROKEN };
});
