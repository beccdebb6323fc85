import { stringMember } from './string-member';

/** What came of an act at the office. */
export type OfficeAnswer = { ok: true; answer: unknown } | { ok: false; code: string | null; words: string };

/** An act: where it is sent and what it says. */
export interface OfficeAct {
  path: string;
  body: unknown;
}

const UNREACHABLE = 'The office cannot be reached. Nothing was changed; try again.';
const NOT_TAKEN = 'The office did not take it. Nothing was changed.';

function waitWords(answer: Response): string {
  const seconds = Number(answer.headers.get('Retry-After'));
  if (!Number.isInteger(seconds) || seconds < 1) return '';
  return seconds < 90 ? ` Try again in ${seconds} s.` : ` Try again in ${Math.ceil(seconds / 60)} minutes.`;
}

async function refusal(response: Response): Promise<OfficeAnswer> {
  const problem: unknown = await response.json().catch(() => null);
  const words = stringMember(problem, 'title') ?? NOT_TAKEN;
  return { ok: false, code: stringMember(problem, 'code'), words: `${words}${waitWords(response)}` };
}

/** Asks the office to do something. Never throws: what failed comes back in words. */
export async function askToAct({ path, body }: OfficeAct, fetcher: typeof fetch): Promise<OfficeAnswer> {
  try {
    const response = await fetcher(path, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'X-Sync': '1' },
      body: JSON.stringify(body),
    });
    if (!response.ok) return await refusal(response);
    return { ok: true, answer: await response.json() };
  } catch {
    return { ok: false, code: null, words: UNREACHABLE };
  }
}
