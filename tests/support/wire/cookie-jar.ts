/** Keeps the cookies of one signed-in person between plain `fetch` calls. */
export class CookieJar {
  private readonly cookies = new Map<string, string>();

  /** Takes the `Set-Cookie` headers of an answer. */
  take(response: Response): void {
    for (const line of response.headers.getSetCookie()) {
      const pair = line.split(';', 1)[0] ?? '';
      const at = pair.indexOf('=');
      const value = pair.slice(at + 1);
      if (value === '') this.cookies.delete(pair.slice(0, at));
      else this.cookies.set(pair.slice(0, at), value);
    }
  }

  /** Every cookie with its name. */
  all(): { name: string; value: string }[] {
    return [...this.cookies].map(([name, value]) => ({ name, value }));
  }

  /** The `Cookie` header for the next request. */
  header(): string {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }
}
