import 'server-only';
import { newId } from '@/lib/server/db/new-id';
import { problemResponse } from './problem';
import type { RouteHandler } from './route';

/** The methods Next looks for in a route file. */
const METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'] as const;
type Method = (typeof METHODS)[number];

/** The handlers of one address, one for every method. */
export type MethodHandlers = Record<Method, RouteHandler>;

/** Answers HEAD as GET does, without the body. */
function headOf(get: RouteHandler): RouteHandler {
  return async (request, context) => {
    const { status, headers, body } = await get(request, context);
    await body?.cancel();
    return new Response(null, { status, headers });
  };
}

/**
 * All exports of a route file: the given handlers, HEAD from GET, and 405 with `Allow` for every other method.
 *
 * @example export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({ GET: route({ … }) });
 */
export function methods(handlers: Partial<Record<Exclude<Method, 'HEAD'>, RouteHandler>>): MethodHandlers {
  const given: Partial<MethodHandlers> = handlers.GET ? { ...handlers, HEAD: headOf(handlers.GET) } : handlers;
  const allow = METHODS.filter((method) => given[method]).join(', ');
  const refuse: RouteHandler = async () => problemResponse('method', newId(), { headers: { Allow: allow } });
  const {
    GET = refuse,
    HEAD = refuse,
    POST = refuse,
    PUT = refuse,
    PATCH = refuse,
    DELETE = refuse,
    OPTIONS = refuse,
  } = given;
  return { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS };
}
