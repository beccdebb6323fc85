import type { z } from 'zod';
import type { NetworkAnswer } from './network';
import type { Trouble } from './trouble';

/** What an answer means for the queue. Only `ok` may take anything out of it. */
export type Verdict<T> =
  | { kind: 'ok'; value: T }
  /** Keep everything and try again later; `slow` when the request ran out of time. */
  | { kind: 'again'; trouble: Exclude<Trouble, null>; slow: boolean; afterMs: number | null }
  /** The office failed; the same batch failing twice means that something in it is to blame. */
  | { kind: 'server-error' }
  /** The office cannot read this batch. */
  | { kind: 'bad-batch' }
  | { kind: 'sign-in' }
  | { kind: 'revoked' }
  | { kind: 'role' }
  | { kind: 'update' }
  /** The office's data was restored; `epoch` is the new one when the answer says so. */
  | { kind: 'epoch'; epoch: number | null }
  /** The cursor is older than what the office remembers: pull from the start. */
  | { kind: 'restart' };

const NOT_OURS = { kind: 'again', trouble: 'no-real-connection', slow: false, afterMs: null } as const;

/** The JSON object of an answer; null for HTML, half answers and everything else. */
function jsonObject(text: string, contentType: string): Record<string, unknown> | null {
  if (!contentType.includes('json')) return null;
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null && !Array.isArray(value) ? { ...value } : null;
  } catch {
    return null;
  }
}

/** A refusal counts only with the stable code that our office puts in it: routers answer 401 and 403 as well. */
function refusal(code: unknown, problem: Record<string, unknown>): Verdict<never> | null {
  switch (code) {
    case 'signin':
      return { kind: 'sign-in' };
    case 'device-revoked':
      return { kind: 'revoked' };
    case 'role':
      return { kind: 'role' };
    case 'epoch-mismatch':
      return { kind: 'epoch', epoch: Number.isSafeInteger(problem.epoch) ? Number(problem.epoch) : null };
    case 'gone':
      return { kind: 'restart' };
    case 'client-too-old':
      return { kind: 'update' };
    default:
      return null;
  }
}

const WAIT_STATUSES: ReadonlySet<number> = new Set([408, 425, 429]);

/**
 * Sorts an answer of the office, or what pretends to be one.
 *
 * @param shape the form of a good answer; anything else with status 200 is not from our office.
 */
export function classifyAnswer<T>(answer: NetworkAnswer, shape: z.ZodType<T>): Verdict<T> {
  if (answer.kind === 'none') {
    return { kind: 'again', trouble: 'no-answer', slow: answer.why === 'timeout', afterMs: null };
  }
  const { status, retryAfterMs } = answer;
  const body = jsonObject(answer.text, answer.contentType);
  if (status === 200) {
    const good = shape.safeParse(body);
    return good.success ? { kind: 'ok', value: good.data } : NOT_OURS;
  }
  if (status === 500) return { kind: 'server-error' };
  if (status > 500 || WAIT_STATUSES.has(status)) {
    return { kind: 'again', trouble: 'office-busy', slow: false, afterMs: retryAfterMs };
  }
  const refused = body && refusal(body.code, body);
  if (refused) return refused;
  if (status === 413 || status === 415 || (status === 400 && body)) return { kind: 'bad-batch' };
  return NOT_OURS;
}
