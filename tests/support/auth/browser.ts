import * as authRoute from '@/app/api/auth/[...nextauth]/route';
import { CookieJar } from '@/tests/support/wire/cookie-jar';

const ORIGIN = 'http://127.0.0.1:3000';

/** What a test adds to a request. */
export interface AuthCall {
  query?: string;
  form?: Record<string, string>;
  /** Instead of a form. */
  body?: string;
  headers?: Record<string, string>;
}

/** Somebody's browser before the sign-in routes, in process. */
export class Browser {
  readonly jar = new CookieJar();

  /** A request to `/api/auth/<path>` with this browser's cookies. */
  async call(method: 'GET' | 'POST' | 'PUT' | 'HEAD', path: string, call: AuthCall = {}): Promise<Response> {
    const headers = new Headers({ cookie: this.jar.header(), ...call.headers });
    const init: RequestInit = { method, headers };
    if (call.form) init.body = new URLSearchParams(call.form);
    if (call.body !== undefined) init.body = call.body;
    const request = new Request(`${ORIGIN}/api/auth/${path}${call.query ?? ''}`, init);
    const response = await authRoute[method](request, { params: Promise.resolve({ nextauth: path.split('/') }) });
    this.jar.take(response);
    return response;
  }

  /** The token that next-auth wants back with every change. */
  async csrfToken(): Promise<string> {
    const answer = (await (await this.call('GET', 'csrf')).json()) as { csrfToken: string };
    return answer.csrfToken;
  }

  /** Sends the sign-in form. */
  async signIn(email: string, password: string, more: AuthCall = {}): Promise<Response> {
    const form = { csrfToken: await this.csrfToken(), email, password, json: 'true', ...more.form };
    return this.call('POST', 'callback/credentials', { ...more, form });
  }

  /** Sends the sign-out form. */
  async signOut(): Promise<Response> {
    return this.call('POST', 'signout', { form: { csrfToken: await this.csrfToken(), json: 'true' } });
  }
}
