/** One request to the office. */
export interface NetworkRequest {
  method: 'GET' | 'POST';
  /** Path and query on our own origin. */
  path: string;
  /** JSON text of a POST. */
  body?: string;
  /** The enrolled device, when the route asks for it. */
  deviceId?: string | null;
  timeoutMs: number;
  /** Operations this phone holds that the office has not got, told so that a coordinator sees what a lost phone takes with it. */
  unsent?: number;
}

/** What came back, whoever it came from: a router's sign-in page is an answer too. */
export type NetworkAnswer =
  | { kind: 'answer'; status: number; contentType: string; text: string; retryAfterMs: number | null }
  | { kind: 'none'; why: 'network' | 'timeout' };

/** The only way the core reaches the office. Never rejects. */
export interface Network {
  send(request: NetworkRequest): Promise<NetworkAnswer>;
}

/** How long a request of the sync protocol may take. */
export const REQUEST_TIMEOUT_MS = 30_000;

/** How long a question whether the office is there may take. */
export const PROBE_TIMEOUT_MS = 10_000;
