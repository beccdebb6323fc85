import 'server-only';
import { ERRORS, type ErrorCode, type Problem } from '@/lib/protocol/error-codes';

/** What an error answer may carry beside its code. */
export interface ProblemExtras {
  /** Further headers, such as `Retry-After`. */
  headers?: Readonly<Record<string, string>>;
  /** Further members of the body, such as `epoch`. */
  members?: Readonly<Record<string, string | number | boolean>>;
}

/** Ends a request with an error answer. Thrown by handlers, queries and commands; caught by the route wrapper. */
export class HttpProblem extends Error {
  override readonly name = 'HttpProblem';

  constructor(
    readonly code: ErrorCode,
    readonly extras: ProblemExtras = {},
  ) {
    super(code);
  }
}

/** Headers of every API answer: nothing is cached, nothing is sniffed. */
export const API_HEADERS: Readonly<Record<string, string>> = {
  'Cache-Control': 'no-store',
  'X-Content-Type-Options': 'nosniff',
};

/** The `application/problem+json` answer (RFC 9457) of one code. */
export function problemResponse(code: ErrorCode, requestId: string, extras: ProblemExtras = {}): Response {
  const { status, title } = ERRORS[code];
  const problem: Problem = { type: `urn:undereave:problem:${code}`, title, status, code, requestId };
  return new Response(JSON.stringify({ ...problem, ...extras.members }), {
    status,
    headers: { ...API_HEADERS, 'Content-Type': 'application/problem+json', ...extras.headers },
  });
}
