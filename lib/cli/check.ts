import { formatCounts } from './counts';
import { runChecks } from './run-checks';
import { runCommand } from './run-command';

/** `npm run check`: format, lint, boundaries, dead code and types; ends with how many of the checks passed. */
await runCommand(async (context) => {
  const counts = await runChecks(context);
  return { code: counts.failed === 0 ? 0 : 1, lastLine: formatCounts(counts) };
});
