import { stringMember } from '@/components/shell/string-member';

/** What came of a change at the office. */
export type ChangeResult =
  /** `reading` is the final reading the change went into. */
  { ok: true; reading: string } | { ok: false; words: string };

const UNREACHABLE = 'The office cannot be reached. Nothing was stored; your list is still here.';
const NOT_TAKEN = 'The office did not take it. Nothing was stored; your list is still here.';

async function failure(answer: Response): Promise<ChangeResult> {
  const title = stringMember(await answer.json().catch(() => null), 'title');
  return { ok: false, words: title ?? NOT_TAKEN };
}

/** A change of one reading: the act, and what the office needs to know for it. */
export interface Change {
  reading: string;
  act: 'settle' | 'lock' | 'amend';
  body: unknown;
}

/** Asks the office for a change of a reading. Never throws: what failed comes back in words. */
export async function requestChange({ reading, act, body }: Change, fetcher: typeof fetch): Promise<ChangeResult> {
  try {
    const answer = await fetcher(`/api/readings/${reading}/${act}`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'X-Sync': '1' },
      body: JSON.stringify(body),
    });
    if (!answer.ok) return await failure(answer);
    return { ok: true, reading: stringMember(await answer.json(), 'reading') ?? reading };
  } catch {
    return { ok: false, words: UNREACHABLE };
  }
}
