import { stringMember } from '@/components/shell/string-member';

const UNREACHABLE = 'The office cannot be reached. Nothing was drawn.';

/** Asks the office to draw a month. Never throws: null when it is done, else what failed, in words. */
export async function requestDraw(month: string, fetcher: typeof fetch): Promise<string | null> {
  try {
    const answer = await fetcher('/api/samples', {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'X-Sync': '1' },
      body: JSON.stringify({ month }),
    });
    if (answer.ok) return null;
    return stringMember(await answer.json().catch(() => null), 'title') ?? UNREACHABLE;
  } catch {
    return UNREACHABLE;
  }
}
