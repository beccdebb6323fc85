import 'server-only';
import type { ErrorCode } from '@/lib/protocol/error-codes';
import { HttpProblem } from '@/lib/server/http/problem';
import { readBody } from '@/lib/server/http/read-body';
import { parseStrictJson } from '@/lib/protocol/strict-json';
import { ownUrl } from './own-url';
import { cookieName } from './session-cookie';

/** A sign-in form is small. */
const MAX_FORM_BYTES = 16 * 1024;

/** A request in the form next-auth's handler for plain Node takes it. */
export interface AuthRequest {
  method: string;
  headers: Record<string, string>;
  cookies: Record<string, string>;
  query: Record<string, string | string[]>;
  body: Record<string, string>;
}

/** The actions of next-auth that are used here, by method. */
const ACTIONS: Readonly<Record<string, readonly string[]>> = {
  GET: ['csrf', 'providers', 'session', 'signin', 'signout', 'error'],
  POST: ['callback/credentials', 'signout', 'session'],
};

/**
 * Is this an address next-auth serves here?
 *
 * @throws HttpProblem `method` when another method would do, `not-found` otherwise.
 */
function checkAction(method: string, parts: readonly string[]): void {
  const action = parts.join('/');
  if (ACTIONS[method]?.includes(action)) return;
  const known = Object.values(ACTIONS).some((actions) => actions.includes(action));
  throw new HttpProblem(known ? 'method' : 'not-found');
}

/** next-auth fails on a malformed `callbackUrl`, so one that leads elsewhere is dropped before it gets there. */
function withoutForeignCallback(fields: Record<string, string>, name: string): Record<string, string> {
  const { [name]: callbackUrl, ...rest } = fields;
  const own = callbackUrl === undefined ? null : ownUrl(callbackUrl);
  return own === null ? rest : { ...rest, [name]: own };
}

function formFields(text: string): Record<string, string> {
  const fields: Record<string, string> = {};
  for (const [name, value] of new URLSearchParams(text)) {
    if (Object.hasOwn(fields, name)) throw new HttpProblem('dup-param');
    fields[name] = value;
  }
  return fields;
}

function jsonFields(text: string): Record<string, string> {
  const parsed = parseStrictJson(text);
  if (!parsed.ok) throw new HttpProblem(parsed.error);
  const { value } = parsed.value;
  const shape: ErrorCode = 'shape';
  if (value === null || typeof value !== 'object' || Array.isArray(value)) throw new HttpProblem(shape);
  const fields: Record<string, string> = {};
  for (const [name, field] of Object.entries(value)) {
    if (typeof field !== 'string' && typeof field !== 'boolean') throw new HttpProblem(shape);
    fields[name] = String(field);
  }
  return fields;
}

async function bodyFields(request: Request): Promise<Record<string, string>> {
  if (request.method !== 'POST') return {};
  const type = request.headers.get('content-type') ?? '';
  const text = await readBody(request, MAX_FORM_BYTES);
  if (/^application\/x-www-form-urlencoded\b/i.test(type)) return formFields(text);
  if (/^application\/json\b/i.test(type)) return jsonFields(text);
  throw new HttpProblem('content-type');
}

function decoded(value: string): string {
  try {
    return decodeURIComponent(value);
  } catch {
    return value;
  }
}

function cookiesOf(header: string | null): Record<string, string> {
  const cookies: Record<string, string> = {};
  for (const part of (header ?? '').split(';')) {
    const equals = part.indexOf('=');
    const name = part.slice(0, equals).trim();
    if (equals > 0 && !Object.hasOwn(cookies, name)) cookies[name] = decoded(part.slice(equals + 1).trim());
  }
  return cookies;
}

/**
 * Reads and cleans a request for next-auth.
 *
 * @param parts the path after `/api/auth/`.
 * @throws HttpProblem for an unknown address or a body that is not a small form.
 */
export async function authRequest(request: Request, parts: readonly string[]): Promise<AuthRequest> {
  checkAction(request.method, parts);
  const query = Object.fromEntries(new URL(request.url).searchParams);
  return {
    method: request.method,
    headers: Object.fromEntries(request.headers),
    cookies: withoutForeignCallback(cookiesOf(request.headers.get('cookie')), cookieName('callback-url')),
    query: { ...withoutForeignCallback(query, 'callbackUrl'), nextauth: [...parts] },
    body: withoutForeignCallback(await bodyFields(request), 'callbackUrl'),
  };
}
