import { join } from 'node:path';
import { dataDir } from '@/lib/server/env';
import { buildApplication } from './build-application';
import { requireChromium } from './chromium';
import { CommandError, Stopped } from './command-error';
import { type Counts, NOTHING, addCounts, formatCounts } from './counts';
import { startDatabaseServer } from './database-server';
import { runChecks } from './run-checks';
import { type CommandContext, runCommand } from './run-command';
import { applyTestEnvironment } from './test-environment.mjs';
import { type TestPart, readTestOptions } from './test-options';
import { runPlaywright, runVitest } from './test-parts';
import { takeTestTurn } from './test-turn';

/** Runs a part; whatever it throws is one failure, except being told to stop. */
async function counted(part: () => Promise<Counts>): Promise<Counts> {
  try {
    return await part();
  } catch (error) {
    if (error instanceof Stopped) throw error;
    console.error(error instanceof CommandError ? error.message : error);
    return { passed: 0, failed: 1 };
  }
}

/** Work that is not a test but that tests need: counts nothing, and one failure when it fails. */
function preparation(work: () => Promise<void>): () => Promise<Counts> {
  return async () => {
    await work();
    return NOTHING;
  };
}

/** What is run for the chosen parts, in order; work that several parts need comes before the first of them. */
function plan(parts: Set<TestPart>, context: CommandContext): (() => Promise<Counts>)[] {
  const chosen = (...names: TestPart[]) => names.filter((name) => parts.has(name));
  const pure = chosen('unit', 'property');
  const stored = chosen('db', 'api');
  const runs: (() => Promise<Counts>)[] = [];
  if (parts.has('check')) runs.push(() => runChecks(context));
  if (pure.length > 0) runs.push(() => runVitest(pure, context));
  if (chosen('build', 'api', 'e2e').length > 0) runs.push(preparation(() => buildApplication(context)));
  if (chosen('db', 'api', 'e2e').length > 0) runs.push(preparation(() => startDatabaseServer(context)));
  if (stored.length > 0) runs.push(() => runVitest(stored, context));
  if (parts.has('e2e'))
    runs.push(
      preparation(() => requireChromium(context)),
      () => runPlaywright(context),
    );
  return runs;
}

applyTestEnvironment();

/** `npm test`: everything from a fresh clone; the last line is `N passed, N failed`. */
await runCommand(async (context) => {
  const parts = readTestOptions(process.argv.slice(2));
  takeTestTurn(context);
  context.progress.note(`results in ${join(dataDir(), 'results')}, pictures in .artifacts/screens`);
  let counts = NOTHING;
  for (const run of plan(parts, context)) counts = addCounts(counts, await counted(run));
  return { code: counts.failed === 0 ? 0 : 1, lastLine: formatCounts(counts) };
});
