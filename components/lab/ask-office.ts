import { stringMember } from '@/components/shell/string-member';

/** What came of asking the office: its answer, or what failed in words, one sentence a line. */
export type OfficeResult = { ok: true; answer: unknown } | { ok: false; words: string };

/** A request to the office. */
export interface OfficeRequest {
  method: 'GET' | 'POST' | 'PUT';
  /** Such as `/api/settings`. */
  path: string;
  body?: unknown;
}

const UNREACHABLE = 'The office cannot be reached. Nothing was stored.';
const NOT_TAKEN = 'The office did not take it. Nothing was stored.';

/** Asks the office for something. Never throws: what failed comes back in words, the most particular ones there are. */
export async function askOffice({ method, path, body }: OfficeRequest, fetcher: typeof fetch): Promise<OfficeResult> {
  try {
    const response = await fetcher(path, {
      method,
      headers: { 'X-Sync': '1', ...(body !== undefined && { 'Content-Type': 'application/json' }) },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    });
    const answer: unknown = await response.json().catch(() => null);
    if (response.ok) return { ok: true, answer };
    return { ok: false, words: stringMember(answer, 'detail') ?? stringMember(answer, 'title') ?? NOT_TAKEN };
  } catch {
    return { ok: false, words: UNREACHABLE };
  }
}
