import 'server-only';
import { isUnavailable } from '@/lib/server/db/database-errors';
import { describeError, log } from '@/lib/server/log/log';
import { HttpProblem, problemResponse } from './problem';

/** The answer of a failed request. Only what went wrong on our side is logged, and shown as nothing but a code. */
export function failureResponse(error: unknown, requestId: string): Response {
  if (error instanceof HttpProblem) return problemResponse(error.code, requestId, error.extras);
  const code = isUnavailable(error) ? 'busy' : 'internal';
  log({ event: code, requestId, ...describeError(error) });
  return problemResponse(code, requestId, code === 'busy' ? { headers: { 'Retry-After': '2' } } : {});
}
