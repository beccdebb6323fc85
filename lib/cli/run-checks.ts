import { join } from 'node:path';
import { type CheckStep, CHECK_LANES } from './check-steps';
import { runChild } from './child';
import type { CommandContext } from './run-command';
import { type Counts, NOTHING, addCounts } from './counts';

/** Runs one check and prints what it found; true when it found nothing. */
async function passes({ name, script, args }: CheckStep, { progress, signal }: CommandContext): Promise<boolean> {
  const { code, output } = await progress.step(`check: ${name}`, () =>
    runChild({
      command: process.execPath,
      args: [join('node_modules', script), ...args],
      env: { NEXT_TELEMETRY_DISABLED: '1' },
      output: 'keep',
      signal,
    }),
  );
  if (code !== 0) console.log(`${output.trimEnd()}\n--- ${name}: not right, see above`);
  return code === 0;
}

async function runLane(lane: readonly CheckStep[], context: CommandContext): Promise<Counts> {
  let counts = NOTHING;
  for (const step of lane) {
    const passed = await passes(step, context);
    counts = addCounts(counts, { passed: passed ? 1 : 0, failed: passed ? 0 : 1 });
  }
  return counts;
}

/** Runs every check, the rest too after one has failed; each counts as one. */
export async function runChecks(context: CommandContext, lanes = CHECK_LANES): Promise<Counts> {
  const counts = await Promise.all(lanes.map((lane) => runLane(lane, context)));
  return counts.reduce(addCounts, NOTHING);
}
