import 'server-only';
import { API_HEADERS } from '@/lib/server/http/problem';

/** Collects what next-auth writes to a Node response, and gives it as a web `Response`. */
export class AuthResponse {
  private code = 200;
  private body: string | null = null;
  private readonly headers = new Map<string, string | readonly string[]>();

  status(code: number): this {
    this.code = code;
    return this;
  }

  getHeader(name: string): string | readonly string[] | undefined {
    return this.headers.get(name.toLowerCase());
  }

  setHeader(name: string, value: string | readonly string[]): this {
    this.headers.set(name.toLowerCase(), value);
    return this;
  }

  json(value: unknown): void {
    this.setHeader('Content-Type', 'application/json');
    this.body = JSON.stringify(value);
  }

  send(value: unknown): void {
    if (value !== null && typeof value === 'object') this.json(value);
    else this.body = value === undefined || value === null ? null : String(value);
  }

  end(): void {
    this.body = null;
  }

  /** The finished answer. */
  toResponse(): Response {
    const headers = new Headers();
    for (const [name, value] of this.headers) {
      for (const line of Array.isArray(value) ? value : [String(value)]) headers.append(name, line);
    }
    for (const [name, value] of Object.entries(API_HEADERS)) headers.set(name, value);
    return new Response(this.body, { status: this.code, headers });
  }
}
