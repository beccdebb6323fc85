import { stringMember } from '@/components/shell/string-member';

/** What came of an act: nothing to say, or what failed, in words. */
export type ActResult = { ok: true } | { ok: false; words: string };

const UNREACHABLE = 'The office cannot be reached. Nothing was stored.';
const NOT_TAKEN = 'The office did not take it. Nothing was stored.';

/** Sends an act of the lab to the office. Never throws: what failed comes back in words. */
export async function postAct(path: string, body: unknown, fetcher: typeof fetch): Promise<ActResult> {
  try {
    const answer = await fetcher(path, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'X-Sync': '1' },
      body: JSON.stringify(body),
    });
    if (answer.ok) return { ok: true };
    return { ok: false, words: stringMember(await answer.json().catch(() => null), 'title') ?? NOT_TAKEN };
  } catch {
    return { ok: false, words: UNREACHABLE };
  }
}
