import type { MethodHandlers } from '@/lib/server/http/methods';
import type { TestMember } from './make-team';

/** A request to a route, in process. */
export interface ApiCall {
  as?: TestMember | null;
  /** Dynamic parts of the path. */
  params?: Record<string, string | string[]>;
  /** The query string without `?`. */
  query?: string;
  body?: unknown;
  headers?: Record<string, string>;
}

/** Calls a route's handler as Next would. */
export async function callApi(
  handlers: MethodHandlers,
  method: keyof MethodHandlers,
  call: ApiCall = {},
): Promise<Response> {
  const headers = new Headers({ ...(call.as && { cookie: call.as.cookie }), ...call.headers });
  const changes = method !== 'GET' && method !== 'HEAD';
  if (changes && !headers.has('x-sync')) headers.set('x-sync', '1');
  const init: RequestInit = { method, headers };
  if (call.body !== undefined) {
    if (!headers.has('content-type')) headers.set('content-type', 'application/json');
    init.body = typeof call.body === 'string' ? call.body : JSON.stringify(call.body);
  }
  const request = new Request(`http://127.0.0.1:3000/api${call.query ? `?${call.query}` : ''}`, init);
  return handlers[method](request, { params: Promise.resolve(call.params ?? {}) });
}

/** The status of an answer, with the code of its problem. */
export async function problemOf(response: Response): Promise<[number, unknown]> {
  const body: unknown = await response.json();
  return [response.status, body !== null && typeof body === 'object' && 'code' in body ? body.code : null];
}
