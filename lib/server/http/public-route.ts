import 'server-only';
import type { z } from 'zod';
import type { Clock } from '@/lib/kit/clock';
import { systemClock } from '@/lib/kit/system-clock';
import { takeAllowance } from '@/lib/server/auth/allowance';
import { newId } from '@/lib/server/db/new-id';
import { clientAddress } from './client-address';
import { mayBeForged } from './csrf';
import { failureResponse } from './failure-response';
import { parseInput } from './parse-input';
import { API_HEADERS, HttpProblem } from './problem';
import { queryParams } from './query-params';
import { readJson } from './read-json';
import type { RouteHandler } from './route';

/** Tries of strangers from one address in a minute, over all routes without a sign-in. */
const PER_ADDRESS = { most: 300, perMs: 60_000 };

/** What a handler without a session is given. */
export interface PublicCall<Input> {
  input: Input;
  /** The caller's address as far as it can be trusted. */
  address: string;
  clock: Clock;
}

/** How a route for people who are not signed in is put together. */
export interface PublicSpec<Input> {
  input: z.ZodType<Input>;
  /** Does the work; the object becomes JSON with status 200. */
  handler(call: PublicCall<Input>): Promise<object>;
}

/**
 * Builds a handler for somebody who holds a link instead of a session: forged requests, floods, body and query are
 * dealt with before the handler sees anything.
 */
export function publicRoute<Input>({ input: schema, handler }: PublicSpec<Input>): RouteHandler {
  return async (request) => {
    try {
      if (mayBeForged(request)) throw new HttpProblem('csrf');
      queryParams(request.url, []);
      const address = clientAddress(request.headers);
      await takeAllowance({ subject: `public:${address}`, ...PER_ADDRESS }, systemClock.now());
      const { value } = await readJson(request);
      const call = { input: parseInput(schema, value), address, clock: systemClock };
      return Response.json(await handler(call), { headers: API_HEADERS });
    } catch (error) {
      return failureResponse(error, newId());
    }
  };
}
