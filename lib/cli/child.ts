import { type ChildProcess, spawn } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';
import { Stopped } from './command-error';

/** What to run and how. */
export interface ChildOptions {
  command: string;
  args: readonly string[];
  env?: Record<string, string | undefined>;
  /** `show` lets it write to our terminal, `keep` collects what it writes, a path appends it to that file. */
  output: 'show' | 'keep' | { file: string };
  /** Leads a process group of its own (the default), so that Ctrl-C reaches it only through us. */
  ownGroup?: boolean;
  /** Ends it, and everything it started, when aborted. */
  signal?: AbortSignal;
}

/** How a child process ended. */
export interface ChildResult {
  code: number;
  /** What it wrote to both streams when `output` was `keep`, else empty. */
  output: string;
}

const ESCALATION: readonly { signal: NodeJS.Signals; graceMs: number }[] = [
  { signal: 'SIGINT', graceMs: 8_000 },
  { signal: 'SIGTERM', graceMs: 5_000 },
  { signal: 'SIGKILL', graceMs: 2_000 },
];

/** Sends a signal to a child and, when it leads a process group of its own, to all it started. */
function signalGroup(child: ChildProcess, signal: NodeJS.Signals): void {
  if (child.pid === undefined) return;
  try {
    process.kill(-child.pid, signal);
  } catch {
    child.kill(signal);
  }
}

/** Ends a child politely first, then with force, and whatever it left running. Resolves when it is gone. */
export async function endChild(child: ChildProcess): Promise<void> {
  for (const { signal, graceMs } of ESCALATION) {
    if (hasEnded(child)) break;
    const ended = new Promise<void>((resolve) => child.once('close', () => resolve()));
    signalGroup(child, signal);
    await Promise.race([ended, sleep(graceMs, undefined, { ref: false })]);
  }
  signalGroup(child, 'SIGKILL');
}

/** Is the process gone? */
export function hasEnded(child: ChildProcess): boolean {
  return child.exitCode !== null || child.signalCode !== null;
}

/** Where a child writes: our terminal, a pipe, or a file it appends to. */
function destination(output: ChildOptions['output']): 'inherit' | 'pipe' | number {
  if (typeof output === 'object') return openSync(output.file, 'a');
  return output === 'show' ? 'inherit' : 'pipe';
}

/** Starts a child. With `output: 'keep'` somebody must read its pipes, as `runChild` does. */
export function startChild({
  command,
  args,
  env,
  output,
  ownGroup = true,
}: Omit<ChildOptions, 'signal'>): ChildProcess {
  const to = destination(output);
  const child = spawn(command, args, {
    env: { ...process.env, ...env },
    stdio: ['ignore', to, to],
    detached: ownGroup,
  });
  if (typeof to === 'number') closeSync(to);
  return child;
}

function collect(child: ChildProcess): () => string {
  const chunks: Buffer[] = [];
  for (const stream of [child.stdout, child.stderr]) stream?.on('data', (chunk: Buffer) => chunks.push(chunk));
  return () => Buffer.concat(chunks).toString('utf8');
}

/**
 * Runs a program to its end.
 *
 * @throws `Stopped` when `signal` was aborted, an `Error` when the program could not be started.
 */
export async function runChild(options: ChildOptions): Promise<ChildResult> {
  const { signal } = options;
  if (signal?.aborted) throw new Stopped();
  const child = startChild(options);
  const written = collect(child);
  const stop = () => void endChild(child);
  signal?.addEventListener('abort', stop);
  try {
    const code = await new Promise<number>((resolve, reject) => {
      child.once('error', reject);
      child.once('close', (exit) => resolve(exit ?? 1));
    });
    if (signal?.aborted) throw new Stopped();
    return { code, output: written() };
  } finally {
    signal?.removeEventListener('abort', stop);
  }
}
