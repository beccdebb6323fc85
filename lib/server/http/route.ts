import 'server-only';
import type { z } from 'zod';
import type { Clock } from '@/lib/kit/clock';
import { systemClock } from '@/lib/kit/system-clock';
import type { StrictJson } from '@/lib/protocol/strict-json';
import { type RequestSession, sessionFromRequest } from '@/lib/server/auth/current-session';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { newId } from '@/lib/server/db/new-id';
import { type Action, may } from '@/lib/server/policies/may';
import { mayBeForged } from './csrf';
import { type EnrolledDevice, deviceOf } from './device-of';
import { failureResponse } from './failure-response';
import { parseInput } from './parse-input';
import { API_HEADERS, HttpProblem } from './problem';
import { queryParams } from './query-params';
import { readJson } from './read-json';

/** What a handler is given; everything in it has been checked. */
export interface RouteCall<Input, Param extends string> {
  ctx: TeamContext;
  /** The parsed body; undefined for a route without one. */
  input: Input;
  /** The raw text of list elements of the body, see `StrictJson`. */
  rawItems: StrictJson['rawItems'];
  /** The dynamic parts of the path. */
  path: Readonly<Record<string, string>>;
  query: Partial<Record<Param, string>>;
  /** The device the request named; null when it named none. */
  device: EnrolledDevice | null;
  request: Request;
  requestId: string;
  clock: Clock;
}

/** How a route is put together. */
export interface RouteSpec<Input, Param extends string> {
  /** The right it asks for; `signed-in` is enough for a route about oneself. */
  action: Action | 'signed-in';
  /** The schema of the JSON body; a route without one never reads a body. */
  input?: z.ZodType<Input>;
  /** Largest body in bytes, where the usual limit is too small. */
  maxBytes?: number;
  /** The query parameters it knows; any other is an error. */
  query?: readonly Param[];
  /** Must, or may, the request name its enrolled device in `X-Device`? */
  device?: 'required' | 'optional';
  /** Does the work; an object becomes JSON with status 200, a `Response` is sent as it is. */
  handler(call: RouteCall<Input, Param>): Promise<object>;
}

/** What Next hands a route handler beside the request. */
export interface RouteContext {
  params: Promise<Record<string, string | string[] | undefined>>;
}

/** A Next route handler for one method. */
export type RouteHandler = (request: Request, context?: RouteContext) => Promise<Response>;

/** The text parts of the path; the rest of a catch-all is not one of them. */
async function pathOf(context: RouteContext | undefined): Promise<Record<string, string>> {
  const path: Record<string, string> = {};
  for (const [name, value] of Object.entries((await context?.params) ?? {})) {
    if (typeof value === 'string') path[name] = value;
  }
  return path;
}

async function signedIn(request: Request, action: RouteSpec<unknown, string>['action']): Promise<RequestSession> {
  if (mayBeForged(request)) throw new HttpProblem('csrf');
  const session = await sessionFromRequest(request, systemClock.now());
  if (!session) throw new HttpProblem('signin');
  if (action !== 'signed-in' && !may(session.context.role, action)) throw new HttpProblem('role');
  return session;
}

async function namedDevice(request: Request, ctx: TeamContext, need: RouteSpec<unknown, string>['device']) {
  if (!need) return null;
  const device = await deviceOf(request, ctx, systemClock.now());
  if (!device && need === 'required') throw new HttpProblem('device');
  return device;
}

function toResponse(result: object, renewal: string | null): Response {
  const response = result instanceof Response ? result : Response.json(result);
  for (const [name, value] of Object.entries(API_HEADERS)) response.headers.set(name, value);
  // A handler that hands out another session has the last word.
  if (renewal && !response.headers.has('Set-Cookie')) response.headers.append('Set-Cookie', renewal);
  return response;
}

/**
 * Builds the handler of one method: forged requests, session, right, device, body and query are dealt with, in this
 * order, before the handler sees anything; whatever it throws becomes a problem answer.
 */
export function route<Input = undefined, Param extends string = never>(spec: RouteSpec<Input, Param>): RouteHandler {
  return async (request, context) => {
    const requestId = newId();
    try {
      const session = await signedIn(request, spec.action);
      const ctx = session.context;
      const device = await namedDevice(request, ctx, spec.device);
      const body = spec.input ? await readJson(request, spec.maxBytes) : null;
      const call: RouteCall<Input, Param> = {
        ctx,
        // A route without a schema has `Input` undefined, which the compiler cannot see from here.
        input: (spec.input && body ? parseInput(spec.input, body.value) : undefined) as Input,
        rawItems: body?.rawItems ?? new Map(),
        path: await pathOf(context),
        query: queryParams(request.url, spec.query ?? []),
        device,
        request,
        requestId,
        clock: systemClock,
      };
      return toResponse(await spec.handler(call), session.renewal);
    } catch (error) {
      return failureResponse(error, requestId);
    }
  };
}
