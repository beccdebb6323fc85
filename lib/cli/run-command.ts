import { CommandError, Stopped } from './command-error';
import { type Progress, createProgress } from './progress';

/** What a command's work is handed. */
export interface CommandContext {
  progress: Progress;
  /** Aborted when the command is told to stop. */
  signal: AbortSignal;
  /** Registers work for the end, however it comes; the last registered runs first. */
  atEnd(cleanUp: () => Promise<void>): void;
}

/** How a command ended. */
export interface Outcome {
  code: number;
  /** Printed after everything has been cleaned up. */
  lastLine?: string;
}

const SIGNALS: readonly NodeJS.Signals[] = ['SIGINT', 'SIGTERM', 'SIGHUP'];
const STOPPED_EXIT_CODE = 130;

/** Prints what went wrong: words when we have them, the whole error when it was not foreseen. */
function explain(error: unknown, stopped: boolean): Outcome {
  if (error instanceof Stopped || stopped) return { code: STOPPED_EXIT_CODE };
  console.error(error instanceof CommandError ? `\n${error.message}` : error);
  return { code: 1 };
}

async function cleanUpAll(cleanUps: (() => Promise<void>)[]): Promise<void> {
  for (const cleanUp of cleanUps.reverse()) {
    await cleanUp().catch((error: unknown) => console.error(error));
  }
}

/**
 * Runs a command from start to exit: gives it progress and a stop signal, turns Ctrl-C into that signal, runs the
 * clean-up, and ends the process with the code the work returned (1 after an error, 130 when stopped).
 */
export async function runCommand(work: (context: CommandContext) => Promise<Outcome>): Promise<never> {
  const controller = new AbortController();
  const cleanUps: (() => Promise<void>)[] = [];
  const stop = () => {
    if (!controller.signal.aborted) console.log('\nstopping ...');
    controller.abort();
  };
  for (const name of SIGNALS) process.on(name, stop);
  const context = {
    progress: createProgress(),
    signal: controller.signal,
    atEnd: (cleanUp: () => Promise<void>) => void cleanUps.push(cleanUp),
  };
  const outcome = await work(context).catch((error: unknown) => explain(error, controller.signal.aborted));
  await cleanUpAll(cleanUps);
  if (outcome.lastLine) console.log(outcome.lastLine);
  process.exit(outcome.code);
}
