import 'server-only';
import { systemClock } from '@/lib/kit/system-clock';

/** One line of the log: what happened, never what anybody wrote, no secret and no place. */
export interface LogEntry {
  event: string;
  requestId?: string;
  [detail: string]: string | number | boolean | null | undefined;
}

/** Writes one JSON line to standard error. */
export function log(entry: LogEntry): void {
  process.stderr.write(`${JSON.stringify({ at: new Date(systemClock.now()).toISOString(), ...entry })}\n`);
}

/**
 * The loggable part of an error. The first line of a database error may quote what people wrote, so only its number
 * and the stack's frames are kept.
 */
export function describeError(error: unknown): Record<string, string | number | null> {
  if (!(error instanceof Error)) return { error: typeof error };
  const parent: unknown = 'parent' in error ? error.parent : null;
  const errno = parent && typeof parent === 'object' && 'errno' in parent ? Number(parent.errno) : null;
  const frames = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  return { error: error.name, errno, message: parent ? null : error.message, stack: frames.slice(0, 12).join('\n') };
}
