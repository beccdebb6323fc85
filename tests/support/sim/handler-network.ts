import * as healthRoute from '@/app/api/health/route';
import * as meRoute from '@/app/api/me/route';
import * as enrolRoute from '@/app/api/sync/v1/enrol/route';
import * as haveRoute from '@/app/api/sync/v1/have/route';
import * as pullRoute from '@/app/api/sync/v1/pull/route';
import * as pushRoute from '@/app/api/sync/v1/push/route';
import type { Network, NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import type { MethodHandlers } from '@/lib/server/http/methods';
import { callApi } from '@/tests/support/factories/call-api';
import type { TestMember } from '@/tests/support/factories/make-team';

const ROUTES: Readonly<Record<string, MethodHandlers>> = {
  '/api/health': healthRoute,
  '/api/me': meRoute,
  '/api/sync/v1/enrol': enrolRoute,
  '/api/sync/v1/have': haveRoute,
  '/api/sync/v1/pull': pullRoute,
  '/api/sync/v1/push': pushRoute,
};

/** A phone's network that ends in the real route handlers, in process. */
export class HandlerNetwork implements Network {
  /** Loses answers after the office has committed. */
  loseAnswers = false;

  /** @param as whose cookie the phone carries; null for nobody's. */
  constructor(public as: TestMember | null) {}

  async send({ method, path, body, deviceId }: NetworkRequest): Promise<NetworkAnswer> {
    const [name = '', query] = path.split('?');
    const route = ROUTES[name];
    if (!route) return { kind: 'none', why: 'network' };
    const headers = deviceId ? { 'x-device': deviceId } : undefined;
    const response = await callApi(route, method, { as: this.as, body, query, headers });
    const text = await response.text();
    if (this.loseAnswers) return { kind: 'none', why: 'timeout' };
    const contentType = response.headers.get('content-type') ?? '';
    return { kind: 'answer', status: response.status, contentType, text, retryAfterMs: null };
  }
}
