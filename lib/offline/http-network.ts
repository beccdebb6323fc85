import { DEVICE_HEADER, SYNC_HEADER, UNSENT_HEADER } from '@/lib/protocol/limits';
import type { Network, NetworkAnswer, NetworkRequest } from './network';

function headersOf({ body, deviceId, unsent }: NetworkRequest): Record<string, string> {
  const headers: Record<string, string> = { [SYNC_HEADER]: '1', Accept: 'application/json' };
  if (body !== undefined) headers['Content-Type'] = 'application/json';
  if (deviceId) headers[DEVICE_HEADER] = deviceId;
  if (deviceId && unsent !== undefined) headers[UNSENT_HEADER] = String(unsent);
  return headers;
}

/** Seconds to wait, as milliseconds; dates and nonsense count as not said. */
function retryAfterMs(header: string | null): number | null {
  return header !== null && /^\d{1,6}$/.test(header) ? Number(header) * 1_000 : null;
}

async function ask(request: NetworkRequest, signal: AbortSignal): Promise<NetworkAnswer> {
  const { method, path, body } = request;
  const response = await fetch(path, {
    method,
    body,
    signal,
    headers: headersOf(request),
    cache: 'no-store',
    credentials: 'same-origin',
    // A sign-in page of some router must not be followed and taken for an answer.
    redirect: 'manual',
  });
  return {
    kind: 'answer',
    status: response.status,
    contentType: response.headers.get('Content-Type') ?? '',
    // The body counts towards the time limit as well: a half answer is none.
    text: await response.text(),
    retryAfterMs: retryAfterMs(response.headers.get('Retry-After')),
  };
}

/** The network by `fetch`: the only file that calls it. */
export const httpNetwork: Network = {
  async send(request) {
    const signal = AbortSignal.timeout(request.timeoutMs);
    try {
      return await ask(request, signal);
    } catch {
      return { kind: 'none', why: signal.aborted ? 'timeout' : 'network' };
    }
  },
};
