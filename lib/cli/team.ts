import { parseArgs } from 'node:util';
import { isTimeZone } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { emailText, lineText } from '@/lib/server/commands/members/inputs';
import { foundTeam, type NewTeam } from '@/lib/server/commands/members/found-team';
import { database } from '@/lib/server/db/database';
import { CommandError } from './command-error';
import { startDatabaseServer } from './database-server';
import { migrateDatabase } from './migrate-database';
import { runCommand } from './run-command';

const USAGE = 'usage: npm run team -- --name "Name of the team" --zone Europe/Lisbon --email coordinator@example.org';

/** The team the arguments name. @throws CommandError with what is wrong. */
function wantedTeam(): NewTeam {
  const options = { name: { type: 'string' }, zone: { type: 'string' }, email: { type: 'string' } } as const;
  let values;
  try {
    ({ values } = parseArgs({ options }));
  } catch {
    throw new CommandError(USAGE);
  }
  const name = lineText.safeParse(values.name);
  const email = emailText.safeParse(values.email);
  if (!name.success || !email.success || values.zone === undefined) throw new CommandError(USAGE);
  if (!isTimeZone(values.zone)) throw new CommandError(`${values.zone} is not a time zone such as Europe/Lisbon.`);
  return { name: name.data, email: email.data, zone: values.zone };
}

/** `npm run team` makes a team and prints the link with which its first coordinator joins. */
await runCommand(async (context) => {
  const team = wantedTeam();
  await startDatabaseServer(context);
  await migrateDatabase(context.progress);
  context.atEnd(() => database().sequelize.close());
  const { link } = await foundTeam(team, systemClock.now());
  console.log(`${team.name} is made. Give this link to ${team.email}; it works once, for seven days:`);
  console.log(link);
  return { code: 0 };
});
