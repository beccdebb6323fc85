import type { EnrolResponse, HaveResponse } from '@/lib/protocol/enrol';
import type { Op } from '@/lib/protocol/op';
import type { PullResponse } from '@/lib/protocol/pull';
import type { PushResponse } from '@/lib/protocol/push';
import { CookieJar } from './cookie-jar';

/** The password of every demo sign-in. */
export const DEMO_PASSWORD = 'seven-quiet-ladders-2026';

/** One person talking to a running server over HTTP, with nothing of the application's own client in between. */
export class WireClient {
  readonly jar = new CookieJar();
  device: EnrolResponse | null = null;

  constructor(readonly origin: string) {}

  /** A request with this person's cookies; relative to the origin. */
  async fetch(path: string, init: RequestInit = {}): Promise<Response> {
    const headers = new Headers(init.headers);
    headers.set('cookie', this.jar.header());
    const response = await fetch(this.origin + path, { redirect: 'manual', ...init, headers });
    this.jar.take(response);
    return response;
  }

  /** Signs in through the credentials provider; answers the status of the sign-in itself. */
  async signIn(email: string, password = DEMO_PASSWORD): Promise<number> {
    const csrf = (await (await this.fetch('/api/auth/csrf')).json()) as { csrfToken: string };
    const response = await this.fetch('/api/auth/callback/credentials', {
      method: 'POST',
      headers: { 'content-type': 'application/x-www-form-urlencoded' },
      body: new URLSearchParams({ csrfToken: csrf.csrfToken, email, password, json: 'true' }),
    });
    return response.status;
  }

  /** A JSON request in the form the routes ask for. */
  async post(path: string, body: unknown, headers: Record<string, string> = {}): Promise<Response> {
    return this.fetch(path, {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'x-sync': '1', ...this.deviceHeader(), ...headers },
      body: typeof body === 'string' ? body : JSON.stringify(body),
    });
  }

  /** Enrols this person's device. */
  async enrol(label = 'test phone'): Promise<EnrolResponse> {
    this.device = (await (await this.post('/api/sync/v1/enrol', { label })).json()) as EnrolResponse;
    return this.device;
  }

  /** Pushes operations and returns the answer. */
  async push(ops: readonly Op[]): Promise<PushResponse> {
    const epoch = this.device?.epoch ?? 1;
    return (await (
      await this.post('/api/sync/v1/push', { protocol: 1, schema: 1, epoch, ops })
    ).json()) as PushResponse;
  }

  /** One pull page. */
  async pull(query = ''): Promise<PullResponse> {
    const response = await this.fetch(`/api/sync/v1/pull${query}`, {
      headers: { 'x-sync': '1', ...this.deviceHeader() },
    });
    return (await response.json()) as PullResponse;
  }

  /** Which of these operations does the server hold? */
  async have(opIds: readonly string[]): Promise<string[]> {
    return ((await (await this.post('/api/sync/v1/have', { opIds })).json()) as HaveResponse).have;
  }

  /** A GET read as JSON. */
  async get<T>(path: string): Promise<T> {
    return (await (await this.fetch(path)).json()) as T;
  }

  private deviceHeader(): Record<string, string> {
    return this.device ? { 'x-device': this.device.deviceId } : {};
  }
}
